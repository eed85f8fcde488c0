/**
 * G(x) = [x/(1 + x) − ln(1 + x)]/x² and its slope, x > −1: what is left of the slope of ln(1 + ax)/a in a. Written
 * directly both lose every digit near 0, where a power series takes over.
 */

/** Below this |x| the series is shorter than what the closed form would lose. */
const seriesLimit = 0.05;

// G(x) = Σ_{m≥2} (−1)^{m+1}·((m − 1)/m)·x^{m−2}; fifteen terms reach 1e-17 at the limit.
const coefficients = Array.from(
  { length: 15 },
  (_, index) => ((index % 2 === 0 ? -1 : 1) * (index + 1)) / (index + 2),
);

/** G(x), −½ at 0; `logarithm` is ln(1 + x), which callers have at hand. Error below 1e-14 of the value. */
export const logarithmCurvature = (x: number, logarithm: number): number => {
  if (Math.abs(x) >= seriesLimit) return (x / (1 + x) - logarithm) / (x * x);
  let sum = 0;
  for (let index = coefficients.length - 1; index >= 0; index -= 1) {
    sum = sum * x + (coefficients[index] as number);
  }
  return sum;
};

/** G'(x), ⅔ at 0; `curvature` is G(x). Error below 1e-12 of the value. */
export const logarithmCurvatureSlope = (x: number, curvature: number): number => {
  if (Math.abs(x) >= seriesLimit) return -(1 / ((1 + x) * (1 + x)) + 2 * curvature) / x;
  let sum = 0;
  for (let index = coefficients.length - 1; index >= 1; index -= 1) {
    sum = sum * x + index * (coefficients[index] as number);
  }
  return sum;
};
