/** What is to be solved: `residual` rises through zero at the quantile, `slope` is its derivative. */
export type QuantileSearch = {
  readonly start: number;
  readonly low: number;
  readonly high: number;
  readonly residual: (x: number) => number;
  readonly slope: (x: number) => number;
};

/** A step below this share leaves, after a step whose error is of second order, nothing that a double could show. */
const lastStep = 1e-9;

/**
 * Newton's method kept inside a shrinking bracket: a step that leaves it, or that is not a number, is replaced by
 * halving. Ends after at most 200 evaluations with the best point there is.
 */
export const finishQuantile = ({ start, low, high, residual, slope }: QuantileSearch): number => {
  let left = low;
  let right = high;
  let x = start > low && start < high ? start : (low + high) / 2;
  for (let evaluations = 0; evaluations < 200; evaluations += 1) {
    const miss = residual(x);
    if (miss === 0) return x;
    if (miss > 0) right = x;
    else left = x;
    const step = -miss / slope(x);
    const next = x + step;
    const inside = next > left && next < right;
    const accepted = inside ? next : (left + right) / 2;
    if (accepted === x || (Math.abs(step) <= lastStep * Math.abs(x) && inside)) return accepted;
    if (right - left <= Number.EPSILON * Math.abs(x)) return accepted;
    x = accepted;
  }
  return x;
};
