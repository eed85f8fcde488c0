import { studentTDensity, studentTQuantile } from '../../distributions/studentT.ts';

/** A function of 1/nu with its first two derivatives. */
export type SmoothValue = { value: number; slope: number; curvature: number };

/** The quantile of t(nu) that `tail` lies above; VaR in scales beyond the location. nu may be Infinity. */
export const quantileMultiplier = (tail: number, nu: number): number => -studentTQuantile(tail, nu);

/** (1 − 1/nu) times the mean of t(nu) beyond that quantile, which stays finite at nu = 1. */
export const shortfallNumerator = (tail: number, nu: number): number => {
  const quantile = studentTQuantile(tail, nu);
  return (studentTDensity(quantile, nu) / tail) * (1 + (quantile / nu) * quantile);
};

/** The mean of t(nu) beyond its quantile, nu > 1: ES in scales beyond the location. */
export const shortfallMultiplier = (tail: number, nu: number): number =>
  shortfallNumerator(tail, nu) / (1 - 1 / nu);

/** Step of the differences: their error, relative to the slope, is then near 1e-8, and the profile feels its square. */
const step = 1e-4;

/** Differences in 1/nu of f(nu), one-sided next to the normal limit. f must vary slowly: a logarithm, say. */
export const fillByDifferences = (f: (nu: number) => number, inverseNu: number, into: SmoothValue): void => {
  const oneSided = inverseNu < step;
  const middle = oneSided ? inverseNu + step : inverseNu;
  const first = f(1 / (middle - step));
  const second = f(1 / middle);
  const third = f(1 / (middle + step));
  into.value = oneSided ? first : second;
  into.curvature = (first - 2 * second + third) / (step * step);
  into.slope = (third - first) / (2 * step) - (oneSided ? step * into.curvature : 0);
};
