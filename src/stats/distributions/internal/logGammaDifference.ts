import { polynomial } from '../../numerics/polynomial.ts';

/** lnΓ((nu+1)/2) − lnΓ(nu/2) and its first two derivatives with respect to nu. */
export type LogGammaDifference = {
  readonly value: number;
  readonly firstDerivative: number;
  readonly secondDerivative: number;
};

/** Bernoulli numbers B(2), B(4), … B(16). */
const bernoulli = [1 / 6, -1 / 30, 1 / 42, -1 / 30, 5 / 66, -691 / 2730, 7 / 6, -3617 / 510];

/*
 * lnΓ(x + ½) − lnΓ(x) = ½·ln x − Σ c(k)·x^(1−2k) with c(k) = (1 − 4^−k)·B(2k)/(k(2k − 1)), from the difference of the
 * series of both logarithms (NIST Digital Library of Mathematical Functions, 5.11.8 with h = ½ and h = 0).
 */
const valueCoefficients = bernoulli.map((number, index) => {
  const k = index + 1;
  return (-(1 - 4 ** -k) * number) / (k * (2 * k - 1));
});
const firstCoefficients = valueCoefficients.map((value, index) => -(2 * index + 1) * value);
const secondCoefficients = firstCoefficients.map((value, index) => -(2 * index + 2) * value);

/** nu = 30 and above goes straight to the series, where eight terms leave less than 1e-17. */
const seriesFrom = 12;

/** ln[Γ(x + ½)/(Γ(x)·√x)], which vanishes like −1/(8x); for x ≥ 12. */
export const halfStepRemainder = (x: number): number => polynomial(valueCoefficients, 1 / (x * x)) / x;

/**
 * How much lnΓ grows from nu/2 to (nu+1)/2, the constant of the t density, and how that changes with nu?
 *
 * Convention: lnΓ((nu+1)/2) − lnΓ(nu/2), its first and second derivative with respect to nu (not nu/2).
 * Domain: 0 < nu < Infinity; anything else throws.
 * Unit: none; per degree of freedom; per degree of freedom squared.
 * Edges: around the zero of the value at nu = 2.62 its error is absolute; all else relative, below 1e-14, at any nu.
 * Source: asymptotic series (NIST Digital Library of Mathematical Functions, 5.11.8) from nu = 24, recurrence below.
 * Example: `logGammaDifference(2).value` is ln(√π/2).
 */
export const logGammaDifference = (nu: number): LogGammaDifference => {
  if (!(nu > 0 && nu < Number.POSITIVE_INFINITY)) {
    throw new RangeError(`logGammaDifference: nu = ${nu} does not lie inside (0, Infinity)`);
  }
  let x = nu / 2;
  let product = 1;
  let firstBelow = 0;
  let secondBelow = 0;
  while (x < seriesFrom) {
    const next = x + 0.5;
    product *= x / next;
    firstBelow += 0.5 / (x * next);
    secondBelow -= (0.5 * (x + next)) / (x * next * (x * next));
    x += 1;
  }
  const inverse = 1 / x;
  const inverseSquare = inverse * inverse;
  const value =
    0.5 * Math.log(x * product * product) + inverse * polynomial(valueCoefficients, inverseSquare);
  const first = inverse * (0.5 + inverse * polynomial(firstCoefficients, inverseSquare)) + firstBelow;
  const second =
    inverseSquare * (-0.5 + inverse * polynomial(secondCoefficients, inverseSquare)) + secondBelow;
  return { value, firstDerivative: first / 2, secondDerivative: second / 4 };
};
