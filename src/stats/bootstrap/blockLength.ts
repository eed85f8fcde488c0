import { laggedProducts } from '../dependence/autocovariance.ts';
import { centre } from '../moments/centre.ts';
import { leastCounts } from '../returns/leastCounts.ts';

/** 1 up to half of the bandwidth, then falling in a straight line to 0. */
const flatTopWeight = (share: number): number => (share <= 0.5 ? 1 : 2 * (1 - share));

/** The last lag that matters: followed by a whole run of negligible ones, or else the last that is not negligible. */
const lastLag = (correlations: Float64Array, negligible: number, run: number): number => {
  let negligibleOnEnd = 0;
  let last = 0;
  for (let lag = 1; lag < correlations.length; lag += 1) {
    if (Math.abs(correlations[lag] as number) < negligible) negligibleOnEnd += 1;
    else {
      negligibleOnEnd = 0;
      last = lag;
    }
    if (negligibleOnEnd === run) return lag - run;
  }
  return last;
};

/**
 * How long should blocks be, on average, so that a stationary bootstrap of the mean keeps the dependence?
 * Convention: (2·G²/D)^(1/3)·n^(1/3) with D = 2·g(0)², g(0) the flat-top estimate of the long-run variance and G that of
 * Σ|k|·R(k), autocovariances of divisor n; a lag is negligible where |r| < 2·√(log10 n / n); K = max(5, ⌈√log10 n⌉)
 * negligible lags on end close the search among the first ⌈√n⌉ + K; bandwidth twice the last lag that matters, at least 2.
 * The result is clipped to [1, ⌈min(3√n, n/3)⌉].
 * Domain: at least 10 finite values in time order; fewer throws.
 * Units: in values (days); any real number.
 * Edges: values that are all equal give 1.
 * Source: Politis & White 2004, Econometric Reviews 23(1), 53-70; D as corrected by Patton, Politis & White 2009,
 * Econometric Reviews 28(4), 372-375. The least bandwidth of 2 (where no lag matters) is that of the authors' program.
 * Example: white noise of 60 values gets blocks of 1 to 3 on average.
 */
export const stationaryBlockLength = (values: ArrayLike<number>): number => {
  const count = values.length;
  if (count < leastCounts.bootstrap)
    throw new RangeError(
      `stationaryBlockLength: expected at least ${leastCounts.bootstrap} values, got ${count}`,
    );
  const { deviations } = centre(values);
  const run = Math.max(5, Math.ceil(Math.sqrt(Math.log10(count))));
  const lagCount = Math.min(Math.ceil(Math.sqrt(count)) + run, count - 1);
  const products = Float64Array.from({ length: lagCount + 1 }, (_, lag) => laggedProducts(deviations, lag));
  const total = products[0] as number;
  if (total === 0) return 1;
  const correlations = products.map((product) => product / total);
  const negligible = 2 * Math.sqrt(Math.log10(count) / count);
  const bandwidth = Math.min(2 * Math.max(lastLag(correlations, negligible, run), 1), lagCount);
  let longRun = 1;
  let slope = 0;
  for (let lag = 1; lag <= bandwidth; lag += 1) {
    const weighted = 2 * flatTopWeight(lag / bandwidth) * (correlations[lag] as number);
    longRun += weighted;
    slope += lag * weighted;
  }
  const longest = Math.ceil(Math.min(3 * Math.sqrt(count), count / 3));
  const optimal = slope === 0 ? 1 : Math.cbrt((slope / longRun) ** 2 * count);
  return Math.min(Math.max(optimal, 1), longest);
};
