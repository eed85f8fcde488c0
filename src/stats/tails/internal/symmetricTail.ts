import { normalUpperTail } from '../../distributions/normal.ts';
import { studentTUpperTail } from '../../distributions/studentT.ts';

/** P(X > z) of a distribution symmetric about 0, and its logarithm where the probability leaves the doubles; z ≥ 0. */
export type SymmetricTail = {
  readonly upperTail: (z: number) => number;
  readonly farLogUpperTail: (z: number) => number;
};

const halfLogTwoPi = 0.5 * Math.log(2 * Math.PI);

/** Far out by the asymptotic series (Abramowitz & Stegun 1964, 26.2.12), good to 1e-9 from z = 30 up. */
export const normalTailOfAndersonDarling: SymmetricTail = {
  upperTail: normalUpperTail,
  farLogUpperTail: (z) => {
    const inverseSquare = 1 / (z * z);
    const series = 1 - inverseSquare * (1 - 3 * inverseSquare * (1 - 5 * inverseSquare));
    return -0.5 * z * z - halfLogTwoPi - Math.log(z) + Math.log(series);
  },
};

/** A Student tail stays inside the doubles wherever a fit with that nu can lie; the guard keeps a sum finite regardless. */
export const studentTailOfAndersonDarling = (nu: number): SymmetricTail =>
  nu === Number.POSITIVE_INFINITY
    ? normalTailOfAndersonDarling
    : { upperTail: (z) => studentTUpperTail(z, nu), farLogUpperTail: () => Math.log(Number.MIN_VALUE) };
