import { type Level, levelFraction, tailFraction } from '../../../terms/level.ts';
import { binomialCdf, binomialUpperTail } from '../../distributions/binomial.ts';

/** Ranks from 1, null where no rank will do; `attained` is the exact coverage of the pair. */
export type BoundingRanks = {
  readonly lower: number | null;
  readonly upper: number | null;
  readonly attained: number;
};

/**
 * The ranks of the losses between which the quantile of order `level` lies. With B ~ Bin(count, level) losses below it,
 * the lower rank is the largest with P(B ≤ rank − 1) ≤ beyond, the upper the smallest with P(B ≥ rank) ≤ beyond.
 */
export const boundingRanks = (count: number, level: number, beyond: number): BoundingRanks => {
  const below = (rank: number) => binomialCdf(rank - 1, count, level);
  const above = (rank: number) => binomialUpperTail(rank, count, level);
  const middle = Math.round(count * level);
  let lower = middle;
  while (lower < count && below(lower + 1) <= beyond) lower += 1;
  while (lower > 0 && below(lower) > beyond) lower -= 1;
  let upper = middle;
  while (upper > 1 && above(upper - 1) <= beyond) upper -= 1;
  while (upper <= count && above(upper) > beyond) upper += 1;
  return {
    lower: lower === 0 ? null : lower,
    upper: upper > count ? null : upper,
    attained: 1 - (lower === 0 ? 0 : below(lower)) - (upper > count ? 0 : above(upper)),
  };
};

/** The smallest count n with factor^n ≤ beyond. */
const smallestCount = (logFactor: number, beyond: number): number => {
  const logBeyond = Math.log(beyond);
  let count = Math.max(1, Math.floor(logBeyond / logFactor) - 1);
  while (count * logFactor > logBeyond) count += 1;
  return count;
};

/** How many returns are enough for their largest loss to bound the quantile from above. */
export const countThatBoundsAbove = (level: Level, beyond: number): number =>
  smallestCount(Math.log1p(-tailFraction(level)), beyond);

/** How many returns are enough for their smallest loss to bound the quantile from below. */
export const countThatBoundsBelow = (level: Level, beyond: number): number =>
  smallestCount(Math.log1p(-levelFraction(level)), beyond);
