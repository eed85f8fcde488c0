import type { Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { criticalT } from './criticalValues.ts';
import { type Ends, endsAround } from './ends.ts';

export type LadderStep = Ends & { readonly level: Level };

/** 90, 95, 99 and 99.9%. */
export const ladderLevels: readonly Level[] = [
  { digits: 9, places: 1 },
  { digits: 95, places: 2 },
  { digits: 99, places: 2 },
  { digits: 999, places: 3 },
];

/**
 * How does the interval of the mean grow with the level?
 * Convention: the interval of meanInterval at each level of the ladder, lowest first.
 * Domain: at least 2 finite returns that move; refused otherwise.
 * Units: those of the returns, per period.
 * Edges: each step holds the one before.
 * Source: Student 1908, Biometrika 6(1), 1-25.
 * Example: meanLadder(returns, 'both')[1] is the interval at 95%.
 */
export const meanLadder = (returns: ArrayLike<number>, side: Side): Result<readonly LadderStep[]> => {
  const summary = summariseReturns(returns, leastCounts.variance, 'An interval for the mean');
  if (!summary.ok) return summary;
  const { mean, standardError, degreesOfFreedom } = summary.value;
  return succeed(
    ladderLevels.map((level) => ({
      level,
      ...endsAround(mean, criticalT(level, side, degreesOfFreedom) * standardError, side),
    })),
  );
};
