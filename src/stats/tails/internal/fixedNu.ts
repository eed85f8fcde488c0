import type { StudentLikelihood } from './studentLikelihood.ts';

/** The highest point of the likelihood at one 1/nu, and how the profile slopes there. */
export type ProfilePoint = {
  readonly location: number;
  readonly logScale: number;
  readonly inverseNu: number;
  readonly value: number;
  /** Derivative of the profile log-likelihood in 1/nu. */
  readonly slope: number;
  readonly converged: boolean;
};

const mostSteps = 400;
/** Newton's step is trusted up to this change of ln scale, and this many scales of location. */
const longestStep = 1;
const valueNoise = 1e-12;

/** Newton's step in (location, ln scale) where it is short and leads uphill by curvature, else null. */
const newtonStep = (gradient: Float64Array, hessian: Float64Array, scale: number) => {
  const a = -(hessian[0] as number);
  const b = -(hessian[1] as number);
  const c = -(hessian[4] as number);
  const determinant = a * c - b * b;
  if (!(a > 0 && determinant > 0)) return null;
  const first = gradient[0] as number;
  const second = gradient[1] as number;
  const location = (c * first - b * second) / determinant;
  const logScale = (a * second - b * first) / determinant;
  /** Largest |gradient|·standard error of the two. */
  const distance = Math.max(
    Math.abs(first) * Math.sqrt(c / determinant),
    Math.abs(second) * Math.sqrt(a / determinant),
  );
  const short = Math.abs(logScale) <= longestStep && Math.abs(location) <= longestStep * scale;
  return { location, logScale, distance, short };
};

/**
 * Climbs in (location, ln scale) at a fixed 1/nu until |gradient|·standard error ≤ tolerance. Newton's step where it can
 * be trusted; otherwise, and where it led downhill, the step of the expectation-maximisation algorithm with its scale
 * divided by the sum of weights, which never leads downhill (Kent, Tyler & Vardi 1994; Meng & van Dyk 1997).
 * From nu = 1 up the maximum is unique (Kent & Tyler 1991), below it depends on the start.
 */
export const climbAtFixedNu = (
  likelihood: StudentLikelihood,
  inverseNu: number,
  start: { readonly location: number; readonly logScale: number },
  tolerance: number,
): ProfilePoint => {
  const point = Float64Array.of(start.location, start.logScale, inverseNu);
  const gradient = new Float64Array(3);
  const hessian = new Float64Array(9);
  const { sums } = likelihood;
  const best = {
    location: start.location,
    logScale: start.logScale,
    value: Number.NEGATIVE_INFINITY,
    slope: 0,
  };
  let safeLocation = start.location;
  let safeLogScale = start.logScale;
  const end = (converged: boolean): ProfilePoint => ({ ...best, inverseNu, converged });
  for (let step = 0; step < mostSteps; step += 1) {
    const value = likelihood.objective(point, gradient, hessian);
    if (value < best.value - valueNoise * Math.abs(best.value)) {
      if (point[0] === safeLocation && point[1] === safeLogScale) return end(false);
      point[0] = safeLocation;
      point[1] = safeLogScale;
      continue;
    }
    const location = point[0] as number;
    const logScale = point[1] as number;
    best.location = location;
    best.logScale = logScale;
    best.value = value;
    best.slope = gradient[2] as number;
    const scale = Math.exp(logScale);
    const shift = sums.uOverA / sums.oneOverA;
    safeLocation = location + scale * shift;
    safeLogScale = logScale + 0.5 * Math.log(sums.squareOverA / sums.oneOverA - shift * shift);
    const newton = newtonStep(gradient, hessian, scale);
    if (newton !== null && newton.distance <= tolerance) return end(true);
    const trusted = newton?.short === true ? newton : null;
    point[0] = trusted === null ? safeLocation : location + trusted.location;
    point[1] = trusted === null ? safeLogScale : logScale + trusted.logScale;
  }
  return end(false);
};
