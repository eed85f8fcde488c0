import type { Random } from '../../terms/random.ts';
import { nextOpenDouble } from './draws.ts';

/**
 * A standard Student t number, two open doubles each.
 *
 * Convention: √(nu·(U^(−2/nu) − 1))·cos(2πV), exact for every nu; at nu = Infinity √(−2·ln U)·cos(2πV), a normal number.
 * Domain: degrees of freedom above 0, Infinity allowed. The variance is nu/(nu − 2), not 1.
 * Source: Bailey 1994, Mathematics of Computation 62, 779-781; the limit is Box & Muller 1958.
 */
export const nextStudentT = (random: Random, degreesOfFreedom: number): number => {
  const logarithm = Math.log(nextOpenDouble(random));
  const squared =
    degreesOfFreedom === Number.POSITIVE_INFINITY
      ? -2 * logarithm
      : degreesOfFreedom * Math.expm1((-2 * logarithm) / degreesOfFreedom);
  return Math.sqrt(squared) * Math.cos(2 * Math.PI * nextOpenDouble(random));
};
