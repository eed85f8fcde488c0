import { expandBracket, findRoot } from '../numerics/roots.ts';
import { noncentralIntegral } from './internal/noncentralIntegral.ts';
import { normalCdf, normalQuantile, normalUpperTail } from './normal.ts';
import { studentTUpperTail } from './studentT.ts';

const mustBeInDomain = (name: string, t: number, nu: number, delta: number): void => {
  if (!(nu > 0)) throw new RangeError(`${name}: nu = ${nu} is not above 0`);
  if (!Number.isFinite(t)) throw new RangeError(`${name}: t = ${t} is not a finite number`);
  if (!Number.isFinite(delta)) throw new RangeError(`${name}: delta = ${delta} is not a finite number`);
};

const upperTail = (t: number, nu: number, delta: number): number => {
  if (delta === 0) return studentTUpperTail(t, nu);
  if (t === 0) return normalCdf(delta);
  if (nu === Number.POSITIVE_INFINITY) return normalUpperTail(t - delta);
  return t > 0 ? noncentralIntegral(t, nu, delta, true) : noncentralIntegral(-t, nu, -delta, false);
};

/**
 * How likely is a noncentral t number above t: the power of a t test whose critical value is t?
 *
 * Convention: T = (Z + delta)/√(X/nu), Z standard normal, X chi-square with nu degrees of freedom; for the mean of n
 * returns delta = √n·mean/s and nu = n − 1.
 * Domain: nu > 0 (Infinity is the normal), finite t and delta; anything else throws. Measured for nu from 0.7 to 5000 and
 * |delta| up to 100.
 * Unit: t and delta in standard errors; probability as a fraction.
 * Edges: delta = 0 is Student's t; 0 where the figure is below the smallest double. Relative error below 1e-12, tails
 * included.
 * Source: definition (Johnson & Welch 1940, Biometrika 31, 362-389), integrated as internal/noncentralIntegral.ts says.
 * Example: `noncentralTUpperTail(2, 9, 3)` is 0.830663895257266.
 */
export const noncentralTUpperTail = (t: number, nu: number, delta: number): number => {
  mustBeInDomain('noncentralTUpperTail', t, nu, delta);
  return upperTail(t, nu, delta);
};

/**
 * How likely is a noncentral t number at or below t?
 *
 * Convention: the upper tail at −t for −delta, so the lower tail keeps its relative accuracy.
 * Domain, unit, edges and source: as {@link noncentralTUpperTail}.
 * Example: `noncentralTCdf(2, 9, 3)` is 0.169336104742734.
 */
export const noncentralTCdf = (t: number, nu: number, delta: number): number => {
  mustBeInDomain('noncentralTCdf', t, nu, delta);
  return upperTail(-t, nu, -delta);
};

/** The normal score of P(T ≤ t), nearly a straight line in t and in delta; ±40 stands for what a double cannot hold. */
const normalScore = (t: number, nu: number, delta: number): number => {
  const cdf = upperTail(-t, nu, -delta);
  if (cdf <= 0) return -40;
  return cdf >= 1 ? 40 : normalQuantile(cdf);
};

/**
 * Below which point does a noncentral t number fall with probability p?
 *
 * Convention: p is the lower tail; for a small upper tail q take −noncentralTQuantile(q, nu, −delta).
 * Domain: 0 < p < 1, nu > 0, finite delta; anything else throws.
 * Unit: as {@link noncentralTUpperTail}.
 * Edges: a point beyond the largest double throws. Relative error below 1e-12, near 0 absolute.
 * Source: Chandrupatla's root of the normal score of the distribution function.
 * Example: `noncentralTQuantile(0.9, 5, 2)` is 4.30128451127761.
 */
export const noncentralTQuantile = (p: number, nu: number, delta: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`noncentralTQuantile: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('noncentralTQuantile', 0, nu, delta);
  const score = normalQuantile(p);
  return solved('noncentralTQuantile', (t) => normalScore(t, nu, delta) - score, delta + score);
};

/**
 * Which delta makes P(T ≤ t) equal to p: the end of the interval for mean/s that inverts the noncentral t?
 *
 * Convention: the probability falls as delta rises, so p = 0.025 gives the upper end and p = 0.975 the lower end of a 95%
 * interval for delta.
 * Domain: 0 < p < 1, nu > 0, finite t; anything else throws.
 * Unit: as {@link noncentralTUpperTail}.
 * Edges: every t and p has exactly one delta. Relative error below 1e-12, near 0 absolute.
 * Source: Chandrupatla's root of the normal score, which is nearly a straight line in delta.
 * Example: `noncentralityAt(0.025, 2.5, 19)` is 4.58478959454987.
 */
export const noncentralityAt = (p: number, t: number, nu: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`noncentralityAt: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('noncentralityAt', t, nu, 0);
  const score = normalQuantile(p);
  return solved('noncentralityAt', (delta) => normalScore(t, nu, delta) - score, t - score);
};

const solved = (name: string, f: (x: number) => number, start: number): number => {
  const width = 0.1 + 0.1 * Math.abs(start);
  const bracket = expandBracket(f, start - width, start + width);
  const outcome =
    bracket === null ? null : findRoot(f, bracket.low, bracket.high, { absoluteTolerance: 1e-15 });
  if (outcome === null || !outcome.found) throw new RangeError(`${name}: no solution near ${start}`);
  return outcome.root;
};
