import { centre } from './centre.ts';
import { sumOfTerms } from './sumOfTerms.ts';

export type CentralMoments = {
  readonly mean: number;
  readonly m2: number;
  readonly m3: number;
  readonly m4: number;
};

/**
 * The mean and the second to fourth moments around it.
 * Convention: divisor n for all three.
 * Domain: at least 1 finite value; an empty array throws.
 * Units: those of the data, to the power of the moment.
 * Edges: equal values give moments of exactly 0.
 * Source: definition.
 * Example: centralMoments([0, 2]) is mean 1, m2 1, m3 0, m4 1.
 */
export const centralMoments = (values: ArrayLike<number>): CentralMoments => {
  const { mean, deviations } = centre(values);
  const count = deviations.length;
  const moment = (power: number) =>
    sumOfTerms(0, count, (index) => (deviations[index] as number) ** power) / count;
  return { mean, m2: moment(2), m3: moment(3), m4: moment(4) };
};
