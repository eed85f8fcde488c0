import { halfTailFraction, type Level, levelFraction, tailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { excessKurtosis, remarkableKurtosis } from '../moments/shape.ts';
import { summariseReturns } from '../moments/summary.ts';
import { ascending, quantileType7 } from '../numerics/quantile.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { criticalT } from './criticalValues.ts';
import { type Ends, endsAround, endsOnSide } from './ends.ts';

export type PredictionInterval = Ends & {
  /** The window's own quantiles (type 7) at the same probabilities. */
  readonly empirical: Ends;
  /** The tails are too fat for the bell curve at so high a level: the interval will be crossed more often than it says. */
  readonly tooNarrow: boolean;
};

/** Fat tails tell from 99% on. */
const isHigh = (level: Level): boolean => level.digits * 100 >= 99 * 10 ** level.places;

const fatTailed = (returns: ArrayLike<number>): boolean =>
  returns.length >= leastCounts.kurtosis && excessKurtosis(returns) > remarkableKurtosis(returns.length);

const empiricalEnds = (returns: ArrayLike<number>, level: Level, side: Side): Ends => {
  const sorted = ascending(returns);
  const lowerP = side === 'both' ? halfTailFraction(level) : tailFraction(level);
  const upperP = side === 'both' ? levelFraction(level) + halfTailFraction(level) : levelFraction(level);
  return endsOnSide(quantileType7(sorted, lowerP), quantileType7(sorted, upperP), side);
};

/**
 * Where would one more return lie, if tomorrow is like the average day of this window?
 * Convention: mean ± t·s·√(1 + 1/n), s with divisor n − 1, t of n − 1 degrees of freedom; beside it the window's
 * quantiles of type 7 (Hyndman & Fan 1996). One-sided as in meanInterval.
 * Domain: at least 2 finite returns that move; refused otherwise. Exact for independent normal returns.
 * Units: those of the returns, per period.
 * Edges: tooNarrow from 99% on when the excess kurtosis exceeds 2·√(24/n); below 4 returns kurtosis is not looked at.
 * Source: Student's interval for a further observation; Hahn & Meeker 1991, Statistical Intervals, section 4.7.
 * Example: predictionInterval(returns, 95%, 'both') is about four s wide and hardly narrows with more returns.
 */
export const predictionInterval = (
  returns: ArrayLike<number>,
  level: Level,
  side: Side,
): Result<PredictionInterval> => {
  const summary = summariseReturns(returns, leastCounts.variance, 'A prediction for one further return');
  if (!summary.ok) return summary;
  const { mean, sampleStandardDeviation, degreesOfFreedom, count } = summary.value;
  const halfWidth =
    criticalT(level, side, degreesOfFreedom) * sampleStandardDeviation * Math.sqrt(1 + 1 / count);
  return succeed({
    ...endsAround(mean, halfWidth, side),
    empirical: empiricalEnds(returns, level, side),
    tooNarrow: isHigh(level) && fatTailed(returns),
  });
};
