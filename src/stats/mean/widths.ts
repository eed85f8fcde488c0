import type { Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { criticalT } from './criticalValues.ts';

export type MeanWidth = { readonly returnCount: number; readonly halfWidth: number };

const multiples = [2, 4, 10] as const;

/**
 * How much sharper would the mean be with more returns like these?
 * Convention: t·s/√N at N = 2n, 4n and 10n, with t of N − 1 degrees of freedom and s held as it is; for one side the
 * distance from the mean to the only end.
 * Domain: at least 2 finite returns that move; refused otherwise.
 * Units: those of the returns, per period.
 * Edges: four times the returns give half the width, and a little less from a smaller t.
 * Source: Student 1908, Biometrika 6(1), 1-25; the standard deviation will in truth change with the window.
 * Example: meanWidths(returns, 95%, 'both')[1] is the half-width at 4n.
 */
export const meanWidths = (
  returns: ArrayLike<number>,
  level: Level,
  side: Side,
): Result<readonly MeanWidth[]> => {
  const summary = summariseReturns(returns, leastCounts.variance, 'An interval for the mean');
  if (!summary.ok) return summary;
  const { count, sampleStandardDeviation } = summary.value;
  return succeed(
    multiples.map((multiple) => {
      const returnCount = multiple * count;
      const critical = criticalT(level, side, returnCount - 1);
      return { returnCount, halfWidth: (critical * sampleStandardDeviation) / Math.sqrt(returnCount) };
    }),
  );
};
