import { type Result, succeed } from '../../terms/result.ts';
import { refuseUnusable } from '../returns/leastCounts.ts';
import { centre } from './centre.ts';
import { sampleVarianceOfDeviations } from './deviation.ts';

/** What every interval of a mean, a standard deviation or their ratio starts from. */
export type ReturnSummary = {
  readonly count: number;
  readonly mean: number;
  readonly deviations: Float64Array;
  /** Divisor n − 1. */
  readonly sampleStandardDeviation: number;
  readonly standardError: number;
  readonly degreesOfFreedom: number;
};

/** Refused below `least` returns and for a price that does not move; `figure` begins the refusal. */
export const summariseReturns = (
  returns: ArrayLike<number>,
  least: number,
  figure: string,
): Result<ReturnSummary> => {
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
