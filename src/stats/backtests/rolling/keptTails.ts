import { ceilingOfCount, expectedBeyond } from '../../../terms/level.ts';
import type { Random } from '../../../terms/random.ts';
import { nextDouble } from '../../random/draws.ts';
import type { RollingSpan } from './rollingForecaster.ts';

/**
 * Each day's worst losses, kept so that losses beyond an empirical VaR can be drawn again later. With n losses ascending
 * and k = ⌈n·a⌉, a draw is one of l(k+1) … l(n), each with weight 1, or l(k) with the weight k − n·a, so that draws average
 * the empirical ES.
 */
export type KeptTails = {
  /** Of the losses those from rank k up must stand in ascending order. */
  readonly keep: (day: number, losses: Float64Array) => void;
  readonly draw: (day: number, random: Random) => number;
};

export const createKeptTails = ({
  firstDay,
  dayCount,
  estimationReturns,
  tailLevel,
}: RollingSpan): KeptTails => {
  const beyond = estimationReturns - ceilingOfCount(estimationReturns, tailLevel);
  const weight = expectedBeyond(estimationReturns, tailLevel);
  const width = beyond + 1;
  const kept = new Float64Array(width * dayCount);
  return {
    keep: (day, losses) => {
      const start = width * (day - firstDay);
      for (let place = 0; place < width; place += 1)
        kept[start + place] = losses[estimationReturns - 1 - place] as number;
    },
    draw: (day, random) => {
      const place = Math.min(beyond, Math.floor(nextDouble(random) * weight));
      return kept[width * (day - firstDay) + place] as number;
    },
  };
};
