/** A sorted copy, ascending. The input is left as it is. */
export const ascending = (values: ArrayLike<number>): Float64Array => Float64Array.from(values).sort();

/**
 * The value with a given rank in ascending order: rank 1 is the smallest.
 *
 * Domain: a whole rank from 1 to the count; anything else is a bug and throws.
 * Example: `orderStatistic([3, 5, 9], 2)` is 5.
 */
export const orderStatistic = (sorted: ArrayLike<number>, rank: number): number => {
  const value = sorted[rank - 1];
  if (value === undefined) {
    throw new RangeError(`orderStatistic: rank ${rank} of ${sorted.length} values`);
  }
  return value;
};

/**
 * The sample quantile that interpolates linearly between order statistics.
 *
 * Convention: type 7 of Hyndman & Fan, position 1 + (n − 1)·p counted from 1.
 * Domain: values sorted ascending, at least one; p in [0, 1].
 * Unit: that of the values.
 * Edges: p = 0 is the smallest, p = 1 the largest value; one value is every quantile.
 * Source: Hyndman & Fan 1996, The American Statistician 50, 361-365, definition 7.
 * Example: `quantileType7([1, 2, 3, 4], 0.5)` is 2.5.
 */
export const quantileType7 = (sorted: ArrayLike<number>, p: number): number => {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`quantileType7: p = ${p} lies outside [0, 1]`);
  const position = (sorted.length - 1) * p;
  const below = Math.floor(position);
  const lower = orderStatistic(sorted, below + 1);
  if (position === below) return lower;
  const upper = orderStatistic(sorted, below + 2);
  return lower + (position - below) * (upper - lower);
};
