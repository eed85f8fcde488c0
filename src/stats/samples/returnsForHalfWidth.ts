import type { Level } from '../../terms/level.ts';
import type { Side } from '../../terms/side.ts';
import { criticalNormal, criticalT } from '../mean/criticalValues.ts';
import { mostSearched, smallestCount } from './internal/smallestCount.ts';

/**
 * How many returns until the interval for the mean is as narrow as wanted?
 *
 * Convention: the smallest whole n ≥ 2 with t·s/√n ≤ half-width, t with n − 1 degrees of freedom; two-sided unless said.
 * Domain: half-width in standard deviations, above 0.
 * Units: standard deviations in, returns out.
 * Edges: a wide half-width is met by 2 returns; above a million the normal quantile with its first correction is used. A
 * one-sided level of 50% or less has no half-width to narrow: 2.
 * Source: inversion of Student 1908.
 * Example: a quarter of a deviation at 95% needs 64 returns.
 */
export const returnsForHalfWidth = (widthInDeviations: number, level: Level, side: Side = 'both'): number => {
  if (!(widthInDeviations > 0))
    throw new RangeError(`returnsForHalfWidth: expected a half-width above 0, got ${widthInDeviations}`);
  const normal = criticalNormal(level, side);
  if (normal <= 0) return 2;
  const guess = (normal / widthInDeviations) ** 2 + (normal ** 2 + 1) / 2;
  if (guess > mostSearched) return Math.ceil(guess);
  return smallestCount(
    (count) => criticalT(level, side, count - 1) <= widthInDeviations * Math.sqrt(count),
    guess,
  );
};
