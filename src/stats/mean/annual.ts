/**
 * What is a mean per period over a year?
 * Convention: mean × periods a year, arithmetic and not compounded. `periodsPerYear` is the desk's own (252 trading days
 * is trade practice and has no source).
 * Units: decimal fraction per period in, per year out; ends of intervals are carried the same way.
 * Example: annualMean(0.0005, 252) is 0.126.
 */
export const annualMean = (meanPerPeriod: number, periodsPerYear: number): number =>
  meanPerPeriod * periodsPerYear;

/**
 * What is a standard deviation per period over a year?
 * Convention: s × √(periods a year), which holds without autocorrelation only.
 * Units: decimal fraction per period in, per year out.
 * Source: Lo 2002, Financial Analysts Journal 58(4), 36-52, for what autocorrelation does to it.
 * Example: annualDeviation(0.01, 252) is 0.1587….
 */
export const annualDeviation = (deviationPerPeriod: number, periodsPerYear: number): number =>
  deviationPerPeriod * Math.sqrt(periodsPerYear);

/**
 * What is the ratio of mean to standard deviation over a year?
 * Convention: ratio × √(periods a year), under the same condition as annualDeviation.
 * Units: none in, none out.
 * Source: Lo 2002, Financial Analysts Journal 58(4), 36-52.
 * Example: annualRatio(0.05, 252) is 0.7937….
 */
export const annualRatio = (ratioPerPeriod: number, periodsPerYear: number): number =>
  ratioPerPeriod * Math.sqrt(periodsPerYear);
