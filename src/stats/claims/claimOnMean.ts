import type { Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { robustAutocorrelation } from '../dependence/autocorrelation.ts';
import { dependenceFoundBelow } from '../dependence/clustering.ts';
import { neweyWest } from '../dependence/neweyWest.ts';
import { criticalT } from '../mean/criticalValues.ts';
import { type Ends, endsAround } from '../mean/ends.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { leastCounts, refuseTooFew } from '../returns/leastCounts.ts';
import { claimPower, detectableNoncentrality } from '../samples/power.ts';
import { returnsForPower } from '../samples/returnsForPower.ts';
import { tProbability } from './tProbability.ts';
import { type Verdict, verdictOn } from './verdict.ts';

export type MeanClaim = {
  readonly returns: ArrayLike<number>;
  /** The claimed mean as a fraction per period. */
  readonly claimed: number;
  readonly level: Level;
  readonly side: Side;
  /** Let Newey-West decide whether the returns ask for it or not. */
  readonly robust: boolean;
  /** The half-width up to which an interval around zero bears out a claim of zero, per period. */
  readonly smallestMeanThatMatters: number;
};

export type ClaimOnMean = Ends & {
  readonly estimate: number;
  readonly claimed: number;
  readonly verdict: Verdict;
  readonly t: number;
  readonly p: number;
  readonly degreesOfFreedom: number;
  /** The standard error that decides, and whose it is. */
  readonly standardError: number;
  readonly decidedBy: 'plain' | 'neweyWest';
  readonly plainStandardError: number;
  readonly robustQ: number;
  readonly robustQP: number;
  /** The smallest |true mean − claimed| that this many returns find with 80% power. */
  readonly detectableAt80: number;
  /** Returns with which the claimed mean is told from zero with 80% power; null for a claim of zero. */
  readonly returnsNeeded: number | null;
};

type Deciding = Pick<ClaimOnMean, 'standardError' | 'decidedBy' | 'robustQ' | 'robustQP'>;

const decidingError = ({ returns, robust }: MeanClaim, { count, standardError }: ReturnSummary): Deciding => {
  const { q, p } = robustAutocorrelation(returns);
  const dependent = robust || (p < dependenceFoundBelow && count >= leastCounts.neweyWest);
  return {
    standardError: dependent ? neweyWest(returns).standardError : standardError,
    decidedBy: dependent ? 'neweyWest' : 'plain',
    robustQ: q,
    robustQP: p,
  };
};

/** Dependence multiplies the count by the square of what it does to the standard error, never to fewer. */
const returnsToTell = (claim: MeanClaim, summary: ReturnSummary, standardError: number): number | null => {
  if (claim.claimed === 0) return null;
  const difference = Math.abs(claim.claimed) / summary.sampleStandardDeviation;
  const inflation = Math.max(1, (standardError / summary.standardError) ** 2);
  return Math.ceil(inflation * returnsForPower(difference, claimPower, claim));
};

/**
 * Does the data bear out a stated mean?
 *
 * Convention: one-sample t with s of divisor n − 1 and n − 1 degrees of freedom. The interval and verdict (see verdictOn)
 * are two-sided, or one-sided as in meanInterval: `above` has a lower end, so a claim is contradicted where the mean lies
 * above it, and p is that of the upper tail. Newey-West's standard error takes the place of s/√n when the robust
 * autocorrelation test has p < 0.05 and there are 20 returns, or on request. Power is that of the noncentral t with the
 * deciding standard error, both tails for two sides.
 * Domain: at least 2 finite returns that move, 20 where Newey-West is asked for; refused otherwise.
 * Units: fractions per period; counts of returns.
 * Edges: a claim of zero has no count of returns to be told from zero.
 * Source: Student 1908; Newey & West 1987; power by the noncentral t.
 * Example: 60 returns of mean 0.06% and s 1.06% against a claim of 0.2%: t = −1.02, cannot tell.
 */
export const claimOnMean = (claim: MeanClaim): Result<ClaimOnMean> => {
  const { returns, claimed, level, side, robust } = claim;
  const summary = summariseReturns(returns, leastCounts.variance, 'A claim on the mean');
  if (!summary.ok) return summary;
  const { count, mean, degreesOfFreedom } = summary.value;
  const tooFew = robust
    ? refuseTooFew(count, leastCounts.neweyWest, 'A verdict that allows for autocorrelation')
    : null;
  if (tooFew !== null) return tooFew;
  const deciding = decidingError(claim, summary.value);
  const { standardError } = deciding;
  const ends = endsAround(mean, criticalT(level, side, degreesOfFreedom) * standardError, side);
  const t = (mean - claimed) / standardError;
  const smallestThatMatters = claim.smallestMeanThatMatters;
  return succeed({
    estimate: mean,
    claimed,
    verdict: verdictOn({ claimed, estimate: mean, ends, smallestThatMatters }),
    t,
    p: tProbability(t, degreesOfFreedom, side),
    degreesOfFreedom,
    ...deciding,
    ...ends,
    plainStandardError: summary.value.standardError,
    detectableAt80: detectableNoncentrality(claimPower, degreesOfFreedom, { level, side }) * standardError,
    returnsNeeded: returnsToTell(claim, summary.value, standardError),
  });
};
