import type { Level } from '../../../terms/level.ts';
import type { RandomStreams } from '../../../terms/random.ts';
import { endRanks } from '../../bootstrap/ranks.ts';
import { orderStatistic } from '../../numerics/quantile.ts';
import { nextNormal } from '../../random/draws.ts';

/**
 * Lower and upper order statistics of (ES* − ES)/s* over standard normal samples of `count`, ES = `multiplier` there;
 * null where the level lies beyond the resamples. The pivot does not depend on the mean and spread of the data.
 */
export const normalEsPivots = (
  count: number,
  multiplier: number,
  confidence: Level,
  streams: RandomStreams,
  replicates: number,
): { readonly lower: number; readonly upper: number } | null => {
  const ranks = endRanks(confidence, 'both', replicates);
  if (!ranks.ok) return null;
  const pivots = new Float64Array(replicates);
  for (let replicate = 0; replicate < replicates; replicate += 1) {
    const random = streams.stream(replicate);
    let sum = 0;
    let squares = 0;
    for (let draw = 0; draw < count; draw += 1) {
      const value = nextNormal(random);
      sum += value;
      squares += value * value;
    }
    const mean = sum / count;
    const deviation = Math.sqrt((squares - sum * mean) / (count - 1));
    pivots[replicate] = (deviation * multiplier - mean - multiplier) / deviation;
  }
  pivots.sort();
  return {
    lower: orderStatistic(pivots, ranks.value.lower),
    upper: orderStatistic(pivots, ranks.value.upper),
  };
};
