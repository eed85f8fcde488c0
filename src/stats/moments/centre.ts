import { compensatedSum } from '../numerics/sum.ts';

export type Centred = {
  readonly mean: number;
  /** x[i] minus the mean. Their sum is zero to the last digits even where the mean itself had to be rounded. */
  readonly deviations: Float64Array;
};

/**
 * The arithmetic mean and how far each value lies from it: the first step of every moment and autocorrelation.
 * Convention: the mean is refined by the mean of the first deviations, and the deviations by what the refinement could
 * not put into the mean. Without that second step data near 1e7 with a spread of 0.1 would lose half of their digits.
 * Domain: at least 1 finite value; an empty array throws.
 * Units: those of the data.
 * Edges: values that are all equal are their own mean and have deviations of exactly 0, even where their sum over their
 * count is not that value: what is missing is a few units in the last place, and so comes back without rounding.
 * Source: Chan, Golub & LeVeque 1983, The American Statistician 37(3), "corrected two-pass" (here of the mean as well).
 * Example: centre([1, 2, 6]) is mean 3 with deviations −2, −1, 3.
 */
export const centre = (values: ArrayLike<number>): Centred => {
  const count = values.length;
  if (count === 0) throw new RangeError('centre: expected at least 1 value, got none');
  const provisional = compensatedSum(values) / count;
  const deviations = new Float64Array(count);
  for (let index = 0; index < count; index += 1) deviations[index] = (values[index] as number) - provisional;
  const correction = compensatedSum(deviations) / count;
  for (let index = 0; index < count; index += 1)
    deviations[index] = (deviations[index] as number) - correction;
  return { mean: provisional + correction, deviations };
};
