/**
 * Adds numbers so that the rounding errors of the additions are carried along and given back at the end.
 *
 * Convention: Neumaier's variant of compensated summation, in index order, so the same numbers in the same order
 * give the same bits.
 * Domain: any count; the empty sum is 0.
 * Unit: that of the values.
 * Edges: infinite or undefined values come out as plain addition gives them.
 * Source: Neumaier 1974, ZAMM 54, 39-51, algorithm IV.
 * Example: `compensatedSum([1, 1e100, 1, -1e100])` is 2.
 */
export const compensatedSum = (values: ArrayLike<number>): number => {
  let sum = 0;
  let lost = 0;
  for (let index = 0; index < values.length; index += 1) {
    const value = values[index] as number;
    const next = sum + value;
    lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return Number.isFinite(sum) ? sum + lost : sum;
};
