import { studentDensity } from './internal/studentDensity.ts';
import { upperStudentQuantile } from './internal/studentQuantile.ts';
import { twoSidedTail } from './internal/studentTail.ts';
import { normalDensity, normalQuantile, normalUpperTail } from './normal.ts';

/** From here on the t and the normal distribution have the same doubles wherever these are above 1e-300. */
const normalFrom = 1e20;

const mustBeInDomain = (name: string, t: number, nu: number): void => {
  if (!(nu > 0)) throw new RangeError(`${name}: nu = ${nu} is not above 0`);
  if (Number.isNaN(t)) throw new RangeError(`${name}: t is not a number`);
};

/**
 * How dense is Student's t distribution at t?
 *
 * Convention: scale 1, which is not the standard deviation; nu degrees of freedom, real, Infinity is the normal.
 * Domain: nu > 0, any t; anything else throws.
 * Unit: t in units of the scale; density per unit of the scale.
 * Edges: 0 at infinite t. Relative error below 1e-13.
 * Source: Student 1908, Biometrika 6, 1-25; Fisher 1925 for real nu.
 * Example: `studentTDensity(0, 4)` is 0.375.
 */
export const studentTDensity = (t: number, nu: number): number => {
  mustBeInDomain('studentTDensity', t, nu);
  return nu >= normalFrom ? normalDensity(t) : studentDensity(t, nu);
};

/**
 * How likely is a t distributed number farther from 0 than t, on either side?
 *
 * Convention: P(|T| > |t|), the p value of a two-sided t test; never formed as 1 minus something.
 * Domain: nu > 0, any t; anything else throws.
 * Unit: t in units of the scale; probability as a fraction.
 * Edges: 1 at t = 0, 0 at infinite t. Relative error below 1e-13 wherever the figure is a normal double.
 * Source: regularised incomplete beta function, Didonato & Morris 1992 (how: in internal/studentTail.ts).
 * Example: `studentTTwoSidedTail(2.09302405440831, 19)` is 0.05.
 */
export const studentTTwoSidedTail = (t: number, nu: number): number => {
  mustBeInDomain('studentTTwoSidedTail', t, nu);
  const size = Math.abs(t);
  if (size === 0) return 1;
  if (size === Number.POSITIVE_INFINITY) return 0;
  return nu >= normalFrom ? 2 * normalUpperTail(size) : Math.min(1, twoSidedTail(size, nu));
};

/**
 * How likely is a t distributed number above t?
 *
 * Convention: upper tail; half the two-sided tail for t ≥ 0, and only for t < 0 one minus it.
 * Domain, unit, edges and source: as {@link studentTTwoSidedTail}.
 * Example: `studentTUpperTail(1, 1)` is 0.25.
 */
export const studentTUpperTail = (t: number, nu: number): number => {
  const half = studentTTwoSidedTail(t, nu) / 2;
  return t < 0 ? 1 - half : half;
};

/**
 * How likely is a t distributed number at or below t?
 *
 * Convention: the upper tail at −t, so the lower tail keeps its relative accuracy.
 * Domain, unit, edges and source: as {@link studentTTwoSidedTail}.
 * Example: `studentTCdf(-1, 1)` is 0.25.
 */
export const studentTCdf = (t: number, nu: number): number => studentTUpperTail(-t, nu);

/**
 * Below which point does a t distributed number fall with probability p?
 *
 * Convention: p is the lower tail. For a small upper tail q take −studentTQuantile(q, nu); 1 − q would lose its digits.
 * Domain: 0 < p < 1, nu > 0; anything else throws.
 * Unit: probability as a fraction; the point in units of the scale.
 * Edges: exactly 0 at one half; ±Infinity where the point is beyond the largest double (tiny p with nu below 1). Relative
 * error below 1e-13.
 * Source: jStat 1.9.6 gives the start, Newton's method on our own tail the figure. jStat alone, over 21 nu from 1 to 1e8
 * and 14 p from 1e-12 to 0.49: median relative error 1.3e-10, worst 1.5e-3 (nu = 1e8).
 * Example: `studentTQuantile(0.975, 19)` is 2.09302405440831.
 */
export const studentTQuantile = (p: number, nu: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`studentTQuantile: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('studentTQuantile', 0, nu);
  if (nu >= normalFrom) return normalQuantile(p);
  return p < 0.5 ? -upperStudentQuantile(p, nu) : upperStudentQuantile(1 - p, nu);
};
