import { chiSquareUpperTail } from '../distributions/chiSquare.ts';
import { centre } from '../moments/centre.ts';
import { sumOfTerms } from '../moments/sumOfTerms.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { laggedProducts } from './autocovariance.ts';

/** A statistic over several lags with its chi-square p. With no lag (fewer than 5 values) q is 0 and p is 1. */
export type LagTest = { readonly q: number; readonly p: number; readonly lags: number };

/** Lags that n values can carry in a test: a fifth of them, at most 10. */
export const testedLags = (count: number): number => Math.min(10, Math.floor(count / 5));

const lagTest = (q: number, lags: number): LagTest => ({
  q,
  p: lags === 0 ? 1 : chiSquareUpperTail(q, lags),
  lags,
});

const movingDeviations = (values: ArrayLike<number>, name: string): Float64Array => {
  const { deviations } = centre(values);
  if (deviations.every((deviation) => deviation === 0))
    throw new RangeError(`${name}: expected values that differ, got all equal`);
  return deviations;
};

/**
 * Does a value tell something about the next one?
 * Convention: r1 = Σ (x[t] − mean)(x[t−1] − mean) / Σ (x[t] − mean)², one mean for both factors.
 * Domain: at least 3 finite values in time order that are not all equal; anything else throws.
 * Units: none; −1..1.
 * Edges: n values that alternate give −(n − 1)/n, not −1.
 * Source: Box & Jenkins 1976, Time Series Analysis.
 * Example: lag1Autocorrelation([1, 2, 3]) is 0.
 */
export const lag1Autocorrelation = (values: ArrayLike<number>): number => {
  if (values.length < leastCounts.lag1Autocorrelation)
    throw new RangeError(`lag1Autocorrelation: expected at least 3 values, got ${values.length}`);
  const deviations = movingDeviations(values, 'lag1Autocorrelation');
  return laggedProducts(deviations, 1) / laggedProducts(deviations, 0);
};

/**
 * Is there autocorrelation at any of the first lags?
 * Convention: n(n + 2)·Σ r_k²/(n − k) over k = 1..lags; p from the chi-square distribution with that many degrees of
 * freedom. `lags` is min(10, ⌊n/5⌋) unless given.
 * Domain: finite values in time order that are not all equal, 0 ≤ lags < n; anything else throws.
 * Units: none; p in 0..1.
 * Edges: rejects for volatility clustering alone, about one time in five at n = 250; robustAutocorrelation does not.
 * Source: Ljung & Box 1978, Biometrika 65(2), 297-303.
 * Example: ljungBox(returns, 10).p below 0.05 speaks of autocorrelation or of clustering.
 */
export const ljungBox = (values: ArrayLike<number>, lags: number = testedLags(values.length)): LagTest => {
  const count = values.length;
  if (!(Number.isInteger(lags) && lags >= 0 && lags < count))
    throw new RangeError(`ljungBox: expected a whole number of lags from 0 to ${count - 1}, got ${lags}`);
  const deviations = movingDeviations(values, 'ljungBox');
  const total = laggedProducts(deviations, 0);
  const sum = sumOfTerms(
    1,
    lags + 1,
    (lag) => (laggedProducts(deviations, lag) / total) ** 2 / (count - lag),
  );
  return lagTest(count * (count + 2) * sum, lags);
};

/** (Σ e[t]e[t−k])² / Σ e[t]²e[t−k]²; nothing where every product is 0. */
const robustTerm = (deviations: Float64Array, lag: number): number => {
  const products = (index: number) => (deviations[index] as number) * (deviations[index - lag] as number);
  const spread = sumOfTerms(lag, deviations.length, (index) => products(index) ** 2);
  return spread > 0 ? laggedProducts(deviations, lag) ** 2 / spread : 0;
};

/**
 * Is there autocorrelation at any of the first lags, whatever the volatility does meanwhile?
 * Convention: Σ_k (Σ_t e_t e_{t−k})² / Σ_t e_t² e_{t−k}² over k = 1..min(10, ⌊n/5⌋), e the deviations from the mean;
 * p from the chi-square distribution with that many degrees of freedom.
 * Domain: at least 1 finite value, in time order.
 * Units: none; p in 0..1.
 * Edges: fewer than 5 values have no lag to test: q 0, p 1, lags 0. A lag at which every product is 0 (values that are
 * all equal, say) adds nothing.
 * Source: Lo & MacKinlay 1989, Journal of Econometrics 40, 203-238; Dalla, Giraitis & Phillips 2022, Econometric
 * Theory 38(6), the sum of squared robust t statistics.
 * Example: robustAutocorrelation(squares).p below 0.05 speaks of volatility clustering.
 */
export const robustAutocorrelation = (values: ArrayLike<number>): LagTest => {
  const { deviations } = centre(values);
  const lags = testedLags(values.length);
  return lagTest(
    sumOfTerms(1, lags + 1, (lag) => robustTerm(deviations, lag)),
    lags,
  );
};
