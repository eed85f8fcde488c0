import { type Result, succeed } from '../../terms/result.ts';
import { stationaryBlockLength } from '../bootstrap/blockLength.ts';
import { stationaryDraw } from '../bootstrap/draws.ts';
import { endRanks } from '../bootstrap/ranks.ts';
import { defaultReplicates, type ResampledStatistic, sortedReplicates } from '../bootstrap/replicates.ts';
import { writeResampledMoments } from '../bootstrap/resampledMoments.ts';
import { summariseReturns } from '../moments/summary.ts';
import { orderStatistic } from '../numerics/quantile.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { MeanBootstrapQuestion } from './bootstrapQuestion.ts';
import { type Ends, endsOnSide } from './ends.ts';

export type StationaryInterval = Ends & {
  readonly method: 'stationary';
  /** Mean block length in returns. */
  readonly blockLength: number;
};

const meanDeviation = (deviations: Float64Array): ResampledStatistic => {
  const moments = new Float64Array(2);
  return ([picks]) => {
    writeResampledMoments(deviations, picks, moments);
    return moments[0] as number;
  };
};

/**
 * Where can the true mean lie when returns depend on their predecessors, without a formula for its standard error?
 * Convention: the mean of B = 9,999 stationary resamples, ends at the order statistics (B + 1)·p (percentile interval),
 * mean block length by stationaryBlockLength. One-sided as in meanInterval.
 * Domain: at least 10 finite returns in time order that move; refused otherwise, and for a level that B cannot reach.
 * Units: those of the returns, per period; block length in returns.
 * Edges: too narrow with few returns, like every percentile interval (see the measured coverage).
 * Source: Politis & Romano 1994, Journal of the American Statistical Association 89, 1303-1313.
 * Example: stationaryBootstrapInterval({ returns, level, side: 'both', streams }).
 */
export const stationaryBootstrapInterval = (question: MeanBootstrapQuestion): Result<StationaryInterval> => {
  const { returns, level, side, streams, replicates = defaultReplicates } = question;
  const summary = summariseReturns(returns, leastCounts.bootstrap, 'A bootstrap interval for the mean');
  if (!summary.ok) return summary;
  const ranks = endRanks(level, side, replicates);
  if (!ranks.ok) return ranks;
  const { count, mean, deviations } = summary.value;
  const blockLength = stationaryBlockLength(returns);
  const draws = [stationaryDraw(count, blockLength)] as const;
  const sorted = sortedReplicates({ draws, statistic: meanDeviation(deviations), streams, replicates });
  const lower = mean + orderStatistic(sorted, ranks.value.lower);
  const upper = mean + orderStatistic(sorted, ranks.value.upper);
  return succeed({ method: 'stationary', blockLength, ...endsOnSide(lower, upper, side) });
};
