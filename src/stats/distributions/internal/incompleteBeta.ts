import { logRatioMinusShare } from './logRatioMinusShare.ts';
import { stirlingRemainder } from './stirlingRemainder.ts';

/**
 * x^a·y^b/B(a, b) with y = 1 − x, in the saddle-point form of Loader 2000 ("Fast and accurate computation of binomial
 * probabilities"): the large parts of the exponent are taken together before they are rounded.
 */
export const betaKernel = (a: number, b: number, x: number, y: number): number => {
  const total = a + b;
  const exponent = a * logRatioMinusShare(total * x, a) + b * logRatioMinusShare(total * y, b);
  const remainders = stirlingRemainder(total) - stirlingRemainder(a) - stirlingRemainder(b);
  return Math.sqrt((a / total) * (b / (2 * Math.PI))) * Math.exp(exponent + remainders);
};

/**
 * I_x(a, b)·B(a, b)/(x^a·y^b) for x below about a/(a + b), by the continued fraction of Didonato & Morris 1992 (ACM
 * Transactions on Mathematical Software 18, 360-373, section 7), evaluated forward by Lentz's method.
 */
const betaFraction = (a: number, b: number, x: number, y: number): number => {
  const lambda = a - (a + b) * x;
  let denominator = (a * (lambda + 1)) / (a + 1);
  let c = denominator;
  let d = 0;
  let value = denominator;
  for (let n = 1; n < 1_000_000; n += 1) {
    const doubled = a + 2 * n - 1;
    const numerator = (((a + n - 1) * (a + b + n - 1)) / doubled) * ((n * (b - n)) / doubled) * x * x;
    denominator = n + (n * (b - n) * x) / doubled + ((a + n) / (a + 2 * n + 1)) * (lambda + 1 + n * (1 + y));
    d = 1 / (denominator + numerator * d);
    c = denominator + numerator / c;
    const factor = c * d;
    value *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return 1 / value;
};

/** I_x(a, b), the share below x; `y` is 1 − x, given apart because it may be known more accurately. */
export const lowerBetaShare = (a: number, b: number, x: number, y: number): number => {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  return a * y > b * x ? belowMean(a, b, x, y) : 1 - belowMean(b, a, y, x);
};

const belowMean = (a: number, b: number, x: number, y: number): number =>
  Math.min(1, betaKernel(a, b, x, y) * betaFraction(a, b, x, y));
