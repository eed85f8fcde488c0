import { polynomial } from '../numerics/polynomial.ts';
import {
  halfLogTwoPi,
  logGammaBelowTen,
  stirlingFrom,
  stirlingRemainder,
} from './internal/stirlingRemainder.ts';

const mustBePositive = (name: string, x: number): void => {
  if (!(x > 0)) throw new RangeError(`${name}: argument ${x} is not above 0`);
};

/**
 * The natural logarithm of the gamma function.
 *
 * Convention: real argument above 0.
 * Domain: x > 0; anything else throws.
 * Unit: none.
 * Edges: exactly 0 at 1 and 2, with relative accuracy around them; Infinity at Infinity. Relative error below 1e-14.
 * Source: from 10 on Stirling's series (NIST Digital Library of Mathematical Functions, 5.11.1); below, recurrence to a
 * Chebyshev series of our own around 2.
 * Example: `logGamma(5)` is ln 24.
 */
export const logGamma = (x: number): number => {
  mustBePositive('logGamma', x);
  if (x < stirlingFrom) return logGammaBelowTen(x);
  if (x === Number.POSITIVE_INFINITY) return x;
  return (x - 0.5) * Math.log(x) - x + (halfLogTwoPi + stirlingRemainder(x));
};

/* −B(2k)/(2k), k = 1..8 (NIST Digital Library of Mathematical Functions, 5.11.2). */
const digammaCoefficients = [
  -1 / 12,
  1 / 120,
  -1 / 252,
  1 / 240,
  -1 / 132,
  691 / 32760,
  -1 / 12,
  3617 / 8160,
];

/**
 * The derivative of ln Γ.
 *
 * Convention, domain: as {@link logGamma}.
 * Edges: around its zero at 1.4616 the error is absolute, a few 1e-16; elsewhere relative, below 1e-14.
 * Source: NIST Digital Library of Mathematical Functions, 5.11.2, after the recurrence 5.5.2 up to 10.
 * Example: `digamma(1)` is −0.5772156649015329, minus Euler's constant.
 */
export const digamma = (x: number): number => {
  mustBePositive('digamma', x);
  let argument = x;
  let below = 0;
  while (argument < stirlingFrom) {
    below += 1 / argument;
    argument += 1;
  }
  const inverseSquare = 1 / (argument * argument);
  const series = inverseSquare * polynomial(digammaCoefficients, inverseSquare);
  return Math.log(argument) - 0.5 / argument + series - below;
};

/* B(2k), k = 1..8 (the derivative of the series for the digamma function). */
const trigammaCoefficients = [1 / 6, -1 / 30, 1 / 42, -1 / 30, 5 / 66, -691 / 2730, 7 / 6, -3617 / 510];

/**
 * The second derivative of ln Γ.
 *
 * Convention, domain: as {@link logGamma}.
 * Edges: positive everywhere; relative error below 1e-14.
 * Source: the derivative of the series for the digamma function, after the recurrence up to 10.
 * Example: `trigamma(1)` is π²/6.
 */
export const trigamma = (x: number): number => {
  mustBePositive('trigamma', x);
  let argument = x;
  let below = 0;
  while (argument < stirlingFrom) {
    below += 1 / (argument * argument);
    argument += 1;
  }
  const inverse = 1 / argument;
  const inverseSquare = inverse * inverse;
  return inverse * (1 + inverse * (0.5 + inverse * polynomial(trigammaCoefficients, inverseSquare))) + below;
};

export { type LogGammaDifference, logGammaDifference } from './internal/logGammaDifference.ts';
