import { expectedBeyond, type Level, levelText } from '../../../terms/level.ts';
import { independentDraw } from '../../bootstrap/draws.ts';
import { endRanks } from '../../bootstrap/ranks.ts';
import { defaultReplicates, type ResampledStatistic, sortedReplicates } from '../../bootstrap/replicates.ts';
import { orderStatistic } from '../../numerics/quantile.ts';
import type { Interval, TailInput, TailNote } from '../tailFigures.ts';

/** Returns expected beyond the level below which resamples of the tail say too little. */
const leastExpectedBeyond = 10;

/** The smallest count with `least` returns expected beyond the level. */
const countWithBeyond = (level: Level, least: number): number => {
  const scale = 10n ** BigInt(level.places);
  const tail = scale - BigInt(level.digits);
  return Number((BigInt(least) * scale + tail - 1n) / tail);
};

/** ES of a resample given as picks into the ascending losses: counted per loss, then summed from the largest down. */
const esOfPicks = (losses: Float64Array, expected: number): ResampledStatistic => {
  const timesPicked = new Uint32Array(losses.length);
  return ([picks]) => {
    timesPicked.fill(0);
    for (let place = 0; place < picks.length; place += 1) {
      const pick = picks[place] as number;
      timesPicked[pick] = (timesPicked[pick] as number) + 1;
    }
    let left = expected;
    let sum = 0;
    for (let index = losses.length - 1; left > 0; index -= 1) {
      const taken = Math.min(timesPicked[index] as number, left);
      sum += taken * (losses[index] as number);
      left -= taken;
    }
    return sum / expected;
  };
};

type EsInterval = { readonly interval: Interval | null; readonly notes: readonly TailNote[] };

const without = (code: TailNote['code'], text: string, needs: number | null): EsInterval => ({
  interval: null,
  notes: [{ figure: 'esInterval', code, text, needs }],
});

/** Percentile-bootstrap interval of the historical ES, or the reason for which there is none. Losses ascending. */
export const historicalEsInterval = (
  losses: Float64Array,
  { tailLevel, confidence, streams, replicates = defaultReplicates }: TailInput,
): EsInterval => {
  const count = losses.length;
  const expected = expectedBeyond(count, tailLevel);
  if (expected < leastExpectedBeyond) {
    const needs = countWithBeyond(tailLevel, leastExpectedBeyond);
    const text =
      `${count} returns leave ${expected} beyond ${levelText(tailLevel)} on average, too few for an interval of the mean ` +
      `beyond it; ${needs} returns would be enough.`;
    return without('tooFewBeyond', text, needs);
  }
  const ranks = endRanks(confidence, 'both', replicates);
  if (!ranks.ok) return without('levelBeyondResamples', ranks.problem.message, null);
  const resampled = sortedReplicates({
    draws: [independentDraw(count)],
    statistic: esOfPicks(losses, expected),
    streams,
    replicates,
  });
  const lower = orderStatistic(resampled, ranks.value.lower);
  const upper = orderStatistic(resampled, ranks.value.upper);
  return { interval: { lower, upper }, notes: [] };
};
