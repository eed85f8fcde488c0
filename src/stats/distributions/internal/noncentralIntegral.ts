import { integrate } from '../../numerics/integral.ts';
import { expandBracket, findRoot } from '../../numerics/roots.ts';
import { millsRatio } from './millsRatio.ts';
import { halfLogTwoPi, stirlingRemainder } from './stirlingRemainder.ts';

/*
 * P(T ≤ t) for T = (Z + delta)/S, Z standard normal and nu·S² chi-square, is the mean of Φ(t·S − delta). With S = e^y the
 * integrand is a smooth hill with one top, because its logarithm is concave in S. It is integrated over the window outside
 * which it is below e^−40 of its top, in units of the top, so that tails keep their relative accuracy.
 */

const windowDepth = 40;

/** ln(Φ(u)), or ln(1 − Φ(u)) for the upper side. */
const logNormalSide = (u: number, upper: boolean): number => {
  const away = upper ? u : -u;
  const logTailOfSize = Math.log(millsRatio(Math.abs(u))) - 0.5 * u * u - halfLogTwoPi;
  return away >= 0 ? logTailOfSize : Math.log1p(-Math.exp(logTailOfSize));
};

/** e^v − 1 − v without cancellation. */
const expMinusLine = (v: number): number => {
  if (Math.abs(v) > 0.3) return Math.expm1(v) - v;
  let term = (v * v) / 2;
  let sum = 0;
  for (let n = 3; n < 30; n += 1) {
    sum += term;
    term *= v / n;
    if (Math.abs(term) < 1e-18 * sum) break;
  }
  return sum;
};

/** P(T ≤ t), or P(T > t) for the upper side, for t > 0. */
export const noncentralIntegral = (t: number, nu: number, delta: number, upper: boolean): number => {
  const logHill = (y: number): number =>
    -0.5 * nu * expMinusLine(2 * y) + logNormalSide(t * Math.exp(y) - delta, upper);
  const slope = (y: number): number => {
    const s = Math.exp(y);
    const u = t * s - delta;
    const away = upper ? u : -u;
    const density = Math.exp(-0.5 * u * u - halfLogTwoPi - logNormalSide(u, upper));
    const hazard = away > 0 ? 1 / millsRatio(away) : density;
    return -nu * Math.expm1(2 * y) + (upper ? -1 : 1) * t * s * hazard;
  };
  // the chi density alone has its top at y = 0; the normal side pulls it up for the lower tail, down for the upper one
  const bracket = upper
    ? expandBracket(slope, -1, 0, { greatest: 0 })
    : expandBracket(slope, 0, 1, { least: 0 });
  const top =
    bracket === null ? null : findRoot(slope, bracket.low, bracket.high, { absoluteTolerance: 1e-9 });
  if (top === null || !top.found)
    throw new RangeError(`noncentralT: no top for t = ${t}, nu = ${nu}, delta = ${delta}`);
  const height = logHill(top.root);
  const low = edgeOf(logHill, top.root, height, -1, nu);
  const high = edgeOf(logHill, top.root, height, 1, nu);
  const hill = (y: number): number => Math.exp(logHill(y) - height);
  const area = integrate(hill, low, top.root) + integrate(hill, top.root, high);
  const constant = Math.sqrt(nu / Math.PI) * Math.exp(-stirlingRemainder(nu / 2));
  return Math.min(1, area * constant * Math.exp(height));
};

/** Where the hill has fallen by e^−40, not much farther. */
const edgeOf = (
  logHill: (y: number) => number,
  top: number,
  height: number,
  side: 1 | -1,
  nu: number,
): number => {
  let near = 0;
  let far = 1 / Math.sqrt(nu);
  while (logHill(top + side * far) > height - windowDepth) {
    near = far;
    far *= 2;
  }
  for (let halving = 0; halving < 4; halving += 1) {
    const middle = (near + far) / 2;
    if (logHill(top + side * middle) > height - windowDepth) near = middle;
    else far = middle;
  }
  return top + side * far;
};
