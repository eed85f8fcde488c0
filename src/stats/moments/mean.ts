import { centre } from './centre.ts';

/**
 * What is the average?
 * Convention: arithmetic mean, sum over count.
 * Domain: at least 1 finite value; an empty array throws.
 * Units: those of the data.
 * Edges: one value is its own mean.
 * Source: definition; the sum is compensated and the quotient refined once.
 * Example: arithmeticMean([0.01, 0.03]) is 0.02.
 */
export const arithmeticMean = (values: ArrayLike<number>): number => centre(values).mean;
