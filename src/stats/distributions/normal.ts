import { errorFunctionShare, millsRatio } from './internal/millsRatio.ts';
import { quantileOfNormal } from './internal/normalQuantile.ts';

const inverseRootTwoPi = 1 / Math.sqrt(2 * Math.PI);

/** Beyond this the density and the tail are below the smallest double. */
const underflowsFrom = 39;

/** exp(−z²/2) with the square split so that its rounding does not grow with z. */
const halfSquareDecay = (z: number): number => {
  const coarse = Math.trunc(z * 16) / 16;
  const fine = (z - coarse) * (z + coarse);
  return Math.exp(-0.5 * coarse * coarse) * Math.exp(-0.5 * fine);
};

const mustBeNumber = (name: string, z: number): void => {
  if (Number.isNaN(z)) throw new RangeError(`${name}: z is not a number`);
};

/**
 * How dense is the standard normal distribution at z?
 *
 * Convention: φ(z) = exp(−z²/2)/√(2π).
 * Domain: any z, infinite ones included; NaN throws.
 * Unit: z in standard deviations; density per standard deviation.
 * Edges: 0 from |z| = 39 on, where the figure is below the smallest double.
 * Source: definition.
 * Example: `normalDensity(0)` is 0.398942280401433.
 */
export const normalDensity = (z: number): number => {
  mustBeNumber('normalDensity', z);
  return Math.abs(z) >= underflowsFrom ? 0 : inverseRootTwoPi * halfSquareDecay(z);
};

/**
 * How likely is a standard normal number above z?
 *
 * Convention: upper tail, 1 − Φ(z), never formed by that subtraction for z > 0.
 * Domain: any z, infinite ones included; NaN throws.
 * Unit: z in standard deviations; probability as a fraction.
 * Edges: 0 from z = 39 on. Relative error below 1e-15, up to z = 37.5 where the figure stops being a normal double.
 * Source: rational approximations of Cody 1969, Mathematics of Computation 23, 631-637.
 * Example: `normalUpperTail(1.96)` is 0.0249978951482204.
 */
export const normalUpperTail = (z: number): number => {
  mustBeNumber('normalUpperTail', z);
  if (z < -nearCentre) return 1 - farUpperTail(-z);
  if (z > nearCentre) return farUpperTail(z);
  const x = z * Math.SQRT1_2;
  return 0.5 - 0.5 * x * errorFunctionShare(x);
};

/** Up to here the tail comes from the series of erf around 0. */
const nearCentre = 0.6;

const farUpperTail = (z: number): number =>
  z >= underflowsFrom ? 0 : inverseRootTwoPi * halfSquareDecay(z) * millsRatio(z);

/**
 * How likely is a standard normal number at or below z?
 *
 * Convention: Φ(z), computed as the upper tail at −z, so the lower tail keeps its relative accuracy.
 * Domain, unit, edges and source: as {@link normalUpperTail}.
 * Example: `normalCdf(-1.96)` is 0.0249978951482204.
 */
export const normalCdf = (z: number): number => {
  mustBeNumber('normalCdf', z);
  return normalUpperTail(-z);
};

/**
 * Below which point does a standard normal number fall with probability p?
 *
 * Convention: p is the lower tail. For a small upper tail q take −normalQuantile(q); 1 − q would lose its digits.
 * Domain: 0 < p < 1, down to the smallest double; anything else throws.
 * Unit: probability as a fraction; the point in standard deviations.
 * Edges: exactly 0 at one half. Relative error below 1e-15.
 * Source: Wichura 1988, Applied Statistics 37, 477-484, algorithm AS 241 (PPND16).
 * Example: `normalQuantile(0.975)` is 1.95996398454005.
 */
export const normalQuantile = (p: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`normalQuantile: p = ${p} does not lie inside (0, 1)`);
  return quantileOfNormal(p);
};
