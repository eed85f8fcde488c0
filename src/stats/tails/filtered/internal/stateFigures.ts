import { ceilingOfCount, expectedBeyond, type Level } from '../../../../terms/level.ts';
import { meanBeyond, worstLossesLast } from '../../../losses/losses.ts';
import { orderStatistic } from '../../../numerics/quantile.ts';
import type { FilterState } from './filterSource.ts';

/** Losses as positive decimal fractions. */
export type StateFigures = { readonly var: number; readonly es: number };

/** The historical figures of the residuals' losses −z, times the next day's deviation, less mu. The losses go to `scratch`. */
export const stateFigures = (
  { mu, residuals, nextVariance }: FilterState,
  tailLevel: Level,
  scratch = new Float64Array(residuals.length),
): StateFigures => {
  const rank = ceilingOfCount(residuals.length, tailLevel);
  const losses = worstLossesLast(residuals, rank, scratch);
  const deviation = Math.sqrt(nextVariance);
  const shortfall = meanBeyond(losses, rank, expectedBeyond(losses.length, tailLevel));
  return { var: deviation * orderStatistic(losses, rank) - mu, es: deviation * shortfall - mu };
};

/** How many residuals, put on the next day's deviation, lose at least `threshold`. */
export const countAtLeast = ({ mu, residuals, nextVariance }: FilterState, threshold: number): number => {
  const bound = (threshold + mu) / Math.sqrt(nextVariance);
  let count = 0;
  for (let day = 0; day < residuals.length; day += 1) if (-(residuals[day] as number) >= bound) count += 1;
  return count;
};
