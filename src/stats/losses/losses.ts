import { compensatedSum } from '../numerics/sum.ts';

/** Losses −r, ascending; a return of 0 is a loss of 0, not of −0. */
export const lossesAscending = (returns: Float64Array): Float64Array =>
  returns.map((value) => 0 - value).sort();

/**
 * [Σ_{i>rank} l(i) + share·l(rank)] / expected: the mean of the `expected` largest losses, the loss at the rank counted
 * with the share that is left over.
 */
export const meanBeyond = (losses: Float64Array, rank: number, expected: number): number => {
  const beyond = losses.length - rank;
  const share = expected - beyond;
  return (compensatedSum(losses.subarray(rank)) + share * (losses[rank - 1] as number)) / expected;
};
