/** A function with its first two derivatives. Written into, because a fit asks for it at every step. */
export type SmoothValue = { value: number; slope: number; curvature: number };

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
