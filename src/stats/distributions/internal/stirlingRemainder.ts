import { polynomial } from '../../numerics/polynomial.ts';
import { logGammaNearTwo } from './logGammaNearTwo.ts';

/* B(2k)/(2k(2k − 1)) for k = 1..8 (Stirling's series; NIST Digital Library of Mathematical Functions, 5.11.1). */
const stirlingCoefficients = [
  1 / 12,
  -1 / 360,
  1 / 1260,
  -1 / 1680,
  1 / 1188,
  -691 / 360360,
  1 / 156,
  -3617 / 122400,
];

/** From here on eight terms of Stirling's series leave less than 1e-17. */
export const stirlingFrom = 10;

/** Half the logarithm of 2π. */
export const halfLogTwoPi = 0.9189385332046728;

/** lnΓ(x) − [(x − ½)·ln x − x + ½·ln 2π] for x > 0: what Stirling's formula leaves out, without cancellation at large x. */
export const stirlingRemainder = (x: number): number => {
  if (x >= stirlingFrom) return polynomial(stirlingCoefficients, 1 / (x * x)) / x;
  return logGammaBelowTen(x) - ((x - 0.5) * Math.log(x) - x + halfLogTwoPi);
};

/** lnΓ(x) for 0 < x < 10 from the interval around 2, every factor of the product at least one. */
export const logGammaBelowTen = (x: number): number => {
  if (x < 0.5) return logGammaBelowTen(x + 1) - Math.log(x);
  if (x < 1.5) return logGammaNearTwo(x - 1) - Math.log1p(x - 1);
  let product = 1;
  let argument = x;
  while (argument > 2.5) {
    argument -= 1;
    product *= argument;
  }
  const near = logGammaNearTwo(argument - 2);
  return product === 1 ? near : near + Math.log(product);
};
