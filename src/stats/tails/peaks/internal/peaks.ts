import type { Level } from '../../../../terms/level.ts';
import { levelText, tailFraction } from '../../../../terms/level.ts';
import { problem } from '../../../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../../../terms/result.ts';
import { lossesAscending } from '../../../losses/losses.ts';
import { orderStatistic } from '../../../numerics/quantile.ts';
import { leastCounts, refuseUnusable } from '../../../returns/leastCounts.ts';

/** The losses beyond the threshold. */
export type Peaks = {
  readonly count: number;
  readonly threshold: number;
  /** Losses above the threshold less the threshold, ascending. */
  readonly excesses: Float64Array;
  /** All losses, ascending. */
  readonly losses: Float64Array;
};

/** One return in ten lies beyond the threshold. */
const returnsPerPeak = 10;
const leastPeaks = 25;
const figure = 'A tail fitted to the largest losses';

const tooFewPeaks = (peaks: number, threshold: number): Refusal =>
  refuse(
    problem(
      'notEnoughTail',
      `${figure} needs ${leastPeaks} losses larger than its threshold, and ${peaks} are larger than ${threshold}, which occurs more than once. ` +
        'Ask for a longer window or for the historical model.',
    ),
  );

/** The threshold is the loss below the tenth part that is largest; losses equal to it do not count as beyond it. */
export const findPeaks = (returns: Float64Array): Result<Peaks> => {
  const refusal = refuseUnusable(returns, leastCounts.peaks, figure);
  if (refusal !== null) return refusal;
  const losses = lossesAscending(returns);
  const count = losses.length;
  const threshold = orderStatistic(losses, count - Math.floor(count / returnsPerPeak));
  const excesses = losses.filter((loss) => loss > threshold).map((loss) => loss - threshold);
  if (excesses.length < leastPeaks) return tooFewPeaks(excesses.length, threshold);
  return succeed({ count, threshold, excesses, losses });
};

/** The refusal for a level that lies below the threshold, or null. */
export const refuseLevelBelow = ({ count, excesses }: Peaks, tailLevel: Level): Refusal | null => {
  if (tailFraction(tailLevel) * count < excesses.length) return null;
  const percent = (100 * (1 - excesses.length / count)).toFixed(1);
  return refuse(
    problem(
      'levelOutside',
      `${figure} speaks of levels above ${percent}%, where its threshold lies, and ${levelText(tailLevel)} was asked. ` +
        'Ask for a higher level or for the historical model.',
    ),
  );
};
