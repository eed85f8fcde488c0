import { logRatioMinusShare } from './logRatioMinusShare.ts';
import { stirlingRemainder } from './stirlingRemainder.ts';

/** x^a·e^(−x)/Γ(a), with the large parts of the exponent taken together before they are rounded. */
export const gammaKernel = (a: number, x: number): number =>
  Math.sqrt(a / (2 * Math.PI)) * Math.exp(a * logRatioMinusShare(x, a) - stirlingRemainder(a));

/** P(a, x)·Γ(a)/(x^a·e^(−x)) by its power series, every term positive. */
const lowerSeries = (a: number, x: number): number => {
  let term = 1 / a;
  let sum = term;
  let order = a;
  while (term > 1e-17 * sum) {
    order += 1;
    term *= x / order;
    sum += term;
  }
  return sum;
};

/** Q(a, x)·Γ(a)/(x^a·e^(−x)) by Legendre's continued fraction, evaluated forward by Lentz's method. */
const upperFraction = (a: number, x: number): number => {
  let denominator = x + 1 - a;
  let c = 1e300;
  let d = 1 / denominator;
  let value = d;
  for (let n = 1; n < 1_000_000; n += 1) {
    const numerator = -n * (n - a);
    denominator += 2;
    d = 1 / (denominator + numerator * d);
    c = denominator + numerator / c;
    const factor = c * d;
    value *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return value;
};

/** P(a, x): the side that is smaller is computed, the other is its complement. */
export const lowerGammaShare = (a: number, x: number): number =>
  x < a + 1 ? lowerBySeries(a, x) : 1 - gammaKernel(a, x) * upperFraction(a, x);

/** Q(a, x) = 1 − P(a, x), the small side never by that subtraction. */
export const upperGammaShare = (a: number, x: number): number =>
  x < a + 1 ? 1 - lowerBySeries(a, x) : gammaKernel(a, x) * upperFraction(a, x);

const lowerBySeries = (a: number, x: number): number => Math.min(1, gammaKernel(a, x) * lowerSeries(a, x));
