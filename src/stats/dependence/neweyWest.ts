import { centre } from '../moments/centre.ts';
import { sumOfTerms } from '../moments/sumOfTerms.ts';
import { laggedProducts } from './autocovariance.ts';

export type NeweyWest = { readonly standardError: number; readonly bandwidth: number };

/** ⌊4·(n/100)^(2/9)⌋ lags: 1 from 2 values on, 3 from 28, 4 from 100. */
export const neweyWestBandwidth = (count: number): number => Math.floor(4 * (count / 100) ** (2 / 9));

/** The standard error of the mean with Bartlett weights over a stated number of lags; see neweyWest. */
export const neweyWestStandardError = (values: ArrayLike<number>, bandwidth: number): number => {
  const count = values.length;
  if (!(Number.isInteger(bandwidth) && bandwidth >= 0 && bandwidth < count && count >= 2))
    throw new RangeError(
      `neweyWestStandardError: expected 2 or more values and a whole bandwidth below their count, got ${count} and ${bandwidth}`,
    );
  const { deviations } = centre(values);
  const weighted = (lag: number) => (1 - lag / (bandwidth + 1)) * laggedProducts(deviations, lag);
  const longRun = laggedProducts(deviations, 0) + 2 * sumOfTerms(1, bandwidth + 1, weighted);
  return Math.sqrt(longRun / count / (count - 1));
};

/**
 * How uncertain is the mean of values that depend on their predecessors?
 * Convention: se² = [g_0 + 2·Σ_{k≤L} (1 − k/(L+1))·g_k]/(n − 1), g_k the autocovariance at lag k with divisor n, so that
 * L = 0 is the plain s/√n; L = ⌊4·(n/100)^(2/9)⌋.
 * Domain: at least 2 finite values in time order; fewer throws. Below 20 it is too rough to be shown to anybody.
 * Units: those of the data; bandwidth in lags.
 * Edges: Bartlett weights keep se² above 0 unless all values are equal, which gives 0.
 * Source: Newey & West 1987, Econometrica 55(3), 703-708 (weights); the bandwidth is the first-stage rule of Newey & West
 * 1994, Review of Economic Studies 61(4), 631-653, with no data-driven second stage.
 * Example: neweyWest(returns).standardError beside s/√n shows what autocorrelation costs.
 */
export const neweyWest = (values: ArrayLike<number>): NeweyWest => {
  const bandwidth = neweyWestBandwidth(values.length);
  return { standardError: neweyWestStandardError(values, bandwidth), bandwidth };
};
