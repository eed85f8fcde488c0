import jStat from 'jstat';
import { finishQuantile } from './internal/finishQuantile.ts';
import { gammaKernel, lowerGammaShare, upperGammaShare } from './internal/incompleteGamma.ts';
import { normalQuantile } from './normal.ts';

const mustBeInDomain = (name: string, x: number, df: number): void => {
  if (!(df > 0 && df < Number.POSITIVE_INFINITY))
    throw new RangeError(`${name}: df = ${df} does not lie inside (0, Infinity)`);
  if (Number.isNaN(x)) throw new RangeError(`${name}: x is not a number`);
};

export const chiSquareCdf = (x: number, df: number): number => {
  mustBeInDomain('chiSquareCdf', x, df);
  if (x === Number.POSITIVE_INFINITY) return 1;
  return x <= 0 ? 0 : lowerGammaShare(df / 2, x / 2);
};

export const chiSquareUpperTail = (x: number, df: number): number => {
  mustBeInDomain('chiSquareUpperTail', x, df);
  if (x === Number.POSITIVE_INFINITY) return 0;
  return x <= 0 ? 1 : upperGammaShare(df / 2, x / 2);
};

export const chiSquareQuantile = (p: number, df: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`chiSquareQuantile: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('chiSquareQuantile', 0, df);
  return p <= 0.5 ? lowerQuantile(p, df) : upperQuantile(1 - p, df);
};

export const chiSquareUpperQuantile = (q: number, df: number): number => {
  if (!(q > 0 && q < 1)) throw new RangeError(`chiSquareUpperQuantile: q = ${q} does not lie inside (0, 1)`);
  mustBeInDomain('chiSquareUpperQuantile', 0, df);
  return q <= 0.5 ? upperQuantile(q, df) : lowerQuantile(1 - q, df);
};

/** Solved for ln x, in which the logarithm of the lower tail is a straight line near 0. */
const lowerQuantile = (p: number, df: number): number => {
  const logQuantile = finishQuantile({
    start: Math.log(startOf(p, df, normalQuantile(p))),
    low: -745,
    high: 709,
    residual: (logX) => Math.log(chiSquareCdf(Math.exp(logX), df) / p),
    slope: (logX) => gammaKernel(df / 2, Math.exp(logX) / 2) / chiSquareCdf(Math.exp(logX), df),
  });
  return Math.exp(logQuantile);
};

const upperQuantile = (q: number, df: number): number => {
  const logQuantile = finishQuantile({
    start: Math.log(startOf(1 - q, df, -normalQuantile(q))),
    low: -745,
    high: 709,
    residual: (logX) => Math.log(q / chiSquareUpperTail(Math.exp(logX), df)),
    slope: (logX) => gammaKernel(df / 2, Math.exp(logX) / 2) / chiSquareUpperTail(Math.exp(logX), df),
  });
  return Math.exp(logQuantile);
};

/** jStat's quantile; where it gives none, the cube of Wilson & Hilferty 1931. */
const startOf = (p: number, df: number, z: number): number => {
  const given = p < 1 ? jStat.chisquare.inv(p, df) : Number.NaN;
  if (given > 0 && given < Number.POSITIVE_INFINITY) return given;
  const share = 2 / (9 * df);
  return df * Math.max(1e-3, 1 - share + z * Math.sqrt(share)) ** 3;
};
