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

export const noncentralTUpperTail = (t: number, nu: number, delta: number): number => {
  mustBeInDomain('noncentralTUpperTail', t, nu, delta);
  return upperTail(t, nu, delta);
};

export const noncentralTCdf = (t: number, nu: number, delta: number): number => {
  mustBeInDomain('noncentralTCdf', t, nu, delta);
  return upperTail(-t, nu, -delta);
};

/** The normal score of P(T ≤ t), nearly a straight line in t and in delta; the smaller tail is the one that is computed. */
const normalScore = (t: number, nu: number, delta: number): number => {
  const cdf = upperTail(-t, nu, -delta);
  if (cdf <= 0.5) return cdf <= 0 ? -40 : normalQuantile(cdf);
  const upper = upperTail(t, nu, delta);
  return upper <= 0 ? 40 : -normalQuantile(upper);
};

export const noncentralTQuantile = (p: number, nu: number, delta: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`noncentralTQuantile: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('noncentralTQuantile', 0, nu, delta);
  const score = normalQuantile(p);
  return solved('noncentralTQuantile', (t) => normalScore(t, nu, delta) - score, delta + score);
};

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
