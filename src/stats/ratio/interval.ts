import { halfTailFraction, type Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { noncentralityAt } from '../distributions/noncentralT.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';

export type RatioInterval = {
  /** Mean over sample standard deviation, per period. */
  readonly ratio: number;
  readonly lower: number;
  readonly upper: number;
  readonly degreesOfFreedom: number;
};

/**
 * Where can the true ratio of mean to standard deviation lie?
 * Convention: √n·mean/s follows a noncentral t with n − 1 degrees of freedom and noncentrality √n·ratio; the ends are the
 * ratios for which what was seen lies at either tail. s with divisor n − 1; nothing risk-free is deducted; two-sided.
 * Domain: at least 2 finite returns that move; refused otherwise. Exact for independent normal returns.
 * Units: none; per period (annualRatio carries it to a year).
 * Edges: a mean of 0 gives an interval that is symmetric about 0.
 * Source: Johnson & Welch 1940, Biometrika 31, 362-389.
 * Example: ratioInterval(returns, 95%) of 60 returns is about ratio ± 0.25.
 */
export const ratioInterval = (returns: ArrayLike<number>, level: Level): Result<RatioInterval> => {
  const summary = summariseReturns(
    returns,
    leastCounts.variance,
    'An interval for the ratio of mean to standard deviation',
  );
  if (!summary.ok) return summary;
  const { count, mean, sampleStandardDeviation, degreesOfFreedom } = summary.value;
  const root = Math.sqrt(count);
  const ratio = mean / sampleStandardDeviation;
  const beyond = halfTailFraction(level);
  return succeed({
    ratio,
    // The mirrored question keeps the small tail a small number, instead of one minus it.
    lower: -noncentralityAt(beyond, -root * ratio, degreesOfFreedom) / root,
    upper: noncentralityAt(beyond, root * ratio, degreesOfFreedom) / root,
    degreesOfFreedom,
  });
};
