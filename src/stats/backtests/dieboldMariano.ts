import { robustAutocorrelation } from '../dependence/autocorrelation.ts';
import { dependenceFoundBelow } from '../dependence/clustering.ts';
import { neweyWest } from '../dependence/neweyWest.ts';
import { studentTTwoSidedTail } from '../distributions/studentT.ts';
import { sampleStandardDeviation } from '../moments/deviation.ts';
import { arithmeticMean } from '../moments/mean.ts';

export type DieboldMariano = {
  /** Positive where the first model lost more. */
  readonly statistic: number;
  readonly p: number;
  readonly variance: 'plain' | 'neweyWest';
};

/**
 * Does one model's loss differ from another's by more than chance?
 *
 * Convention: mean of the daily differences over its standard error, horizon one day, two-sided t with T − 1 degrees of
 * freedom. With the small-sample correction √((T − 1)/T) the plain standard error is s/√T, s with divisor T − 1.
 * Newey-West takes its place when the robust autocorrelation test of the differences has p < 0.05.
 * Domain: losses of the same days in date order, as many of one as of the other.
 * Units: losses in, a number without unit and a probability out.
 * Edges: null for fewer than two days and for identical losses (or differences that never vary): nothing to test.
 * Source: Diebold & Mariano 1995, Journal of Business & Economic Statistics 13, 253-263; correction: Harvey, Leybourne &
 * Newbold 1997, International Journal of Forecasting 13, 281-291, equation 9.
 * Example: differences 1, 2, 3 give 2/(1/√3) = 3.46 with p = 0.0742.
 */
export const dieboldMariano = (first: Float64Array, second: Float64Array): DieboldMariano | null => {
  if (first.length !== second.length)
    throw new RangeError(
      `dieboldMariano: ${first.length} and ${second.length} losses are not of the same days`,
    );
  const differences = first.map((loss, day) => loss - (second[day] as number));
  const days = differences.length;
  if (days < 2) return null;
  const deviation = sampleStandardDeviation(differences);
  if (deviation === 0) return null;
  const dependent = robustAutocorrelation(differences).p < dependenceFoundBelow;
  const standardError = dependent ? neweyWest(differences).standardError : deviation / Math.sqrt(days);
  const statistic = arithmeticMean(differences) / standardError;
  return {
    statistic,
    p: studentTTwoSidedTail(statistic, days - 1),
    variance: dependent ? 'neweyWest' : 'plain',
  };
};
