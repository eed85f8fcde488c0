import type { SmoothValue } from '../numerics/smoothValue.ts';
import { logGammaDifference } from './gammaFunctions.ts';

/** 1/nu below which the series is used; there its last term is under 1e-16. */
const seriesBelow = 1 / 30;

/**
 * The odd powers of 1/nu in lnΓ((nu+1)/2) − lnΓ(nu/2) − ½·ln(nu/2), from the Stirling series with Bernoulli numbers
 * B_{k+1}: −(2 − 2^{−k})·B_{k+1}·2^k / (k(k+1)), k = 1, 3, 5, … (Abramowitz & Stegun 1964, 6.1.40 at z and z + ½).
 */
const oddPowerCoefficients = [
  -1 / 4,
  1 / 24,
  -1 / 20,
  17 / 112,
  -31 / 36,
  691 / 88,
  -5461 / 52,
  929569 / 480,
] as const;

const halfLogTwoPi = 0.9189385332046727;

const fillFromSeries = (inverseNu: number, into: SmoothValue): void => {
  const square = inverseNu * inverseNu;
  let value = 0;
  let slope = 0;
  let curvature = 0;
  for (let index = oddPowerCoefficients.length - 1; index >= 0; index -= 1) {
    const coefficient = oddPowerCoefficients[index] as number;
    const power = 2 * index + 1;
    value = value * square + coefficient;
    slope = slope * square + power * coefficient;
    curvature = index === 0 ? curvature : curvature * square + power * (power - 1) * coefficient;
  }
  into.value = value * inverseNu - halfLogTwoPi;
  into.slope = slope;
  into.curvature = curvature * inverseNu;
};

const fillFromGammas = (inverseNu: number, into: SmoothValue): void => {
  const nu = 1 / inverseNu;
  const gammas = logGammaDifference(nu);
  const slopeInNu = gammas.firstDerivative - 0.5 / nu;
  const curvatureInNu = gammas.secondDerivative + 0.5 / (nu * nu);
  into.value = gammas.value - 0.5 * Math.log(nu * Math.PI);
  into.slope = -nu * nu * slopeInNu;
  into.curvature = nu * nu * nu * (2 * slopeInNu + nu * curvatureInNu);
};

/**
 * ln of Γ((nu+1)/2) / (Γ(nu/2)·√(nu·π)), the constant of the t density, as a function of 1/nu, smooth down to the normal
 * limit 1/nu = 0.
 * Written into `into`, because a fit asks for it at every step.
 */
export const fillStudentNormaliser = (inverseNu: number, into: SmoothValue): void =>
  inverseNu < seriesBelow ? fillFromSeries(inverseNu, into) : fillFromGammas(inverseNu, into);
