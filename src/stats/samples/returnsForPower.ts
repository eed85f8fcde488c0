import { type Level, levelFraction } from '../../terms/level.ts';
import { criticalNormal } from '../mean/criticalValues.ts';
import { mostSearched, smallestCount } from './internal/smallestCount.ts';
import { detectableNoncentrality, type MeanTest, meanTestPower } from './power.ts';

/**
 * How many returns until a t test finds a difference of the stated size with the stated power?
 *
 * Convention: the smallest whole n ≥ 2 at which {@link meanTestPower} reaches the power; both tails count in a two-sided test.
 * Domain: the difference in standard deviations, above 0; a power above 1 − level (a lower one needs 2).
 * Units: standard deviations in, returns out.
 * Edges: above a million the normal power, of both tails too, with the correction z²/2 is used.
 * Source: Johnson, Kotz & Balakrishnan 1995, Continuous Univariate Distributions 2, chapter 31.
 * Example: half a deviation at 95% with 80% power needs 34 returns.
 */
export const returnsForPower = (differenceInDeviations: number, power: Level, test: MeanTest): number => {
  if (!(differenceInDeviations > 0))
    throw new RangeError(`returnsForPower: expected a difference above 0, got ${differenceInDeviations}`);
  const wanted = levelFraction(power);
  const reach = detectableNoncentrality(power, Number.POSITIVE_INFINITY, test);
  const guess = (reach / differenceInDeviations) ** 2 + criticalNormal(test.level, test.side) ** 2 / 2;
  if (guess > mostSearched) return Math.ceil(guess);
  return smallestCount(
    (count) => meanTestPower(differenceInDeviations * Math.sqrt(count), count - 1, test) >= wanted,
    guess,
  );
};
