import { fillStudentNormaliser } from '../../distributions/studentNormaliser.ts';
import type { SmoothValue } from '../../numerics/smoothValue.ts';

/**
 * The part of a unit-variance Student log-density that does not depend on the data, c(λ) with λ = 1/nu, and its first
 * two derivatives: the constant of the plain density, less ½·ln(1 − 2λ) for the scale √((nu − 2)/nu).
 */
export const unitStudentConstant = (inverseNu: number): Readonly<SmoothValue> => {
  const constant: SmoothValue = { value: 0, slope: 0, curvature: 0 };
  fillStudentNormaliser(inverseNu, constant);
  const rest = 1 - 2 * inverseNu;
  constant.value -= Math.log(rest) / 2;
  constant.slope += 1 / rest;
  constant.curvature += 2 / (rest * rest);
  return constant;
};
