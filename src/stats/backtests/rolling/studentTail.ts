import type { Random } from '../../../terms/random.ts';
import { nextOpenDouble } from '../../random/draws.ts';

/**
 * A standard Student (or, at infinite degrees of freedom, normal) variable drawn from beyond a point.
 *
 * Convention: exact, by rejection. X = nu/(nu + t²) is Beta(nu/2, ½) and t > q means X < x = nu/(nu + q²). X is proposed
 * as x·U^(2/nu), whose density lacks the factor (1 − X)^(−½) only, and kept with chance √((1 − x)/(1 − X)). In the limit
 * t² = q² − 2·ln U is kept with chance q/t.
 * Domain: point > 0, degrees of freedom ≥ 0.5, Infinity allowed.
 * Units: standard units in and out.
 * Edges: heavy tails give very large but finite values; a point near 0 makes many proposals fail.
 * Source: the normal limit is Marsaglia 1964, Technometrics 6, 101-102; the extension to nu is ours.
 * Example: beyond 2.33 at nu = 4 the draws average the conditional tail mean, 3.443.
 */
export const drawStudentBeyond = (point: number, degreesOfFreedom: number, random: Random): number => {
  const pointSquared = point * point;
  for (;;) {
    const proposal = nextOpenDouble(random);
    // (nu + q²)·(U^(−2/nu) − 1), by expm1 so that large nu runs smoothly into −2·ln U.
    const growth =
      degreesOfFreedom === Infinity
        ? -2 * Math.log(proposal)
        : (degreesOfFreedom + pointSquared) * Math.expm1((-2 / degreesOfFreedom) * Math.log(proposal));
    const squared = pointSquared + growth;
    if (squared < Infinity && nextOpenDouble(random) < keptShare(pointSquared, squared, degreesOfFreedom)) {
      return Math.sqrt(squared);
    }
  }
};

/** √((1 − x)/(1 − X)) with 1 − X = t²/(nu + t²). */
const keptShare = (pointSquared: number, squared: number, degreesOfFreedom: number): number => {
  const ratio = pointSquared / squared;
  return degreesOfFreedom === Infinity
    ? Math.sqrt(ratio)
    : Math.sqrt((ratio * (degreesOfFreedom + squared)) / (degreesOfFreedom + pointSquared));
};
