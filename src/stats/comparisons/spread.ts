import { betaUpperTail } from '../distributions/beta.ts';
import { studentTTwoSidedTail } from '../distributions/studentT.ts';
import { centre } from '../moments/centre.ts';
import { sampleStandardDeviation } from '../moments/deviation.ts';
import { arithmeticMean } from '../moments/mean.ts';
import { sumOfTerms } from '../moments/sumOfTerms.ts';
import { ascending, quantileType7 } from '../numerics/quantile.ts';
import { compensatedSum } from '../numerics/sum.ts';
import { doesNotMove } from '../returns/movement.ts';
import { pairedDifferences } from './meanDifference.ts';

export type SpreadTest = { readonly statistic: number; readonly p: number };

const leastInGroup = 3;

/** |x − median|; the median of an even count is the middle of its two middle values. */
const distancesFromMedian = (values: ArrayLike<number>): Float64Array => {
  const median = quantileType7(ascending(values), 0.5);
  return Float64Array.from(values, (value) => Math.abs(value - median));
};

type Distances = {
  readonly count: number;
  readonly mean: number;
  readonly within: number;
  readonly still: boolean;
};

/** How many, how far on average, and how unevenly: Σ of squared deviations of the distances from their mean. */
const summariseDistances = (values: ArrayLike<number>): Distances => {
  const distances = distancesFromMedian(values);
  const { mean, deviations } = centre(distances);
  const within = sumOfTerms(0, deviations.length, (index) => (deviations[index] as number) ** 2);
  return { count: deviations.length, mean, within, still: doesNotMove(distances) };
};

/**
 * Do independent periods differ in their spread?
 *
 * Convention: one-way analysis of variance of |x − median|, F with k − 1 and N − k degrees of freedom.
 * Domain: at least two groups of at least 3 values (in a pair both lie equally far from the median); null where the
 * distances do not vary within any group.
 * Units: a number without unit and a probability out; the data's unit does not matter.
 * Edges: holds its level for fat tails, not for dependent groups: see pairedSpreadTest.
 * Source: Brown & Forsythe 1974, Journal of the American Statistical Association 69, 364-367.
 * Example: for two groups p is that of a two-sided t of √F with N − 2 degrees of freedom.
 */
export const brownForsytheTest = (groups: readonly ArrayLike<number>[]): SpreadTest | null => {
  if (groups.length < 2 || groups.some((group) => group.length < leastInGroup)) return null;
  const distances = groups.map(summariseDistances);
  if (distances.every(({ still }) => still)) return null;
  const within = compensatedSum(distances.map((group) => group.within));
  const count = compensatedSum(distances.map((group) => group.count));
  const grandMean = compensatedSum(distances.map((group) => group.count * group.mean)) / count;
  const between = compensatedSum(distances.map((group) => group.count * (group.mean - grandMean) ** 2));
  return fTest(between, within, groups.length - 1, count - groups.length);
};

/** P(F > f) is the share of a beta variable above between/(between + within). */
const fTest = (between: number, within: number, numeratorDf: number, denominatorDf: number): SpreadTest => ({
  statistic: between / numeratorDf / (within / denominatorDf),
  p: betaUpperTail(between / (between + within), numeratorDf / 2, denominatorDf / 2),
});

/**
 * Do two tickers differ in their spread on the same days?
 *
 * Convention: paired t on |x − median x| − |y − median y|, n − 1 degrees of freedom, two-sided; positive where the first
 * spreads more.
 * Domain: pairs of common dates, at least 3; null below, and where the differences do not vary.
 * Units: a number without unit and a probability out.
 * Edges: a test for independent groups would reject far too seldom here: never, at a correlation of 0.9.
 * Source: the distances are those of Brown & Forsythe 1974; pairing them is ours.
 * Example: a ticker against itself doubled: positive, and p falls as the days grow.
 */
export const pairedSpreadTest = (first: ArrayLike<number>, second: ArrayLike<number>): SpreadTest | null => {
  if (first.length < leastInGroup) return null;
  const differences = pairedDifferences(distancesFromMedian(first), distancesFromMedian(second));
  if (doesNotMove(differences)) return null;
  const standardError = sampleStandardDeviation(differences) / Math.sqrt(differences.length);
  const statistic = arithmeticMean(differences) / standardError;
  return { statistic, p: studentTTwoSidedTail(statistic, differences.length - 1) };
};
