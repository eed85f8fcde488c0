import { presampleVariance } from './internal/garchLikelihood.ts';

/** A volatility process in the units of the returns. A constant variance has alpha and beta 0. */
export type GarchProcess = {
  readonly mu: number;
  readonly omega: number;
  readonly alpha: number;
  readonly beta: number;
};

/** Returns taken apart into volatility and residuals, z_t = (r_t − mu)/√h_t, with the variance of the day after. */
export type FilteredReturns = {
  readonly mu: number;
  readonly residuals: Float64Array;
  readonly nextVariance: number;
};

/**
 * How volatile was each day under a known GARCH(1,1) process, and how volatile will the next one be?
 * Convention: h_t = ω + α·e²_{t−1} + β·h_{t−1} with e_t = r_t − mu; before the first day e²_0 = h_0 = mean (r − mu)².
 * Domain: at least 1 return; omega, alpha and beta ≥ 0, not all 0.
 * Units: returns as decimal fractions; omega and the next day's variance in their square; residuals have none.
 * Edges: alpha = beta = 0 is a constant variance omega. Residuals are written into the array that is given, if one is.
 * Source: Bollerslev 1986, Journal of Econometrics 31, 307-327; start as in Fiorentini, Calzolari & Panattoni 1996.
 * Example: after a day of twice the usual size the next variance is larger than the last one.
 */
export const filterByGarch = (
  returns: Float64Array,
  process: GarchProcess,
  residuals = new Float64Array(returns.length),
): FilteredReturns => {
  const { mu, omega, alpha, beta } = process;
  let variance = presampleVariance(returns, mu);
  let squared = variance;
  for (let day = 0; day < returns.length; day += 1) {
    variance = omega + alpha * squared + beta * variance;
    const deviation = (returns[day] as number) - mu;
    squared = deviation * deviation;
    residuals[day] = deviation / Math.sqrt(variance);
  }
  return { mu, residuals, nextVariance: omega + alpha * squared + beta * variance };
};

/**
 * Which returns would the same process have made of other residuals?
 * Convention: the recursion of {@link filterByGarch} run forward, r_t = mu + √h_t·z_t, from the presample variance of `returns`.
 * Domain, units, source: as there. `picks` are places in `residuals`, one for each day; `rebuilt` is written, if it is given.
 * Example: picked in their own order the residuals give the returns back.
 */
export const rebuildReturns = (
  returns: Float64Array,
  process: GarchProcess,
  residuals: Float64Array,
  picks: Uint32Array,
  rebuilt = new Float64Array(picks.length),
): Float64Array => {
  const { mu, omega, alpha, beta } = process;
  let variance = presampleVariance(returns, mu);
  let squared = variance;
  for (let day = 0; day < picks.length; day += 1) {
    variance = omega + alpha * squared + beta * variance;
    const deviation = Math.sqrt(variance) * (residuals[picks[day] as number] as number);
    squared = deviation * deviation;
    rebuilt[day] = mu + deviation;
  }
  return rebuilt;
};
