import { putLargestLast } from '../numerics/selection.ts';
import { compensatedSum } from '../numerics/sum.ts';

/** Losses −r, ascending; a return of 0 is a loss of 0, not of −0. */
export const lossesAscending = (returns: Float64Array): Float64Array =>
  returns.map((value) => 0 - value).sort();

/** Losses −r, of which only those from `rank` (from 1) up stand in their places; enough for VaR at that rank and the mean beyond it. */
export const worstLossesLast = (
  returns: Float64Array,
  rank: number,
  losses = new Float64Array(returns.length),
): Float64Array => {
  for (let index = 0; index < returns.length; index += 1) losses[index] = 0 - (returns[index] as number);
  putLargestLast(losses, losses.length - rank + 1);
  return losses;
};

/**
 * [Σ_{i>rank} l(i) + share·l(rank)] / expected: the mean of the `expected` largest losses, the loss at the rank counted
 * with the share that is left over.
 */
export const meanBeyond = (losses: Float64Array, rank: number, expected: number): number => {
  const beyond = losses.length - rank;
  const share = expected - beyond;
  return (compensatedSum(losses.subarray(rank)) + share * (losses[rank - 1] as number)) / expected;
};
