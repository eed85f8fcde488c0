import { polynomial } from './polynomial.ts';

/**
 * E(a, t) = (e^{at} − 1)/a, t at a = 0, with its derivatives: what grows at the rate a for a time t. Smooth through
 * a = 0, where the direct forms lose their digits.
 */
export type ExponentialGrowth = {
  value: number;
  inRate: number;
  inTime: number;
  twiceRate: number;
  rateAndTime: number;
  twiceTime: number;
};

/** Below this |at| the series of the derivatives in the rate are used; sixteen terms reach 1e-17 there. */
const seriesLimit = 0.5;

// (y·e^y − e^y + 1)/y² = Σ (m + 1)/(m + 2)!·y^m, and its derivative.
const bendCoefficients = Array.from({ length: 16 }, (_, m) => (m + 1) / factorial(m + 2));
const bendSlopeCoefficients = bendCoefficients.slice(1).map((coefficient, m) => (m + 1) * coefficient);

function factorial(n: number): number {
  return n <= 1 ? 1 : n * factorial(n - 1);
}

/** Below this e^y − 1 is y in a double, and a quotient by a tiny rate would lose it. */
const negligible = 1e-17;

/** E alone. */
export const exponentialGrowth = (rate: number, time: number): number =>
  Math.abs(rate * time) < negligible ? time : Math.expm1(rate * time) / rate;

/** E and its derivatives, written into `into`, because a search asks for them at every step. */
export const fillExponentialGrowth = (rate: number, time: number, into: ExponentialGrowth): void => {
  const y = rate * time;
  const factor = Math.exp(y);
  const near = Math.abs(y) < seriesLimit;
  const bend = near ? polynomial(bendCoefficients, y) : (y * factor - Math.expm1(y)) / (y * y);
  const bendSlope = near ? polynomial(bendSlopeCoefficients, y) : (factor - 2 * bend) / y;
  into.value = exponentialGrowth(rate, time);
  into.inTime = factor;
  into.inRate = time * time * bend;
  into.twiceTime = rate * factor;
  into.rateAndTime = time * factor;
  into.twiceRate = time * time * time * bendSlope;
};
