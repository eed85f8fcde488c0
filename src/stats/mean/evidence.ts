import {
  type LagTest,
  lag1Autocorrelation,
  ljungBox,
  robustAutocorrelation,
} from '../dependence/autocorrelation.ts';
import { dependenceFoundBelow } from '../dependence/clustering.ts';
import { excessKurtosis, remarkableSkewness, skewness } from '../moments/shape.ts';
import { leastCounts } from '../returns/leastCounts.ts';

/** What speaks for or against the plain interval; a figure that so few returns cannot carry is null. */
export type MeanEvidence = {
  readonly lag1Autocorrelation: number | null;
  readonly ljungBox: LagTest | null;
  readonly robustAutocorrelation: LagTest | null;
  readonly skewness: number | null;
  readonly excessKurtosis: number | null;
  /** The robust test of autocorrelation has p < 0.05. */
  readonly dependent: boolean;
  /** |g1| > 2·√(6/n) and n < 100: beyond that count the mean is close enough to normal all the same. */
  readonly lopsided: boolean;
};

const skewnessMattersBelow = 100;

/** For returns that move. */
export const meanEvidence = (returns: ArrayLike<number>): MeanEvidence => {
  const count = returns.length;
  const robust = robustAutocorrelation(returns);
  const lopsidedness = count >= leastCounts.skewness ? skewness(returns) : null;
  return {
    lag1Autocorrelation: count >= leastCounts.lag1Autocorrelation ? lag1Autocorrelation(returns) : null,
    ljungBox: robust.lags > 0 ? ljungBox(returns) : null,
    robustAutocorrelation: robust.lags > 0 ? robust : null,
    skewness: lopsidedness,
    excessKurtosis: count >= leastCounts.kurtosis ? excessKurtosis(returns) : null,
    dependent: robust.p < dependenceFoundBelow,
    lopsided:
      lopsidedness !== null &&
      count < skewnessMattersBelow &&
      Math.abs(lopsidedness) > remarkableSkewness(count),
  };
};
