import { studentTDensity } from '../../distributions/studentT.ts';
import { quantileMultiplier, shortfallMultiplier } from '../../losses/studentMultiplier.ts';
import type { StudentMaximum } from '../studentFit.ts';
import { type ConstrainedPoint, maximiseUnder } from './constrainedStudent.ts';
import { climbAtFixedNu } from './fixedNu.ts';
import { findProfileEnd, type ProfileAt, type ProfileEnd } from './profileEnd.ts';
import { largestInverseNu } from './studentMaxima.ts';
import { esCoordinates, type StudentPlace, type TailCoordinates, varCoordinates } from './tailCoordinates.ts';

/** Both ends of a profile-likelihood interval as the searches left them. */
export type ProfileEnds = { readonly lower: ProfileEnd; readonly upper: ProfileEnd };

/** Runs the search both ways; `start` makes a fresh profile for each, for a profile keeps where it ended last. */
const bothEnds = (
  maximum: StudentMaximum,
  reach: number,
  search: {
    readonly start: () => ProfileAt;
    readonly estimate: number;
    readonly standardError: number;
    readonly bounds: readonly [number, number];
  },
): ProfileEnds => {
  const towards = (direction: -1 | 1, bound: number): ProfileEnd =>
    findProfileEnd({
      profile: search.start(),
      estimate: search.estimate,
      highest: maximum.value,
      reach,
      firstDistance: reach * search.standardError,
      direction,
      bound,
    });
  return { lower: towards(-1, search.bounds[0]), upper: towards(1, search.bounds[1]) };
};

const placeOf = ({ point }: StudentMaximum): StudentPlace => ({
  location: point[0] as number,
  logScale: point[1] as number,
  inverseNu: point[2] as number,
});

const profileTolerance = 1e-7;

/** Ends of 1/nu: `lower` is the smaller 1/nu. A bound is the normal limit below and nu = 0.5 above. */
export const inverseNuEnds = (maximum: StudentMaximum, reach: number): ProfileEnds => {
  const { likelihood, standardErrors } = maximum;
  const ofFit = standardErrors[2] as number;
  const start = (): ProfileAt => {
    let place: { readonly location: number; readonly logScale: number } = placeOf(maximum);
    return (inverseNu) => {
      const reached = climbAtFixedNu(likelihood, inverseNu, place, profileTolerance);
      if (!reached.converged) return null;
      place = reached;
      return reached;
    };
  };
  return bothEnds(maximum, reach, {
    start,
    estimate: placeOf(maximum).inverseNu,
    standardError: ofFit > 0 ? ofFit : Math.sqrt(2 / (3 * likelihood.count)),
    bounds: [0, largestInverseNu],
  });
};

/** Climbs under one constraint after another, each from where the last one ended, or from the estimate where that fails. */
const followConstraint = (maximum: StudentMaximum) => {
  const estimate = placeOf(maximum);
  let start = estimate;
  return (coordinates: TailCoordinates): ConstrainedPoint | null => {
    const reached =
      maximiseUnder(maximum.likelihood, coordinates, start) ??
      (start === estimate ? null : maximiseUnder(maximum.likelihood, coordinates, estimate));
    if (reached !== null) start = reached;
    return reached;
  };
};

/** A first guess only: the standard error of a normal VaR of the same size. */
const roughError = (multiplier: number, scale: number, count: number): number =>
  scale * Math.sqrt((1 + 0.5 * multiplier * multiplier) / count);

const figureEnds = (
  maximum: StudentMaximum,
  reach: number,
  multiplier: number,
  coordinates: (figure: number) => TailCoordinates,
  boundedAbove = true,
): ProfileEnds => {
  const { location, logScale } = placeOf(maximum);
  const scale = Math.exp(logScale);
  const start = (): ProfileAt => {
    const follow = followConstraint(maximum);
    return (figure) => {
      const reached = follow(coordinates(figure));
      // Of all moves to the neighbouring figure the one by location alone shows the slope: the others are at their peak.
      return reached === null ? null : { value: reached.value, slope: -(reached.gradient[0] as number) };
    };
  };
  const estimate = scale * multiplier - location;
  return bothEnds(maximum, reach, {
    start,
    estimate,
    standardError: roughError(multiplier, scale, maximum.likelihood.count),
    bounds: [Number.NEGATIVE_INFINITY, boundedAbove ? Number.POSITIVE_INFINITY : estimate],
  });
};

/** Ends of VaR at the tail probability, in standard units. */
export const varEnds = (maximum: StudentMaximum, reach: number, tail: number): ProfileEnds =>
  figureEnds(maximum, reach, quantileMultiplier(tail, maximum.fit.nu), (figure) =>
    varCoordinates(tail, figure),
  );

/**
 * Ends of ES in standard units, nu > 1. Where nu = 1 lies inside the interval of nu nothing bounds ES from above, which
 * the caller says by `boundedAbove`; the upper end is then a bound.
 */
export const esEnds = (
  maximum: StudentMaximum,
  reach: number,
  tail: number,
  boundedAbove: boolean,
): ProfileEnds =>
  figureEnds(
    maximum,
    reach,
    shortfallMultiplier(tail, maximum.fit.nu),
    (figure) => esCoordinates(tail, figure),
    boundedAbove,
  );

/** Log-odds beyond these are 0 or 1 in a double. */
const leastLogOdds = -690;
const largestLogOdds = 36;

/** Ends of the log-odds of a loss of at least `threshold`, in standard units. */
export const logOddsEnds = (
  maximum: StudentMaximum,
  reach: number,
  threshold: number,
  probability: number,
): ProfileEnds => {
  const raw = Math.log(probability) - Math.log1p(-probability);
  const start = (): ProfileAt => {
    const follow = followConstraint(maximum);
    return (logOdds) => {
      const tail = 1 / (1 + Math.exp(-logOdds));
      const reached = follow(varCoordinates(tail, threshold));
      if (reached === null) return null;
      const scale = Math.exp(reached.logScale);
      const density = studentTDensity((threshold + reached.location) / scale, 1 / reached.inverseNu);
      const locationSlope = reached.gradient[0] as number;
      return { value: reached.value, slope: (locationSlope * scale * tail * (tail - 1)) / density };
    };
  };
  return bothEnds(maximum, reach, {
    start,
    estimate: Math.min(Math.max(raw, leastLogOdds), largestLogOdds),
    standardError: 0.3,
    bounds: [leastLogOdds, largestLogOdds],
  });
};
