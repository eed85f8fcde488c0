import type { Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { neweyWest } from '../dependence/neweyWest.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { criticalT } from './criticalValues.ts';
import { type Ends, endsAround } from './ends.ts';

export type NeweyWestInterval = Ends & {
  readonly mean: number;
  readonly standardError: number;
  readonly bandwidth: number;
  readonly degreesOfFreedom: number;
  readonly criticalT: number;
};

/**
 * Where can the true mean lie when returns depend on their predecessors?
 * Convention: mean ± t·se, se of neweyWest, t of n − 1 degrees of freedom; one-sided as in meanInterval.
 * Domain: at least 20 finite returns in time order that move; refused otherwise.
 * Units: those of the returns, per period.
 * Edges: approximate; with few returns it holds the truth less often than its level (see the measured coverage).
 * Source: Newey & West 1987, Econometrica 55(3), 703-708.
 * Example: neweyWestInterval(returns, 95%, 'both') beside meanInterval shows what autocorrelation costs.
 */
export const neweyWestInterval = (
  returns: ArrayLike<number>,
  level: Level,
  side: Side,
): Result<NeweyWestInterval> => {
  const summary = summariseReturns(
    returns,
    leastCounts.neweyWest,
    'An interval that allows for autocorrelation',
  );
  if (!summary.ok) return summary;
  const { mean, degreesOfFreedom } = summary.value;
  const { standardError, bandwidth } = neweyWest(returns);
  const critical = criticalT(level, side, degreesOfFreedom);
  return succeed({
    mean,
    standardError,
    bandwidth,
    degreesOfFreedom,
    criticalT: critical,
    ...endsAround(mean, critical * standardError, side),
  });
};
