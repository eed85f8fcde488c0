import { maximiseByNewton, type SmoothObjective } from '../../../numerics/boundedNewton.ts';
import { logarithmCurvature, logarithmCurvatureSlope } from '../../../numerics/logarithmCurvature.ts';
import { depthAt, quantileBeyond } from './gpdTail.ts';
import type { PeaksMaximum } from './peaksMaximum.ts';

/**
 * A tail whose figure is given: the loss `distance` beyond the threshold (in units of the mean excess) has the chance
 * `tail` of being exceeded, or is the mean of the losses beyond that chance. The share of losses beyond the threshold
 * follows from (xi, ln β), so two parameters stay free.
 */
export type TailConstraint = {
  readonly figure: 'quantile' | 'shortfall';
  readonly tail: number;
  readonly distance: number;
};

/** The highest point under a constraint, and how the height changes with the constraint's own numbers. */
export type ConstrainedTail = {
  readonly point: Float64Array;
  readonly value: number;
  readonly inDistance: number;
  readonly inLogTail: number;
};

/** Mutable, because a climb fills it at every step. */
type Distance = { value: number; inShape: number; inScale: number; mixed: number; twiceScale: number };

/** How far the quantile lies beyond the threshold in units of β, with its derivatives in xi and ln β. */
const fillDistance = (
  { figure, distance }: TailConstraint,
  shape: number,
  logScale: number,
  into: Distance,
): void => {
  const scaled = distance * Math.exp(-logScale);
  if (figure === 'quantile') {
    into.value = scaled;
    into.inShape = 0;
    into.inScale = -scaled;
    into.mixed = 0;
    into.twiceScale = scaled;
    return;
  }
  const share = scaled * (1 - shape);
  into.value = share - 1;
  into.inShape = -scaled;
  into.inScale = -share;
  into.mixed = scaled;
  into.twiceScale = share;
};

/** Slopes of the binomial log-likelihood of the count beyond the threshold in the logarithm of its chance. */
type Binomial = { value: number; slope: number; curvature: number };

const fillBinomial = (count: number, beyond: number, logShare: number, into: Binomial): void => {
  const share = Math.exp(logShare);
  const odds = share / (1 - share);
  into.value = beyond * logShare + (count - beyond) * Math.log1p(-share);
  into.slope = beyond - (count - beyond) * odds;
  into.curvature = (-(count - beyond) * odds) / (1 - share);
};

type Workspace = { readonly distance: Distance; readonly binomial: Binomial };

/** Adds the binomial part to the derivatives of the Pareto part, by the chain rule through ln ζ = ln tail + depth. */
const addBinomial = (
  shape: number,
  { distance: d, binomial }: Workspace,
  gradient: Float64Array,
  hessian: Float64Array,
): void => {
  const x = shape * d.value;
  const onePlus = 1 + x;
  const bend = logarithmCurvature(x, Math.log1p(x));
  const square = d.value * d.value;
  const inDistance = 1 / onePlus;
  const twiceDistance = -shape / (onePlus * onePlus);
  const inShapeAlone = square * bend;
  const twiceShapeAlone = square * d.value * logarithmCurvatureSlope(x, bend);
  const mixedAlone = -d.value / (onePlus * onePlus);
  const inShape = inDistance * d.inShape + inShapeAlone;
  const inScale = inDistance * d.inScale;
  const twiceShape = twiceDistance * d.inShape * d.inShape + 2 * mixedAlone * d.inShape + twiceShapeAlone;
  const mixed = twiceDistance * d.inShape * d.inScale + inDistance * d.mixed + mixedAlone * d.inScale;
  const twiceScale = twiceDistance * d.inScale * d.inScale + inDistance * d.twiceScale;
  const { slope, curvature } = binomial;
  gradient[0] = (gradient[0] as number) + slope * inShape;
  gradient[1] = (gradient[1] as number) + slope * inScale;
  hessian[0] = (hessian[0] as number) + curvature * inShape * inShape + slope * twiceShape;
  const cross = (hessian[1] as number) + curvature * inShape * inScale + slope * mixed;
  hessian[1] = cross;
  hessian[2] = cross;
  hessian[3] = (hessian[3] as number) + curvature * inScale * inScale + slope * twiceScale;
};

const constrainedObjective =
  (maximum: PeaksMaximum, constraint: TailConstraint, work: Workspace): SmoothObjective =>
  (point, gradient, hessian) => {
    const value = maximum.gpd.objective(point, gradient, hessian);
    if (value === Number.NEGATIVE_INFINITY) return value;
    const shape = point[0] as number;
    fillDistance(constraint, shape, point[1] as number, work.distance);
    if (!(1 + shape * work.distance.value > 0)) return Number.NEGATIVE_INFINITY;
    const logShare = Math.log(constraint.tail) + depthAt(shape, work.distance.value);
    if (!(logShare < 0)) return Number.NEGATIVE_INFINITY;
    fillBinomial(maximum.count, maximum.beyond, logShare, work.binomial);
    addBinomial(shape, work, gradient, hessian);
    return value + work.binomial.value;
  };

/** Just above the shape at which the likelihood stops having a highest point, and far above any that data show. */
const lowestShape = -0.99;
const highestShape = 10;
const tolerance = 1e-7;
const maxSteps = 100;

/** The same shape with β such that the share beyond the threshold is the observed one, where there is such a β. */
const scaledStart = (maximum: PeaksMaximum, constraint: TailConstraint, shape: number): Float64Array => {
  const { figure, tail, distance } = constraint;
  const beyond = quantileBeyond(shape, Math.log(maximum.beyond / maximum.count / tail));
  const scale = figure === 'quantile' ? distance / beyond : (distance * (1 - shape)) / (beyond + 1);
  return Float64Array.of(shape, Math.log(scale));
};

/** Climbs under the constraint from the neighbourhood of `near`; null where no climb reaches its rule. */
export const maximisePeaksUnder = (
  maximum: PeaksMaximum,
  constraint: TailConstraint,
  near: Float64Array,
): ConstrainedTail | null => {
  const work: Workspace = {
    distance: { value: 0, inShape: 0, inScale: 0, mixed: 0, twiceScale: 0 },
    binomial: { value: 0, slope: 0, curvature: 0 },
  };
  const objective = constrainedObjective(maximum, constraint, work);
  const settings = {
    lower: Float64Array.of(lowestShape, Number.NEGATIVE_INFINITY),
    upper: Float64Array.of(constraint.figure === 'quantile' ? highestShape : 1, Number.POSITIVE_INFINITY),
    tolerance,
    maxSteps,
  };
  for (const start of [scaledStart(maximum, constraint, near[0] as number), near]) {
    if (!Number.isFinite(start[1] as number)) continue;
    const climb = maximiseByNewton(objective, start, settings);
    if (!climb.converged) continue;
    const value = objective(climb.point, new Float64Array(2), new Float64Array(4));
    const perDistance = -work.distance.inScale / constraint.distance;
    const atQuantile = 1 + (climb.point[0] as number) * work.distance.value;
    return {
      point: climb.point,
      value,
      inDistance: constraint.distance === 0 ? 0 : (work.binomial.slope * perDistance) / atQuantile,
      inLogTail: work.binomial.slope,
    };
  }
  return null;
};
