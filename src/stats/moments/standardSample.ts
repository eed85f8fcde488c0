import { centre } from './centre.ts';
import { sumOfTerms } from './sumOfTerms.ts';

/** Returns brought to mean 0 and second moment 1 (divisor n), so that a fit meets the same numbers in every unit. */
export type StandardSample = {
  readonly values: Float64Array;
  readonly mean: number;
  /** √m2, divisor n. */
  readonly deviation: number;
  readonly excessKurtosis: number;
};

/** Returns must not stand still. */
export const standardise = (returns: ArrayLike<number>): StandardSample => {
  const { mean, deviations } = centre(returns);
  const count = deviations.length;
  const deviation = Math.sqrt(sumOfTerms(0, count, (index) => (deviations[index] as number) ** 2) / count);
  const values = deviations.map((value) => value / deviation);
  const fourth = sumOfTerms(0, count, (index) => (values[index] as number) ** 4) / count;
  return { values, mean, deviation, excessKurtosis: fourth - 3 };
};
