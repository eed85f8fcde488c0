import { type FilteredReturns, filterByGarch, type GarchProcess } from './garchPath.ts';

/** Weight of yesterday's variance. Trade practice; it is fitted to nothing here. */
export const ewmaDecay = 0.94;

/** The exponentially weighted mean as a process without a mean and without a long-run variance. */
export const ewmaProcess: GarchProcess = { mu: 0, omega: 0, alpha: 0.06, beta: ewmaDecay };

/**
 * How volatile was each day by an exponentially weighted mean of squares, and how volatile will the next one be?
 * Convention: zero mean; σ²_1 = mean r² of the window, σ²_{t+1} = 0.94·σ²_t + 0.06·r²_t; residuals z_t = r_t/σ_t.
 * Domain: at least 1 return, not all of them 0.
 * Units: returns as decimal fractions; the next day's variance in their square; residuals have none.
 * Edges: a run of zero returns lowers the variance towards 0 without reaching it.
 * Source: trade practice for the recursion, the weight and the zero mean; start from the window's mean square is ours.
 * Example: filterByEwma(Float64Array.of(0.01, -0.01)).nextVariance is 0.0001.
 */
export const filterByEwma = (returns: Float64Array): FilteredReturns => filterByGarch(returns, ewmaProcess);
