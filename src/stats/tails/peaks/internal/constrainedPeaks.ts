import { maximiseByNewton, type SmoothObjective } from '../../../numerics/boundedNewton.ts';
import { type ExponentialGrowth, fillExponentialGrowth } from '../../../numerics/exponentialGrowth.ts';
import type { PeaksMaximum } from './peaksMaximum.ts';

/**
 * A tail whose figure is given: the loss `distance` beyond the threshold (in units of the mean excess, above 0) has the
 * chance `tail` of being exceeded, or is the mean of the losses beyond that chance. Two coordinates stay free: xi and the
 * logarithm of the depth ln(ζ/tail), ζ the share of losses beyond the threshold; β follows from the figure.
 */
export type TailConstraint = {
  readonly figure: 'quantile' | 'shortfall';
  readonly tail: number;
  readonly distance: number;
};

/** The highest point under a constraint in (xi, ln depth), and how the height changes with the constraint's own numbers. */
export type ConstrainedTail = {
  readonly point: Float64Array;
  readonly value: number;
  readonly inDistance: number;
  readonly inLogTail: number;
};

/** ln β with its derivatives in xi and the depth. Mutable, because a climb fills it at every step. */
type LogScale = {
  value: number;
  inShape: number;
  inDepth: number;
  twiceShape: number;
  mixed: number;
  twiceDepth: number;
};

/** β = distance/E for a quantile and distance·(1 − xi)/(E + 1) for a shortfall, E = (e^{xi·depth} − 1)/xi. */
const fillLogScale = (
  { figure, distance }: TailConstraint,
  shape: number,
  growth: ExponentialGrowth,
  into: LogScale,
): void => {
  const isShortfall = figure === 'shortfall';
  const divisor = growth.value + (isShortfall ? 1 : 0);
  const inShape = growth.inRate / divisor;
  const inDepth = growth.inTime / divisor;
  into.value = Math.log(distance / divisor);
  into.inShape = -inShape;
  into.inDepth = -inDepth;
  into.twiceShape = inShape * inShape - growth.twiceRate / divisor;
  into.mixed = inShape * inDepth - growth.rateAndTime / divisor;
  into.twiceDepth = inDepth * inDepth - growth.twiceTime / divisor;
  if (!isShortfall) return;
  const toOne = 1 - shape;
  into.value += Math.log(toOne);
  into.inShape -= 1 / toOne;
  into.twiceShape -= 1 / (toOne * toOne);
};

/** The binomial log-likelihood of the count beyond the threshold, with its slopes in the logarithm of its chance. */
type Binomial = { value: number; slope: number; curvature: number };

const fillBinomial = (count: number, beyond: number, logShare: number, into: Binomial): void => {
  const share = Math.exp(logShare);
  const odds = share / (1 - share);
  into.value = beyond * logShare + (count - beyond) * Math.log1p(-share);
  into.slope = beyond - (count - beyond) * odds;
  into.curvature = (-(count - beyond) * odds) / (1 - share);
};

type Workspace = {
  readonly growth: ExponentialGrowth;
  readonly logScale: LogScale;
  readonly binomial: Binomial;
  readonly point: Float64Array;
  readonly gradient: Float64Array;
  readonly hessian: Float64Array;
};

const createWorkspace = (): Workspace => ({
  growth: { value: 0, inRate: 0, inTime: 0, twiceRate: 0, rateAndTime: 0, twiceTime: 0 },
  logScale: { value: 0, inShape: 0, inDepth: 0, twiceShape: 0, mixed: 0, twiceDepth: 0 },
  binomial: { value: 0, slope: 0, curvature: 0 },
  point: new Float64Array(2),
  gradient: new Float64Array(2),
  hessian: new Float64Array(4),
});

/** From the Pareto derivatives in (xi, ln β) and the binomial ones to those in (xi, ln depth), by the chain rule. */
const fillDerivatives = (
  work: Workspace,
  depth: number,
  gradient: Float64Array,
  hessian: Float64Array,
): void => {
  const { logScale: s, binomial } = work;
  const inScale = work.gradient[1] as number;
  const mixedScale = work.hessian[1] as number;
  const twiceScale = work.hessian[3] as number;
  const inDepth = inScale * s.inDepth + binomial.slope;
  const twiceDepth = twiceScale * s.inDepth * s.inDepth + inScale * s.twiceDepth + binomial.curvature;
  const mixed = depth * (mixedScale * s.inDepth + twiceScale * s.inShape * s.inDepth + inScale * s.mixed);
  gradient[0] = (work.gradient[0] as number) + inScale * s.inShape;
  gradient[1] = depth * inDepth;
  hessian[0] =
    (work.hessian[0] as number) +
    2 * mixedScale * s.inShape +
    twiceScale * s.inShape * s.inShape +
    inScale * s.twiceShape;
  hessian[1] = mixed;
  hessian[2] = mixed;
  hessian[3] = depth * (depth * twiceDepth + inDepth);
};

const constrainedObjective =
  (maximum: PeaksMaximum, constraint: TailConstraint, work: Workspace): SmoothObjective =>
  (coordinates, gradient, hessian) => {
    const shape = coordinates[0] as number;
    const depth = Math.exp(coordinates[1] as number);
    const logShare = Math.log(constraint.tail) + depth;
    if (!(logShare < 0)) return Number.NEGATIVE_INFINITY;
    fillExponentialGrowth(shape, depth, work.growth);
    fillLogScale(constraint, shape, work.growth, work.logScale);
    work.point[0] = shape;
    work.point[1] = work.logScale.value;
    const value = maximum.gpd.objective(work.point, work.gradient, work.hessian);
    if (!Number.isFinite(value)) return Number.NEGATIVE_INFINITY;
    fillBinomial(maximum.count, maximum.beyond, logShare, work.binomial);
    fillDerivatives(work, depth, gradient, hessian);
    return value + work.binomial.value;
  };

/** Just above the shape at which the likelihood stops having a highest point, and far above any that data show. */
const lowestShape = -0.99;
const highestShape = 10;
/** ES exists below xi = 1 only. */
const highestShortfallShape = 1 - 1e-9;
const tolerance = 1e-7;
const maxSteps = 100;
/** A tail of this shape reaches past every loss, so a climb can start there when it can start nowhere nearer. */
const safeShape = 0.05;

/** The shape of `near` with the observed share beyond the threshold; `near` itself; a shape that always allows a start. */
const startsNear = (maximum: PeaksMaximum, { tail }: TailConstraint, near: Float64Array): Float64Array[] => {
  const depth = Math.log(maximum.beyond / maximum.count / tail);
  const logDepth = depth > 0 ? Math.log(depth) : (near[1] as number);
  return [Float64Array.of(near[0] as number, logDepth), near, Float64Array.of(safeShape, logDepth)];
};

/** Climbs under the constraint from the neighbourhood of `near`; null where no climb reaches its rule. */
export const maximisePeaksUnder = (
  maximum: PeaksMaximum,
  constraint: TailConstraint,
  near: Float64Array,
): ConstrainedTail | null => {
  const work = createWorkspace();
  const objective = constrainedObjective(maximum, constraint, work);
  const highest = constraint.figure === 'quantile' ? highestShape : highestShortfallShape;
  const settings = {
    lower: Float64Array.of(lowestShape, Number.NEGATIVE_INFINITY),
    upper: Float64Array.of(highest, Number.POSITIVE_INFINITY),
    tolerance,
    maxSteps,
  };
  for (const start of startsNear(maximum, constraint, near)) {
    const climb = maximiseByNewton(objective, start, settings);
    if (!climb.converged) continue;
    const value = objective(climb.point, new Float64Array(2), new Float64Array(4));
    return {
      point: climb.point,
      value,
      inDistance: (work.gradient[1] as number) / constraint.distance,
      inLogTail: work.binomial.slope,
    };
  }
  return null;
};
