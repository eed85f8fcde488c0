import { type Result, succeed } from '../../terms/result.ts';
import { independentDraw } from '../bootstrap/draws.ts';
import { endRanks } from '../bootstrap/ranks.ts';
import { defaultReplicates, type ResampledStatistic, sortedReplicates } from '../bootstrap/replicates.ts';
import { writeResampledMoments } from '../bootstrap/resampledMoments.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { orderStatistic } from '../numerics/quantile.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { MeanBootstrapQuestion } from './bootstrapQuestion.ts';
import { type Ends, endsOnSide } from './ends.ts';

export type StudentisedInterval = Ends & { readonly method: 'studentised' };

/** t* = mean*·√n/s* of values that were centred and scaled; not finite, and so drawn again, where s* is 0. */
const studentisedMean = ({
  deviations,
  sampleStandardDeviation,
  count,
}: ReturnSummary): ResampledStatistic => {
  const scaled = deviations.map((deviation) => deviation / sampleStandardDeviation);
  const moments = new Float64Array(2);
  const root = Math.sqrt(count);
  return ([picks]) => {
    writeResampledMoments(scaled, picks, moments);
    return ((moments[0] as number) * root) / (moments[1] as number);
  };
};

/**
 * Where can the true mean lie when returns are few and lopsided?
 * Convention: bootstrap-t. Ends mean − t*·s/√n, t* the order statistics (B + 1)·p of √n·(mean* − mean)/s* over
 * B = 9,999 resamples of independent returns, s and s* with divisor n − 1; resamples with s* = 0 are drawn again.
 * One-sided as in meanInterval.
 * Domain: at least 10 finite returns that move; refused otherwise, and for a level that B resamples cannot reach.
 * Units: those of the returns, per period.
 * Edges: not for autocorrelated returns; stationaryBootstrapInterval is.
 * Source: Efron 1982, The Jackknife, the Bootstrap and Other Resampling Plans, section 10.10; Hall 1988, Annals of
 * Statistics 16(3), 927-953.
 * Example: studentisedBootstrapInterval({ returns, level, side: 'both', streams }) leans the way the returns lean.
 */
export const studentisedBootstrapInterval = (
  question: MeanBootstrapQuestion,
): Result<StudentisedInterval> => {
  const { returns, level, side, streams, replicates = defaultReplicates } = question;
  const summary = summariseReturns(returns, leastCounts.bootstrap, 'A bootstrap interval for the mean');
  if (!summary.ok) return summary;
  const ranks = endRanks(level, side, replicates);
  if (!ranks.ok) return ranks;
  const { count, mean, standardError } = summary.value;
  const draws = [independentDraw(count)] as const;
  const sorted = sortedReplicates({ draws, statistic: studentisedMean(summary.value), streams, replicates });
  const lower = mean - orderStatistic(sorted, ranks.value.upper) * standardError;
  const upper = mean - orderStatistic(sorted, ranks.value.lower) * standardError;
  return succeed({ method: 'studentised', ...endsOnSide(lower, upper, side) });
};
