/** Σ u²·L(x), Σ u⁴·M(x), Σ u⁶·M′(x) over the returns, x = u²/nu, for the functions of the series below. */
export type TailSeries = { square: number; fourth: number; sixth: number };

/** x up to which the power series stand; 14 terms then reach the last bit. */
const seriesUpTo = 0.05;
const terms = 14;

/**
 * Near the normal limit ln(1 + x)/x and its derivatives in 1/nu lose every digit when written directly. With
 * L(x) = ln(1+x)/x, M(x) = [ln(1+x) − x/(1+x)]/x² and M′ the derivative of M, the log-likelihood and its derivatives in
 * 1/nu are sums of u²L, u⁴M and u⁶M′, each smooth down to x = 0.
 */
export const fillTailSeries = (
  values: Float64Array,
  location: number,
  scale: number,
  inverseNu: number,
  into: TailSeries,
): void => {
  let squareSum = 0;
  let fourthSum = 0;
  let sixthSum = 0;
  for (let index = 0; index < values.length; index += 1) {
    const u = ((values[index] as number) - location) / scale;
    const square = u * u;
    const x = inverseNu * square;
    let l: number;
    let m: number;
    let mSlope: number;
    if (x < seriesUpTo) {
      l = 0;
      m = 0;
      mSlope = 0;
      for (let k = terms; k >= 0; k -= 1) {
        l = 1 / (k + 1) - x * l;
        m = (k + 1) / (k + 2) - x * m;
        mSlope = -((k + 1) * (k + 2)) / (k + 3) - x * mSlope;
      }
    } else {
      const logarithm = Math.log1p(x);
      l = logarithm / x;
      m = (logarithm - x / (1 + x)) / (x * x);
      mSlope = 1 / (x * (1 + x) * (1 + x)) - (2 * m) / x;
    }
    squareSum += square * l;
    fourthSum += square * square * m;
    sixthSum += square * square * square * mSlope;
  }
  into.square = squareSum;
  into.fourth = fourthSum;
  into.sixth = sixthSum;
};
