import type { StandardSample } from '../../moments/standardSample.ts';
import { maximiseByNewton, type NewtonMaximum, type NewtonSettings } from '../../numerics/boundedNewton.ts';
import { climbAtFixedNu, type ProfilePoint } from './fixedNu.ts';
import type { StudentLikelihood } from './studentLikelihood.ts';

/** nu ≥ 0.5, the range in which the model is fitted. */
export const largestInverseNu = 2;

/** Bounds and stopping rule of the fit in (location, ln scale, 1/nu). */
export const studentSettings: NewtonSettings = {
  lower: Float64Array.of(Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY, 0),
  upper: Float64Array.of(Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, largestInverseNu),
  tolerance: 1e-8,
  maxSteps: 100,
};

/** Where the profile in 1/nu is looked at first; between two of them it is looked at again where it bends unexpectedly. */
const gridOfInverseNu = [0.03, 0.08, 0.15, 0.25, 0.4, 0.6, 0.8, 1, 1.3, 1.65, largestInverseNu] as const;

/** A grid point only has to tell on which side of it the maximum lies. */
const gridTolerance = 1e-3;

const normalPoint = (sample: StandardSample): ProfilePoint => {
  const count = sample.values.length;
  return {
    location: 0,
    logScale: 0,
    inverseNu: 0,
    value: -0.5 * count * (Math.log(2 * Math.PI) + 1),
    slope: (count * sample.excessKurtosis) / 4,
    converged: true,
  };
};

/** The profile from the normal limit on, each point climbed from its neighbour. */
const profileOver = (
  grid: readonly number[],
  likelihood: StudentLikelihood,
  sample: StandardSample,
  tolerance: number,
): ProfilePoint[] => {
  let previous = normalPoint(sample);
  const points = [previous];
  for (const inverseNu of grid) {
    previous = climbAtFixedNu(likelihood, inverseNu, previous, tolerance);
    points.push(previous);
  }
  return points;
};

/** A second look needs heights only, and only as far apart as a maximum is wide. */
const coarseGrid = [0.12, 0.35, 0.8, largestInverseNu] as const;
const coarseTolerance = 0.05;
const clearlyHigher = 1e-9;

/** Does the profile stand higher somewhere on a coarse grid than a maximum that was reached some other way? */
export const isHigherElsewhere = (
  likelihood: StudentLikelihood,
  sample: StandardSample,
  value: number,
): boolean =>
  profileOver(coarseGrid, likelihood, sample, coarseTolerance).some(
    (point) => point.value > value + clearlyHigher,
  );

/** Do the two slopes contradict the rise between the points, so that the profile must turn twice in between? */
const bendsBetween = (left: ProfilePoint, right: ProfilePoint): boolean => {
  const rise = (right.value - left.value) / (right.inverseNu - left.inverseNu);
  const slack = 1e-3 * (Math.abs(left.slope) + Math.abs(right.slope));
  const steepest = Math.max(left.slope, right.slope) + slack;
  const flattest = Math.min(left.slope, right.slope) - slack;
  return left.slope > 0 === right.slope > 0 && (rise > steepest || rise < flattest);
};

const mostHalvings = 4;

/** The profile with points added where it bends unexpectedly. */
const refine = (likelihood: StudentLikelihood, points: readonly ProfilePoint[], depth = 0): ProfilePoint[] =>
  points.flatMap((right, index) => {
    const left = points[index - 1];
    if (left === undefined || depth >= mostHalvings || !bendsBetween(left, right)) return [right];
    const middle = climbAtFixedNu(likelihood, (left.inverseNu + right.inverseNu) / 2, left, gridTolerance);
    return refine(likelihood, [left, middle, right], depth + 1).slice(1);
  });

/** Where the straight line through two slopes of opposite signs crosses zero. */
const between = (left: ProfilePoint, right: ProfilePoint): Float64Array => {
  const share = left.slope / (left.slope - right.slope);
  const mix = (a: number, b: number) => a + share * (b - a);
  return Float64Array.of(
    mix(left.location, right.location),
    mix(left.logScale, right.logScale),
    mix(left.inverseNu, right.inverseNu),
  );
};

const pointOf = (profile: ProfilePoint): Float64Array =>
  Float64Array.of(profile.location, profile.logScale, profile.inverseNu);

/** One start below each maximum of the profile: every fall of the slope through zero, and an end that it runs into. */
const startsOf = (points: readonly ProfilePoint[]): Float64Array[] => {
  const starts: Float64Array[] = [];
  const first = points[0] as ProfilePoint;
  const last = points[points.length - 1] as ProfilePoint;
  if (first.slope <= 0) starts.push(pointOf(first));
  for (let index = 1; index < points.length; index += 1) {
    const left = points[index - 1] as ProfilePoint;
    const right = points[index] as ProfilePoint;
    if (left.slope > 0 && right.slope <= 0) starts.push(between(left, right));
  }
  if (last.slope > 0) starts.push(pointOf(last));
  return starts;
};

/** Every local maximum that the profile shows, each climbed to the stopping rule. */
export const studentMaxima = (likelihood: StudentLikelihood, sample: StandardSample): NewtonMaximum[] =>
  startsOf(refine(likelihood, profileOver(gridOfInverseNu, likelihood, sample, gridTolerance))).map((start) =>
    maximiseByNewton(likelihood.objective, start, studentSettings),
  );
