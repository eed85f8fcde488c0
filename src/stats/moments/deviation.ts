import { centre } from './centre.ts';
import { sumOfTerms } from './sumOfTerms.ts';

/** Σ of squared deviations over n − 1, from deviations that already sum to zero. */
export const sampleVarianceOfDeviations = (deviations: Float64Array): number =>
  sumOfTerms(0, deviations.length, (index) => (deviations[index] as number) ** 2) / (deviations.length - 1);

/**
 * How far do the values scatter around their mean?
 * Convention: sample standard deviation, divisor n − 1.
 * Domain: at least 2 finite values; fewer throws.
 * Units: those of the data.
 * Edges: equal values give exactly 0.
 * Source: definition.
 * Example: sampleStandardDeviation([1, 2, 3]) is 1.
 */
export const sampleStandardDeviation = (values: ArrayLike<number>): number => {
  if (values.length < 2)
    throw new RangeError(`sampleStandardDeviation: expected at least 2 values, got ${values.length}`);
  return Math.sqrt(sampleVarianceOfDeviations(centre(values).deviations));
};
