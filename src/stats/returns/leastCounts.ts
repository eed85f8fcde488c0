import { problem } from '../../terms/problem.ts';
import { type Refusal, refuse } from '../../terms/result.ts';
import { doesNotMove } from './movement.ts';

/**
 * The fewest returns for which a figure is given at all. Historical and filtered tails need ⌈1/(1 − level)⌉
 * instead, which leastCountBeyond counts from the level.
 */
export const leastCounts = {
  mean: 2,
  variance: 2,
  lag1Autocorrelation: 3,
  skewness: 3,
  kurtosis: 4,
  bootstrap: 10,
  bonett: 10,
  studentTail: 20,
  normalTail: 20,
  neweyWest: 20,
  peaks: 250,
  garch: 500,
} as const;

/** The refusal for too few returns, or null where there are enough. `figure` begins the sentence: "a standard deviation". */
export const refuseTooFew = (count: number, least: number, figure: string): Refusal | null =>
  count >= least
    ? null
    : refuse(
        problem(
          'tooFewReturns',
          `${figure} needs at least ${least} returns, and there ${count === 1 ? 'is 1' : `are ${count}`}. Ask for a window of ${least} days or more.`,
          { needs: least },
        ),
      );

/** The refusal for a price that stands still, or null where it moves. `figure` begins the sentence. */
export const refuseStill = (returns: ArrayLike<number>, figure: string): Refusal | null =>
  doesNotMove(returns)
    ? refuse(
        problem(
          'priceDoesNotMove',
          `${figure} needs returns that differ, and all ${returns.length} are ${returns[0] === 0 ? 'zero' : `the same, ${returns[0]}`}: the price does not move. Check the feed, or ask for a longer window.`,
        ),
      )
    : null;

/** Both refusals in the order in which a reader should meet them; null where the figure can be had. */
export const refuseUnusable = (returns: ArrayLike<number>, least: number, figure: string): Refusal | null =>
  refuseTooFew(returns.length, least, figure) ?? refuseStill(returns, figure);
