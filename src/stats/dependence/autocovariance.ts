import { sumOfTerms } from '../moments/sumOfTerms.ts';

/** Σ d[t]·d[t−lag] over deviations from the mean: n times the autocovariance with divisor n, whatever the lag. */
export const laggedProducts = (deviations: Float64Array, lag: number): number =>
  sumOfTerms(
    lag,
    deviations.length,
    (index) => (deviations[index] as number) * (deviations[index - lag] as number),
  );
