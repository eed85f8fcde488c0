import type { Level } from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { neweyWest } from '../dependence/neweyWest.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { chiSquareInterval } from '../spread/chiSquareInterval.ts';
import { returnsForHalfWidth } from './returnsForHalfWidth.ts';
import { returnsForPower } from './returnsForPower.ts';

/** Counts of returns; `lower` and `upper` at the ends of the standard deviation's own interval. */
export type NeededReturns = { readonly returns: number; readonly lower: number; readonly upper: number };

export type Need = {
  readonly sampleStandardDeviation: number;
  readonly deviationLower: number;
  readonly deviationUpper: number;
  /** Returns until the half-width of the interval for the mean is the size asked. */
  readonly forHalfWidth: NeededReturns;
  /** Returns until a true mean of the size asked is told from zero with the stated power. */
  readonly forDetection: NeededReturns;
  /** (Newey-West / plain standard error)², by which all counts are multiplied; 1 where it would be less or is not known. */
  readonly dependenceFactor: number;
  readonly halfWidthYears: number;
  readonly detectionYears: number;
};

export type NeedQuestion = {
  readonly returns: ArrayLike<number>;
  /** Half-width wanted and difference to be detected, as a fraction per period. */
  readonly size: number;
  readonly level: Level;
  readonly power: Level;
  readonly periodsPerYear: number;
};

/** How much more the same count tells less because returns depend on their predecessors; never below 1. */
export const dependenceFactor = (
  returns: ArrayLike<number>,
  { count, standardError }: ReturnSummary,
): number =>
  count < leastCounts.neweyWest ? 1 : Math.max(1, (neweyWest(returns).standardError / standardError) ** 2);

/**
 * How many days until one could tell?
 *
 * Convention: the smallest whole n ≥ 2 with t·s/√n ≤ size, and the smallest whole n at which a two-sided t test finds a
 * true mean of that size with the stated power (noncentral t, both tails); both for s (divisor n − 1) and for the ends of
 * its chi-square interval at the same level; multiplied by the dependence factor and rounded up.
 * Domain: at least 2 finite returns that move, refused otherwise; size above 0.
 * Units: fractions per period in; returns, and years of `periodsPerYear` returns, out.
 * Edges: below 20 returns Newey-West is too rough and the factor is 1. The counts may exceed any history.
 * Source: Student 1908; Newey & West 1987; see returnsForHalfWidth and returnsForPower.
 * Example: s of 1% and a size of 5 bp at 95%: 1,540 returns for the half-width, 3,142 to detect it with 80% power.
 */
export const need = ({ returns, size, level, power, periodsPerYear }: NeedQuestion): Result<Need> => {
  if (!(size > 0 && size < Infinity)) {
    return refuse(
      problem(
        'sizeOutside',
        `A size of ${size} can never be told from zero. Ask with one above 0, such as 5bp.`,
      ),
    );
  }
  const summary = summariseReturns(returns, leastCounts.variance, 'A count of returns needed');
  if (!summary.ok) return summary;
  const deviation = chiSquareInterval(returns, level);
  if (!deviation.ok) return deviation;
  const { sampleStandardDeviation } = summary.value;
  const factor = dependenceFactor(returns, summary.value);
  const needed = (count: (sizeInDeviations: number) => number): NeededReturns => {
    const at = (standardDeviation: number) => Math.ceil(factor * count(size / standardDeviation));
    return {
      returns: at(sampleStandardDeviation),
      lower: at(deviation.value.lower),
      upper: at(deviation.value.upper),
    };
  };
  const forHalfWidth = needed((width) => returnsForHalfWidth(width, level));
  const forDetection = needed((difference) => returnsForPower(difference, power, { level, side: 'both' }));
  return succeed({
    sampleStandardDeviation,
    deviationLower: deviation.value.lower,
    deviationUpper: deviation.value.upper,
    forHalfWidth,
    forDetection,
    dependenceFactor: factor,
    halfWidthYears: forHalfWidth.returns / periodsPerYear,
    detectionYears: forDetection.returns / periodsPerYear,
  });
};
