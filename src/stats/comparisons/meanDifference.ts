import type { Level } from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import { studentTTwoSidedTail } from '../distributions/studentT.ts';
import { criticalT } from '../mean/criticalValues.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { doesNotMove } from '../returns/movement.ts';

/** First minus second, with its interval. */
export type MeanDifference = {
  readonly difference: number;
  readonly standardError: number;
  readonly t: number;
  readonly p: number;
  readonly degreesOfFreedom: number;
  readonly lower: number;
  readonly upper: number;
};

const testedDifference = (
  difference: number,
  standardError: number,
  degreesOfFreedom: number,
  level: Level,
): MeanDifference => {
  const t = difference / standardError;
  const halfWidth = criticalT(level, 'both', degreesOfFreedom) * standardError;
  return {
    difference,
    standardError,
    t,
    p: studentTTwoSidedTail(t, degreesOfFreedom),
    degreesOfFreedom,
    lower: difference - halfWidth,
    upper: difference + halfWidth,
  };
};

/** x − y day by day; days that do not match are a bug of the caller. */
export const pairedDifferences = (first: ArrayLike<number>, second: ArrayLike<number>): Float64Array => {
  if (first.length !== second.length)
    throw new RangeError(`pairedDifferences: ${first.length} and ${second.length} returns are not pairs`);
  return Float64Array.from(first, (value, day) => value - (second[day] as number));
};

const refuseEqual = (differences: Float64Array): Refusal | null =>
  differences.length >= leastCounts.variance && doesNotMove(differences)
    ? refuse(
        problem(
          'priceDoesNotMove',
          `A comparison needs returns that differ from each other, and the two differ by the same ${differences[0]} on all ${differences.length} days. Compare other tickers.`,
        ),
      )
    : null;

/**
 * Do two tickers differ in their mean, day by day?
 *
 * Convention: paired t on the differences first − second of common dates, s with divisor n − 1, n − 1 degrees of freedom;
 * two-sided.
 * Domain: at least 2 pairs whose differences vary; refused otherwise. Unequal lengths are a bug and throw.
 * Units: fractions per period; p in 0..1.
 * Edges: two tickers that differ by a constant are refused: nothing is uncertain then.
 * Source: Student 1908, Biometrika 6(1), 1-25, section IX.
 * Example: pairedMeanDifference([0.03, 0.01, 0.02], [0.01, 0.01, 0.01], 95%) is 0.01 with t = √3.
 */
export const pairedMeanDifference = (
  first: ArrayLike<number>,
  second: ArrayLike<number>,
  level: Level,
): Result<MeanDifference> => {
  const differences = pairedDifferences(first, second);
  const equal = refuseEqual(differences);
  if (equal !== null) return equal;
  const summary = summariseReturns(differences, leastCounts.variance, 'A comparison of two tickers');
  if (!summary.ok) return summary;
  const { mean, standardError, degreesOfFreedom } = summary.value;
  return succeed(testedDifference(mean, standardError, degreesOfFreedom, level));
};

/**
 * Do two periods differ in their mean, when their volatility may differ too?
 *
 * Convention: first − second over √(s1²/n1 + s2²/n2), divisors n − 1; degrees of freedom of Satterthwaite, not rounded;
 * two-sided.
 * Domain: at least 2 returns that move in each; refused otherwise. The two must not overlap in time.
 * Units: fractions per period; p in 0..1.
 * Edges: the degrees of freedom lie between the smaller n − 1 and n1 + n2 − 2.
 * Source: Welch 1947, Biometrika 34, 28-35; Satterthwaite 1946, Biometrics Bulletin 2, 110-114.
 * Example: welchMeanDifference([1, 2, 3], [2, 4, 6], 95%) is −2 with standard error √(1/3 + 4/3) and 2.94 degrees of freedom.
 */
export const welchMeanDifference = (
  first: ArrayLike<number>,
  second: ArrayLike<number>,
  level: Level,
): Result<MeanDifference> => {
  const one = summariseReturns(first, leastCounts.variance, 'The first period of a comparison');
  if (!one.ok) return one;
  const other = summariseReturns(second, leastCounts.variance, 'The second period of a comparison');
  if (!other.ok) return other;
  const varianceOne = one.value.standardError ** 2;
  const varianceOther = other.value.standardError ** 2;
  const variance = varianceOne + varianceOther;
  const degreesOfFreedom =
    variance ** 2 /
    (varianceOne ** 2 / one.value.degreesOfFreedom + varianceOther ** 2 / other.value.degreesOfFreedom);
  const difference = one.value.mean - other.value.mean;
  return succeed(testedDifference(difference, Math.sqrt(variance), degreesOfFreedom, level));
};
