import {
  quantileMultiplier,
  shortfallMultiplier,
  shortfallNumerator,
} from '../../losses/studentMultiplier.ts';
import { fillByDifferences, type SmoothValue } from '../../numerics/smoothValue.ts';
import { largestInverseNu } from './studentMaxima.ts';

/** A place among the Student distributions, in standard units. */
export type StudentPlace = {
  readonly location: number;
  readonly logScale: number;
  readonly inverseNu: number;
};

/**
 * Two coordinates of the Student distributions whose tail figure is a given one. `place` fills the three parameters
 * (location, ln scale, 1/nu), their derivatives in the two coordinates by rows, and their second derivatives by rows in
 * the order first-first, first-second, second-second; false where there is no such distribution.
 */
export type TailCoordinates = {
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** The coordinates of the distribution nearest to a given one. */
  readonly of: (place: StudentPlace) => Float64Array;
  readonly place: (
    coordinates: Float64Array,
    parameters: Float64Array,
    first: Float64Array,
    second: Float64Array,
  ) => boolean;
};

const free = Number.POSITIVE_INFINITY;

/**
 * VaR = scale·multiplier(1/nu) − location held by the location, coordinates (ln scale, 1/nu). For tails near one half,
 * where the multiplier is near 0 and the scale cannot hold anything.
 */
const varByLocation = (tail: number, figure: number): TailCoordinates => {
  const multiplier: SmoothValue = { value: 0, slope: 0, curvature: 0 };
  return {
    lower: Float64Array.of(-free, 0),
    upper: Float64Array.of(free, largestInverseNu),
    of: ({ logScale, inverseNu }) => Float64Array.of(logScale, inverseNu),
    place: (coordinates, parameters, first, second) => {
      const logScale = coordinates[0] as number;
      const inverseNu = coordinates[1] as number;
      fillByDifferences((nu) => quantileMultiplier(tail, nu), inverseNu, multiplier);
      const scale = Math.exp(logScale);
      const byScale = scale * multiplier.value;
      const byNu = scale * multiplier.slope;
      parameters.set([byScale - figure, logScale, inverseNu]);
      first.set([byScale, byNu, 1, 0, 0, 1]);
      second.set([byScale, byNu, scale * multiplier.curvature, 0, 0, 0, 0, 0, 0]);
      return true;
    },
  };
};

/**
 * The location from which to start where the scale holds the figure: that of the given distribution, or, where it would
 * leave no scale above 0, the location that goes with the given scale.
 */
const startLocation = ({ location, logScale }: StudentPlace, figure: number, multiplier: number): number =>
  figure + location > 0 ? location : Math.exp(logScale) * multiplier - figure;

/** VaR held by the scale, coordinates (location, 1/nu): well conditioned however far out the figure lies. */
const varByScale = (tail: number, figure: number): TailCoordinates => {
  const logMultiplier: SmoothValue = { value: 0, slope: 0, curvature: 0 };
  return {
    lower: Float64Array.of(-free, 0),
    upper: Float64Array.of(free, largestInverseNu),
    of: (place) => {
      const multiplier = quantileMultiplier(tail, 1 / place.inverseNu);
      return Float64Array.of(startLocation(place, figure, multiplier), place.inverseNu);
    },
    place: (coordinates, parameters, first, second) => {
      const location = coordinates[0] as number;
      const inverseNu = coordinates[1] as number;
      const beyond = figure + location;
      if (!(beyond > 0)) return false;
      fillByDifferences((nu) => Math.log(quantileMultiplier(tail, nu)), inverseNu, logMultiplier);
      parameters.set([location, Math.log(beyond) - logMultiplier.value, inverseNu]);
      first.set([1, 0, 1 / beyond, -logMultiplier.slope, 0, 1]);
      second.set([0, 0, 0, -1 / (beyond * beyond), 0, -logMultiplier.curvature, 0, 0, 0]);
      return true;
    },
  };
};

/** Tails up to this are held by the scale. */
const largestTailByScale = 0.2;

/** The Student distributions whose VaR at a tail probability is `figure`. */
export const varCoordinates = (tail: number, figure: number): TailCoordinates =>
  tail <= largestTailByScale ? varByScale(tail, figure) : varByLocation(tail, figure);

/** ES must not reach nu = 1: a 1/nu this close to it is the nearest start. */
const closestStart = 1 - 1e-6;

/**
 * The Student distributions whose ES at a tail probability is `figure`: held by the scale, coordinates
 * (location, −ln(1 − 1/nu)). ES grows like 1/(1 − 1/nu), so its logarithm is nearly a straight line in the second.
 */
export const esCoordinates = (tail: number, figure: number): TailCoordinates => {
  const logNumerator: SmoothValue = { value: 0, slope: 0, curvature: 0 };
  return {
    lower: Float64Array.of(-free, 0),
    upper: Float64Array.of(free, free),
    of: (place) => {
      const inverseNu = Math.min(place.inverseNu, closestStart);
      const multiplier = shortfallMultiplier(tail, 1 / inverseNu);
      return Float64Array.of(startLocation(place, figure, multiplier), -Math.log1p(-inverseNu));
    },
    place: (coordinates, parameters, first, second) => {
      const location = coordinates[0] as number;
      const depth = coordinates[1] as number;
      const beyond = figure + location;
      if (!(beyond > 0)) return false;
      const gap = Math.exp(-depth);
      const inverseNu = -Math.expm1(-depth);
      fillByDifferences((nu) => Math.log(shortfallNumerator(tail, nu)), inverseNu, logNumerator);
      const slope = logNumerator.slope * gap;
      parameters.set([location, Math.log(beyond) - logNumerator.value - depth, inverseNu]);
      first.set([1, 0, 1 / beyond, -slope - 1, 0, gap]);
      second.set([
        0,
        0,
        0,
        -1 / (beyond * beyond),
        0,
        slope - logNumerator.curvature * gap * gap,
        0,
        0,
        -gap,
      ]);
      return true;
    },
  };
};
