import jStat from 'jstat';
import { finishQuantile } from './internal/finishQuantile.ts';
import { betaKernel, lowerBetaShare } from './internal/incompleteBeta.ts';

const mustBeInDomain = (name: string, x: number, a: number, b: number): void => {
  if (!(a > 0 && b > 0 && a + b < Number.POSITIVE_INFINITY)) {
    throw new RangeError(`${name}: parameters ${a} and ${b} do not both lie inside (0, Infinity)`);
  }
  if (!(x >= 0 && x <= 1)) throw new RangeError(`${name}: ${x} lies outside [0, 1]`);
};

export const betaCdf = (x: number, a: number, b: number): number => {
  mustBeInDomain('betaCdf', x, a, b);
  return lowerBetaShare(a, b, x, 1 - x);
};

export const betaUpperTail = (x: number, a: number, b: number): number => {
  mustBeInDomain('betaUpperTail', x, a, b);
  return lowerBetaShare(b, a, 1 - x, x);
};

export const betaQuantile = (p: number, a: number, b: number): number => {
  mustBeInDomain('betaQuantile', p, a, b);
  if (p === 0 || p === 1) return p;
  const given = jStat.beta.inv(p, a, b);
  const upper = p > 0.5;
  return finishQuantile({
    start: given,
    low: 0,
    high: 1,
    residual: (x) => (upper ? Math.log((1 - p) / betaUpperTail(x, a, b)) : Math.log(betaCdf(x, a, b) / p)),
    slope: (x) =>
      betaKernel(a, b, x, 1 - x) / (x * (1 - x)) / (upper ? betaUpperTail(x, a, b) : betaCdf(x, a, b)),
  });
};
