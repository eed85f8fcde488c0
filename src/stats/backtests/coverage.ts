import { expectedBeyond, type Level, tailFraction } from '../../terms/level.ts';
import { binomialMass } from '../distributions/binomial.ts';
import { chiSquareUpperTail } from '../distributions/chiSquare.ts';

export type LikelihoodRatio = { readonly likelihoodRatio: number; readonly p: number };

/** n·ln(1 + relative), with 0·ln 0 = 0 where nothing was counted. */
const logShare = (count: number, relative: number): number =>
  count === 0 ? 0 : count * Math.log1p(relative);

const requireCounts = (name: string, exceedances: number, days: number): void => {
  const whole = Number.isInteger(exceedances) && Number.isInteger(days);
  if (!whole || days < 1 || exceedances < 0 || exceedances > days) {
    throw new RangeError(`${name}: ${exceedances} exceedances in ${days} days is not a count`);
  }
};

/**
 * Are there as many exceedances as the level promises?
 *
 * Convention: likelihood ratio of the observed share x/T against 1 − a, chi-square with one degree of freedom; 0·ln 0 = 0.
 * Domain: 0 ≤ exceedances ≤ days, days ≥ 1.
 * Units: counts in; the statistic and an upper tail probability out.
 * Edges: exactly as many as expected gives 0 and p = 1. On few days the chi-square p is rough; verdicts use the exact p.
 * Source: Kupiec 1995, Journal of Derivatives 3(2), 73-84.
 * Example: 7 exceedances in 250 days at 99% give a ratio of 5.497 and p = 0.0190.
 */
export const coverageTest = (exceedances: number, days: number, tailLevel: Level): LikelihoodRatio => {
  requireCounts('coverageTest', exceedances, days);
  const expected = expectedBeyond(days, tailLevel);
  const surplus = exceedances - expected;
  // Deviations from the expected counts rather than shares: near the expected count the two terms nearly cancel.
  const ratio =
    2 *
    (logShare(exceedances, surplus / expected) + logShare(days - exceedances, -surplus / (days - expected)));
  const likelihoodRatio = Math.max(0, ratio);
  return { likelihoodRatio, p: chiSquareUpperTail(likelihoodRatio, 1) };
};

/** Guards equal probabilities on the two sides against their last bits. */
const tieFactor = 1 + 1e-7;

/**
 * How likely is a count of exceedances at least as unusual as this one, were the level right?
 *
 * Convention: two-sided by probability: all counts whose binomial probability is not larger than that of the observed
 * one (times 1 + 1e-7) are added.
 * Domain: 0 ≤ exceedances ≤ days, days ≥ 1.
 * Units: counts in, probability out.
 * Edges: the most probable count gives 1.
 * Source: Clopper & Pearson 1934 for the exact binomial; ordering by probability after Sterne 1954, Biometrika 41, 275-278.
 * Example: 7 exceedances in 250 days at 99% give p = 0.0137: no exceedance at all would be likelier.
 */
export const exactCoverageP = (exceedances: number, days: number, tailLevel: Level): number => {
  requireCounts('exactCoverageP', exceedances, days);
  const chance = tailFraction(tailLevel);
  const limit = binomialMass(exceedances, days, chance) * tieFactor;
  let sum = 0;
  for (let count = 0; count <= days; count += 1) {
    const mass = binomialMass(count, days, chance);
    if (mass <= limit) sum += mass;
  }
  return Math.min(1, sum);
};
