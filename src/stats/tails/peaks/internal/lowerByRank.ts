/** Twice the loss of binomial log-likelihood when `hits` of `count` were expected with chance `tail`. */
const deviance = (hits: number, count: number, tail: number): number => {
  const part = (seen: number, expected: number) => (seen === 0 ? 0 : seen * Math.log(seen / expected));
  return 2 * (part(hits, count * tail) + part(count - hits, count * (1 - tail)));
};

/**
 * The smallest loss that the likelihood ratio still allows as VaR when it reaches below the threshold, where the tail is
 * the empirical one: at a loss with N larger ones the ratio is that of N in n. At the threshold it meets the profile of
 * the fitted tail. Losses ascending; `beyond` of them are larger than the threshold.
 */
export const lowerEndByRank = (losses: Float64Array, beyond: number, tail: number, reach: number): number => {
  const count = losses.length;
  let rank = count - beyond;
  while (rank > 1 && deviance(count - rank + 1, count, tail) <= reach * reach) rank -= 1;
  return losses[rank - 1] as number;
};
