import { type LagTest, robustAutocorrelation } from './autocorrelation.ts';

/** Below this probability dependence is taken as found, wherever it decides what a reply trusts. */
export const dependenceFoundBelow = 0.05;

/**
 * Does a volatile day tell something about the volatility of the next ones?
 * Convention: robustAutocorrelation of the squared returns, taken around zero.
 * Domain: at least 1 finite return, in time order.
 * Units: returns as decimal fractions; p in 0..1.
 * Edges: fewer than 5 returns have no lag to test: p 1.
 * Source: as robustAutocorrelation; squares as in McLeod & Li 1983, Journal of Time Series Analysis 4(4), 269-273.
 * Example: volatilityClustering(returns).p below 0.05 says that calm and wild stretches alternate.
 */
export const volatilityClustering = (returns: ArrayLike<number>): LagTest =>
  robustAutocorrelation(Float64Array.from(returns, (value) => value * value));
