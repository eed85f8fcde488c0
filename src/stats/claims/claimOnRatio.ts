import { halfTailFraction, type Level, levelFraction, levelText, tailFraction } from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { noncentralTCdf, noncentralTQuantile, noncentralTUpperTail } from '../distributions/noncentralT.ts';
import { type Ends, endsOnSide } from '../mean/ends.ts';
import { summariseReturns } from '../moments/summary.ts';
import { expandBracket, findRoot } from '../numerics/roots.ts';
import { ratioInterval } from '../ratio/interval.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { claimPower } from '../samples/power.ts';
import { returnsForPower } from '../samples/returnsForPower.ts';
import { type Verdict, verdictOn } from './verdict.ts';

export type RatioClaim = {
  readonly returns: ArrayLike<number>;
  /** The claimed ratio of mean to standard deviation, per period. */
  readonly claimed: number;
  readonly level: Level;
  readonly side: Side;
  /** As a mean per period; the sample's standard deviation turns it into a ratio. */
  readonly smallestMeanThatMatters: number;
};

export type ClaimOnRatio = Ends & {
  readonly estimate: number;
  readonly claimed: number;
  readonly verdict: Verdict;
  /** √n·mean/s, which is judged by the noncentral t of the claimed ratio. */
  readonly t: number;
  readonly p: number;
  readonly degreesOfFreedom: number;
  /** The smallest |true ratio − claimed| that this many returns find with 80% power. */
  readonly detectableAt80: number;
  /** Returns with which the claimed ratio is told from zero with 80% power; null for a claim of zero. */
  readonly returnsNeeded: number | null;
};

/** One end at level c is an end of the two-sided interval at 2c − 1; null where that is no level. */
const twoSidedLevel = ({ digits, places }: Level, side: Side): Level | null => {
  if (side === 'both') return { digits, places };
  const doubled = 2 * digits - 10 ** places;
  return doubled > 0 ? { digits: doubled, places } : null;
};

const tailProbability = (t: number, degreesOfFreedom: number, noncentrality: number, side: Side): number => {
  const upper = noncentralTUpperTail(t, degreesOfFreedom, noncentrality);
  if (side === 'above') return upper;
  const lower = noncentralTCdf(t, degreesOfFreedom, noncentrality);
  return side === 'below' ? lower : Math.min(1, 2 * Math.min(upper, lower));
};

type RatioTest = {
  readonly claimed: number;
  readonly count: number;
  readonly level: Level;
  readonly side: Side;
};

/** How often the test rejects the claimed ratio where the true one is another. */
const powerAt = ({ claimed, count, level, side }: RatioTest): ((ratio: number) => number) => {
  const root = Math.sqrt(count);
  const beyond = side === 'both' ? halfTailFraction(level) : tailFraction(level);
  const low = side === 'above' ? null : noncentralTQuantile(beyond, count - 1, root * claimed);
  const high = side === 'below' ? null : -noncentralTQuantile(beyond, count - 1, -root * claimed);
  return (ratio) =>
    (low === null ? 0 : noncentralTCdf(low, count - 1, root * ratio)) +
    (high === null ? 0 : noncentralTUpperTail(high, count - 1, root * ratio));
};

/** The distance of the nearest ratio, on either side that is looked at, which is found with 80% power. */
const detectableDistance = (test: RatioTest): number => {
  const power = powerAt(test);
  const distanceTowards = (direction: -1 | 1): number => {
    const surplus = (distance: number) =>
      power(test.claimed + direction * distance) - levelFraction(claimPower);
    if (surplus(0) >= 0) return 0;
    const bracket = expandBracket(surplus, 0, 3 / Math.sqrt(test.count), { least: 0 });
    const outcome = bracket === null ? null : findRoot(surplus, bracket.low, bracket.high);
    if (outcome === null || !outcome.found)
      throw new Error('claimOnRatio: the power does not reach its goal');
    return outcome.root;
  };
  if (test.side === 'above') return distanceTowards(1);
  return test.side === 'below' ? distanceTowards(-1) : Math.min(distanceTowards(1), distanceTowards(-1));
};

/**
 * Does the data bear out a stated ratio of mean to standard deviation?
 *
 * Convention: √n·mean/s (divisor n − 1) against the noncentral t with n − 1 degrees of freedom and noncentrality √n·claimed;
 * the interval inverts it (see ratioInterval), p is twice the smaller tail, or the one tail of a one-sided claim. Verdict as
 * in verdictOn. Nothing risk-free is deducted.
 * Domain: at least 2 finite returns that move; a one-sided level above 50%. Refused otherwise.
 * Units: none; per period (an annual ratio is divided by the root of the periods a year first).
 * Edges: exact for independent normal returns only; dependence and fat tails are not allowed for.
 * Source: Johnson & Welch 1940, Biometrika 31, 362-389.
 * Example: 60 returns of ratio 0.06 against a claim of 0.19 a day: inside ±0.25, cannot tell.
 */
export const claimOnRatio = (claim: RatioClaim): Result<ClaimOnRatio> => {
  const { returns, claimed, level, side } = claim;
  const summary = summariseReturns(
    returns,
    leastCounts.variance,
    'A claim on the ratio of mean to deviation',
  );
  if (!summary.ok) return summary;
  const intervalLevel = twoSidedLevel(level, side);
  if (intervalLevel === null) return refuseOneSided(level);
  const interval = ratioInterval(returns, intervalLevel);
  if (!interval.ok) return interval;
  const { count, sampleStandardDeviation, degreesOfFreedom } = summary.value;
  const { ratio, lower, upper } = interval.value;
  const ends = endsOnSide(lower, upper, side);
  const root = Math.sqrt(count);
  const smallestThatMatters = claim.smallestMeanThatMatters / sampleStandardDeviation;
  return succeed({
    estimate: ratio,
    claimed,
    verdict: verdictOn({ claimed, estimate: ratio, ends, smallestThatMatters }),
    t: root * ratio,
    p: tailProbability(root * ratio, degreesOfFreedom, root * claimed, side),
    degreesOfFreedom,
    ...ends,
    detectableAt80: detectableDistance({ claimed, count, level, side }),
    returnsNeeded: claimed === 0 ? null : returnsForPower(Math.abs(claimed), claimPower, { level, side }),
  });
};

const refuseOneSided = (level: Level) =>
  refuse(
    problem(
      'levelOutside',
      `A one-sided claim on a ratio at ${levelText(level)} excludes nothing. Ask at a level above 50%, such as 95%.`,
    ),
  );
