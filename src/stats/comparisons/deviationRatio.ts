import type { Level } from '../../terms/level.ts';
import type { RandomStreams } from '../../terms/random.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { bcaInterval } from '../bootstrap/bca.ts';
import { stationaryBlockLength } from '../bootstrap/blockLength.ts';
import { stationaryDraw } from '../bootstrap/draws.ts';
import { endRanks } from '../bootstrap/ranks.ts';
import {
  defaultReplicates,
  type Picks,
  type ResampledStatistic,
  sortedReplicates,
} from '../bootstrap/replicates.ts';
import { writeResampledMoments } from '../bootstrap/resampledMoments.ts';
import { dependenceFoundBelow, volatilityClustering } from '../dependence/clustering.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { orderStatistic } from '../numerics/quantile.ts';
import { leastCounts } from '../returns/leastCounts.ts';

/** Standard deviation of the first over that of the second. */
export type DeviationRatio = {
  readonly ratio: number;
  readonly lower: number;
  readonly upper: number;
  readonly method: 'bca' | 'stationary';
};

export type DeviationRatioQuestion = {
  readonly first: ArrayLike<number>;
  readonly second: ArrayLike<number>;
  /** Common dates, drawn together; else the two are drawn each on its own. */
  readonly paired: boolean;
  readonly level: Level;
  readonly streams: RandomStreams;
  /** Resamples; 9,999 unless said. */
  readonly replicates?: number;
};

type Two = { readonly first: ReturnSummary; readonly second: ReturnSummary; readonly paired: boolean };

const resampledLogRatio = ({ first, second, paired }: Two): ResampledStatistic => {
  const firstMoments = new Float64Array(2);
  const secondMoments = new Float64Array(2);
  return (picks: Picks) => {
    const [firstPicks] = picks;
    const secondPicks = paired ? firstPicks : (picks[1] ?? firstPicks);
    writeResampledMoments(first.deviations, firstPicks, firstMoments);
    writeResampledMoments(second.deviations, secondPicks, secondMoments);
    return Math.log((firstMoments[1] as number) / (secondMoments[1] as number));
  };
};

const blockLengthOf = ({ deviations }: ReturnSummary): number =>
  stationaryBlockLength(deviations.map((deviation) => deviation * deviation));

/** Pairs are drawn in the longer of the two block lengths, which keeps both dependences. */
const blockDraws = ({ first, second, paired }: Two) => {
  const firstLength = blockLengthOf(first);
  const secondLength = blockLengthOf(second);
  return paired
    ? ([stationaryDraw(first.count, Math.max(firstLength, secondLength))] as const)
    : ([stationaryDraw(first.count, firstLength), stationaryDraw(second.count, secondLength)] as const);
};

type LogEnds = { readonly lower: number; readonly upper: number };

const independentEnds = (two: Two, question: DeviationRatioQuestion): Result<LogEnds> =>
  bcaInterval({
    ...question,
    counts: two.paired ? [two.first.count] : [two.first.count, two.second.count],
    statistic: resampledLogRatio(two),
  });

const blockEnds = (two: Two, question: DeviationRatioQuestion): Result<LogEnds> => {
  const { level, streams, replicates = defaultReplicates } = question;
  const ranks = endRanks(level, 'both', replicates);
  if (!ranks.ok) return ranks;
  const statistic = resampledLogRatio(two);
  const sorted = sortedReplicates({ draws: blockDraws(two), statistic, streams, replicates });
  return succeed({
    lower: orderStatistic(sorted, ranks.value.lower),
    upper: orderStatistic(sorted, ranks.value.upper),
  });
};

/**
 * By which factor does one standard deviation exceed the other?
 *
 * Convention: s1/s2, divisors n − 1; ends from ln(s1/s2), which treats both alike: BCa over B = 9,999 resamples, or, where
 * the squares of either series are autocorrelated (robust test, p < 0.05), the percentile ends of stationary blocks whose
 * mean length is that of the squared deviations (for pairs the longer of the two). Two-sided.
 * Domain: at least 10 finite returns that move in each, in time order; refused otherwise, and for levels beyond B. Pairs
 * must be as many.
 * Units: none.
 * Edges: swapping the two turns the estimate into its inverse, and the ends up to the draws.
 * Source: Efron 1987 for BCa; Politis & Romano 1994 for the blocks.
 * Example: deviationRatio({ first, second, paired: true, level, streams }).
 */
export const deviationRatio = (question: DeviationRatioQuestion): Result<DeviationRatio> => {
  const figure = 'An interval for the ratio of two standard deviations';
  const first = summariseReturns(question.first, leastCounts.bootstrap, figure);
  if (!first.ok) return first;
  const second = summariseReturns(question.second, leastCounts.bootstrap, figure);
  if (!second.ok) return second;
  const two = { first: first.value, second: second.value, paired: question.paired };
  if (two.paired && two.first.count !== two.second.count)
    throw new RangeError(`deviationRatio: ${two.first.count} and ${two.second.count} returns are not pairs`);
  const clustered = [question.first, question.second].some(
    (returns) => volatilityClustering(returns).p < dependenceFoundBelow,
  );
  const ends = clustered ? blockEnds(two, question) : independentEnds(two, question);
  if (!ends.ok) return ends;
  return succeed({
    ratio: two.first.sampleStandardDeviation / two.second.sampleStandardDeviation,
    lower: Math.exp(ends.value.lower),
    upper: Math.exp(ends.value.upper),
    method: clustered ? 'stationary' : 'bca',
  });
};
