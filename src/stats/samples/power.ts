import { type Level, levelFraction } from '../../terms/level.ts';
import type { Side } from '../../terms/side.ts';
import { noncentralTCdf, noncentralTUpperTail } from '../distributions/noncentralT.ts';
import { criticalT } from '../mean/criticalValues.ts';
import { expandBracket, findRoot } from '../numerics/roots.ts';

/** A t test of a mean at a confidence level; `above` and `below` look for a difference on that side only. */
export type MeanTest = { readonly level: Level; readonly side: Side };

/**
 * How often does a t test find a difference that is there?
 *
 * Convention: noncentral t with n − 1 degrees of freedom; a two-sided test counts both tails, the wrong one as well. In a
 * one-sided test the difference lies on the side that is looked at.
 * Domain: noncentrality ≥ 0, the true difference over the standard error; degrees of freedom ≥ 1.
 * Units: standard errors in, a probability out.
 * Edges: without a difference it is 1 − level.
 * Source: Johnson, Kotz & Balakrishnan 1995, Continuous Univariate Distributions 2, chapter 31.
 * Example: 34 returns and a difference of half a deviation: noncentrality √34/2, power 0.808 at 95%.
 */
export const meanTestPower = (
  noncentrality: number,
  degreesOfFreedom: number,
  { level, side }: MeanTest,
): number => {
  const critical = criticalT(level, side, degreesOfFreedom);
  const found = noncentralTUpperTail(critical, degreesOfFreedom, noncentrality);
  return side === 'both' ? found + noncentralTCdf(-critical, degreesOfFreedom, noncentrality) : found;
};

/**
 * How many standard errors must a true difference measure to be found with the stated power?
 *
 * Convention: the noncentrality at which {@link meanTestPower} equals the power.
 * Domain: degrees of freedom ≥ 1; any power.
 * Units: standard errors out.
 * Edges: 0 for a power that chance alone gives, 1 − level or less.
 * Source: inversion of {@link meanTestPower}.
 * Example: 2.848 standard errors for 80% at 95% with 59 degrees of freedom.
 */
export const detectableNoncentrality = (power: Level, degreesOfFreedom: number, test: MeanTest): number => {
  const wanted = levelFraction(power);
  const surplus = (noncentrality: number) => meanTestPower(noncentrality, degreesOfFreedom, test) - wanted;
  if (surplus(0) >= 0) return 0;
  const start = 1 + Math.abs(criticalT(test.level, test.side, degreesOfFreedom));
  const bracket = expandBracket(surplus, 0, start, { least: 0 });
  const outcome = bracket === null ? null : findRoot(surplus, bracket.low, bracket.high);
  if (outcome === null || !outcome.found)
    throw new Error('detectableNoncentrality: the power does not reach its goal');
  return outcome.root;
};

/** The power at which a claim's reach is stated: 80%, the usual power of planned trials. */
export const claimPower: Level = { digits: 8, places: 1 };
