import { betaKernel, lowerBetaShare } from './internal/incompleteBeta.ts';

const mustBeInDomain = (name: string, k: number, n: number, p: number): void => {
  if (!(Number.isSafeInteger(n) && n >= 0))
    throw new RangeError(`${name}: n = ${n} is not a whole number from 0`);
  if (!Number.isSafeInteger(k)) throw new RangeError(`${name}: k = ${k} is not a whole number`);
  if (!(p >= 0 && p <= 1)) throw new RangeError(`${name}: p = ${p} lies outside [0, 1]`);
};

export const binomialMass = (k: number, n: number, p: number): number => {
  mustBeInDomain('binomialMass', k, n, p);
  if (k < 0 || k > n) return 0;
  if (p === 0) return k === 0 ? 1 : 0;
  if (p === 1) return k === n ? 1 : 0;
  if (k === 0) return Math.exp(n * Math.log1p(-p));
  if (k === n) return Math.exp(n * Math.log(p));
  return (betaKernel(k, n - k, p, 1 - p) * n) / (k * (n - k));
};

export const binomialCdf = (k: number, n: number, p: number): number => {
  mustBeInDomain('binomialCdf', k, n, p);
  if (k < 0) return 0;
  return k >= n ? 1 : lowerBetaShare(n - k, k + 1, 1 - p, p);
};

export const binomialUpperTail = (k: number, n: number, p: number): number => {
  mustBeInDomain('binomialUpperTail', k, n, p);
  if (k <= 0) return 1;
  return k > n ? 0 : lowerBetaShare(k, n - k + 1, p, 1 - p);
};
