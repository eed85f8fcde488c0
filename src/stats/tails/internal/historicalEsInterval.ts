import { countWithBeyond, expectedBeyond, levelText } from '../../../terms/level.ts';
import type { Random } from '../../../terms/random.ts';
import { endRanks } from '../../bootstrap/ranks.ts';
import { defaultReplicates } from '../../bootstrap/replicates.ts';
import { orderStatistic } from '../../numerics/quantile.ts';
import { nextOpenDouble } from '../../random/draws.ts';
import type { Interval, TailInput, TailNote } from '../tailFigures.ts';

/** Returns expected beyond the level below which resamples of the tail say too little. */
const leastExpectedBeyond = 10;

/**
 * ES of a resample of the ascending losses. Only its `expected` largest picks count, and they are drawn alone, the largest
 * first: of n places drawn at random from the whole, the share of places above the j-th highest is 1 − exp(−Σ_{i≤j} E_i/(n − i + 1)), E standard
 * exponential. A resample drawn pick by pick has the same distribution and takes n draws instead of n(1−a).
 */
export const resampledShortfall = (losses: Float64Array, expected: number): ((random: Random) => number) => {
  const count = losses.length;
  return (random) => {
    let left = expected;
    let exponent = 0;
    let sum = 0;
    for (let rank = count; left > 0; rank -= 1) {
      exponent -= Math.log(nextOpenDouble(random)) / rank;
      const above = Math.floor(-count * Math.expm1(-exponent));
      sum += Math.min(1, left) * (losses[Math.max(0, count - 1 - above)] as number);
      left -= 1;
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
  const shortfallOf = resampledShortfall(losses, expected);
  const resampled = new Float64Array(replicates);
  for (let replicate = 0; replicate < replicates; replicate += 1)
    resampled[replicate] = shortfallOf(streams.stream(replicate));
  resampled.sort();
  const lower = orderStatistic(resampled, ranks.value.lower);
  const upper = orderStatistic(resampled, ranks.value.upper);
  return { interval: { lower, upper }, notes: [] };
};
