import { type Result, succeed } from '../../terms/result.ts';
import { centre } from '../moments/centre.ts';
import { sampleVarianceOfDeviations } from '../moments/deviation.ts';
import { refuseUnusable } from '../returns/leastCounts.ts';

/** What every interval of a mean starts from. */
export type MeanSummary = {
  readonly count: number;
  readonly mean: number;
  readonly deviations: Float64Array;
  /** Divisor n − 1. */
  readonly sampleStandardDeviation: number;
  readonly standardError: number;
  readonly degreesOfFreedom: number;
};

/** Refused below `least` returns and for a price that does not move; `figure` begins the refusal. */
export const summariseMean = (
  returns: ArrayLike<number>,
  least: number,
  figure: string,
): Result<MeanSummary> => {
  const refusal = refuseUnusable(returns, least, figure);
  if (refusal !== null) return refusal;
  const { mean, deviations } = centre(returns);
  const count = deviations.length;
  const sampleStandardDeviation = Math.sqrt(sampleVarianceOfDeviations(deviations));
  return succeed({
    count,
    mean,
    deviations,
    sampleStandardDeviation,
    standardError: sampleStandardDeviation / Math.sqrt(count),
    degreesOfFreedom: count - 1,
  });
};
