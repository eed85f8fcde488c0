import { halfStepRemainder } from './logGammaDifference.ts';
import { millsRatio } from './millsRatio.ts';

/*
 * Everything here is I_x(a, ½), the regularised incomplete beta function, with a = nu/2 and x = nu/(nu + t²): the
 * probability that |T| exceeds t. Three ways, each a sum of terms of one sign, so nothing cancels:
 *  - far out (x ≤ ½) the power series in x;
 *  - near, for a ≥ 16, the expansion in 1/a that is uniform in t (Didonato & Morris 1992, ACM Transactions on
 *    Mathematical Software 18, 360-373, section 9, here for b = ½);
 *  - near, for smaller a, the recurrence I_x(a, ½) = I_x(a + 1, ½) + x^a·√(1 − x)/(a·B(a, ½)) until a ≥ 16.
 */
const expansionFrom = 16;
const inverseRootPi = 1 / Math.sqrt(Math.PI);

/** Γ(a + ½)/Γ(a). */
export const halfStepRatio = (a: number): number => {
  let x = a;
  let product = 1;
  while (x < 12) {
    product *= x / (x + 0.5);
    x += 1;
  }
  return product * Math.sqrt(x) * Math.exp(halfStepRemainder(x));
};

/** ln(1 + t²/nu), also where the square overflows. */
export const logOneAndSquareShare = (t: number, nu: number): number => {
  const share = (t / nu) * t;
  return share < 1e300 ? Math.log1p(share) : 2 * Math.log(t) - Math.log(nu);
};

/** Coefficients of √(z/sinh z) in powers of z², by the recurrence for a power of a series. */
const expansionCoefficients = ((): readonly number[] => {
  const power = -0.5;
  const inverseFactorial: number[] = [1];
  const coefficients: number[] = [1];
  for (let n = 1; n <= 24; n += 1) {
    inverseFactorial.push((inverseFactorial[n - 1] as number) / (2 * n * (2 * n + 1)));
    let sum = 0;
    for (let m = 1; m <= n; m += 1) {
      sum += (m * power - (n - m)) * (inverseFactorial[m] as number) * (coefficients[n - m] as number);
    }
    coefficients.push(sum / n);
  }
  return coefficients;
})();

/**
 * ∫_v^∞ e^(−T(w−v))·w^(−½)·√(z/sinh z) dw·√T with z = w/2 and T = a − ¼, term by term: moment n is the incomplete gamma
 * integral of s^(2n−½)/(2T)^(2n) beyond u = Tv, each from the one before by two integrations by parts.
 */
const expansionSum = (scale: number, v: number): number => {
  const u = scale * v;
  const quarter = 0.25 / (scale * scale);
  const halfSquare = 0.25 * v * v;
  let moment = Math.SQRT2 * millsRatio(Math.sqrt(2 * u));
  let boundary = Math.sqrt(u);
  let sum = moment;
  for (let n = 0; n < expansionCoefficients.length - 1; n += 1) {
    const order = 2 * n + 0.5;
    moment = quarter * (order * (order + 1) * moment + (u + order + 1) * boundary);
    boundary *= halfSquare;
    const term = (expansionCoefficients[n + 1] as number) * moment;
    sum += term;
    if (Math.abs(term) < 1e-17 * sum) break;
  }
  return sum;
};

const nearTail = (t: number, nu: number, v: number): number => {
  const x = Math.exp(-v);
  let order = nu / 2;
  let ratio = halfStepRatio(order);
  let below = 0;
  let term =
    order < expansionFrom
      ? (ratio * inverseRootPi * Math.exp(-order * v) * (t / Math.sqrt(nu + t * t))) / order
      : 0;
  while (order < expansionFrom) {
    below += term;
    term *= (x * (order + 0.5)) / (order + 1);
    ratio *= (order + 0.5) / order;
    order += 1;
  }
  const scale = order - 0.25;
  return below + ((ratio * inverseRootPi) / Math.sqrt(scale)) * Math.exp(-scale * v) * expansionSum(scale, v);
};

const farTail = (nu: number, v: number): number => {
  const a = nu / 2;
  const x = Math.exp(-v);
  let coefficient = 1;
  let sum = 1;
  for (let n = 1; n <= 80; n += 1) {
    coefficient *= (x * (n - 0.5)) / n;
    const term = (coefficient * a) / (a + n);
    sum += term;
    if (term < 1e-17 * sum) break;
  }
  return ((halfStepRatio(a) * inverseRootPi) / a) * Math.exp(-a * v) * sum;
};

/** P(|T| > t) for t ≥ 0 and 0 < nu < Infinity. */
export const twoSidedTail = (t: number, nu: number): number => {
  const v = logOneAndSquareShare(t, nu);
  return v < Math.LN2 ? nearTail(t, nu, v) : farTail(nu, v);
};

/** P(0 < T < t) for 0 ≤ t ≤ 1: relative accuracy where the tails are near one half. */
export const centralProbability = (t: number, nu: number): number => {
  const a = nu / 2;
  const y = (t / (nu + t * t)) * t;
  let term = 1;
  let sum = 1;
  for (let n = 0; n < 200; n += 1) {
    term *= (y * (a + 0.5 + n)) / (1.5 + n);
    sum += term;
    if (term < 1e-17 * sum) break;
  }
  return Math.sqrt(y) * Math.exp(-a * logOneAndSquareShare(t, nu)) * halfStepRatio(a) * inverseRootPi * sum;
};
