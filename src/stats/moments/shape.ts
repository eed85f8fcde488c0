import { leastCounts } from '../returns/leastCounts.ts';
import { type CentralMoments, centralMoments } from './centralMoments.ts';

/** Both measures of shape, from one pass over the data. */
export type Shape = { readonly skewness: number; readonly excessKurtosis: number };

const movingMoments = (values: ArrayLike<number>, least: number, name: string): CentralMoments => {
  if (values.length < least)
    throw new RangeError(`${name}: expected at least ${least} values, got ${values.length}`);
  const moments = centralMoments(values);
  if (!(moments.m2 > 0)) throw new RangeError(`${name}: expected values that differ, got all equal`);
  return moments;
};

const skewnessOf = ({ m2, m3 }: CentralMoments): number => m3 / (m2 * Math.sqrt(m2));
const excessKurtosisOf = ({ m2, m4 }: CentralMoments): number => m4 / (m2 * m2) - 3;

/**
 * How lopsided is the distribution?
 * Convention: g1 = m3/m2^1.5, moments with divisor n.
 * Domain: at least 3 finite values that are not all equal; anything else throws.
 * Units: none.
 * Edges: symmetric data give 0; |g1| ≤ (n − 2)/√(n − 1).
 * Source: definition (Fisher's g1).
 * Example: skewness([1, 2, 6]) is 0.5951….
 */
export const skewness = (values: ArrayLike<number>): number =>
  skewnessOf(movingMoments(values, leastCounts.skewness, 'skewness'));

/**
 * How much fatter than the bell curve are the tails?
 * Convention: g2 = m4/m2² − 3, moments with divisor n; 0 for the normal distribution.
 * Domain: at least 4 finite values that are not all equal; anything else throws.
 * Units: none.
 * Edges: never below −2 (two equally frequent values).
 * Source: definition (Fisher's g2).
 * Example: excessKurtosis([−1, 1, −1, 1]) is −2.
 */
export const excessKurtosis = (values: ArrayLike<number>): number =>
  excessKurtosisOf(movingMoments(values, leastCounts.kurtosis, 'excessKurtosis'));

/** Skewness and excess kurtosis together, under the domain of the latter. */
export const shapeOf = (values: ArrayLike<number>): Shape => {
  const moments = movingMoments(values, leastCounts.kurtosis, 'shapeOf');
  return { skewness: skewnessOf(moments), excessKurtosis: excessKurtosisOf(moments) };
};

/**
 * How large an excess kurtosis is remarkable: twice its standard error √(24/n) under normality, roughly the 5% line.
 */
export const remarkableKurtosis = (count: number): number => 2 * Math.sqrt(24 / count);

/** How large a skewness is remarkable, by size: twice its standard error √(6/n) under normality. */
export const remarkableSkewness = (count: number): number => 2 * Math.sqrt(6 / count);
