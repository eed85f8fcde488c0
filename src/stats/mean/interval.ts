import type { Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { criticalNormal, criticalT } from './criticalValues.ts';
import { type Ends, endsAround } from './ends.ts';

export type MeanInterval = Ends & {
  readonly mean: number;
  readonly sampleStandardDeviation: number;
  readonly standardError: number;
  readonly degreesOfFreedom: number;
  readonly criticalT: number;
  readonly normalCritical: number;
  readonly normalLower: number | null;
  readonly normalUpper: number | null;
  /** By which fraction of its proper width the normal interval is too narrow: 1 − z/t. */
  readonly normalShortfall: number;
};

/**
 * Where can the true mean lie?
 * Convention: mean ± t·s/√n, s with divisor n − 1, t of n − 1 degrees of freedom; for one side t at the level itself
 * (`above`: a lower bound, `below`: an upper bound), the other end null. Beside it the same with the normal quantile.
 * Domain: at least 2 finite returns that move; refused otherwise. Exact for independent normal returns.
 * Units: those of the returns, per period.
 * Edges: at n = 2 the interval is very wide (t = 12.7 at 95%) and right.
 * Source: Student 1908, Biometrika 6(1), 1-25.
 * Example: meanInterval([0.01, 0.02, 0.03], 95%, 'both') is 0.02 ± 4.303·0.01/√3.
 */
export const meanInterval = (returns: ArrayLike<number>, level: Level, side: Side): Result<MeanInterval> => {
  const summary = summariseReturns(returns, leastCounts.variance, 'An interval for the mean');
  if (!summary.ok) return summary;
  const { mean, sampleStandardDeviation, standardError, degreesOfFreedom } = summary.value;
  const critical = criticalT(level, side, degreesOfFreedom);
  const normalCritical = criticalNormal(level, side);
  const normal = endsAround(mean, normalCritical * standardError, side);
  return succeed({
    mean,
    sampleStandardDeviation,
    standardError,
    degreesOfFreedom,
    criticalT: critical,
    ...endsAround(mean, critical * standardError, side),
    normalCritical,
    normalLower: normal.lower,
    normalUpper: normal.upper,
    normalShortfall: critical === 0 ? 0 : 1 - normalCritical / critical,
  });
};
