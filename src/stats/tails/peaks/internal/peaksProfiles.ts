import { maximiseByNewton } from '../../../numerics/boundedNewton.ts';
import { findProfileEnd, type ProfileAt, type ProfileEnd } from '../../internal/profileEnd.ts';
import { type ConstrainedTail, maximisePeaksUnder, type TailConstraint } from './constrainedPeaks.ts';
import { quantileBeyond, shortfallBeyond } from './gpdTail.ts';
import type { PeaksMaximum } from './peaksMaximum.ts';

/** Both ends of a profile-likelihood interval as the searches left them. */
export type PeaksEnds = { readonly lower: ProfileEnd; readonly upper: ProfileEnd };

/** Where a search starts, how far its figure may go, and a rough guess of its standard error. */
type Search = {
  /** A fresh profile for each direction, for a profile keeps where it ended last. */
  readonly start: () => ProfileAt;
  readonly estimate: number;
  readonly highest: number;
  readonly roughError: number;
  readonly bounds: readonly [number, number];
};

const bothEnds = (reach: number, search: Search): PeaksEnds => {
  const towards = (direction: -1 | 1, bound: number): ProfileEnd =>
    findProfileEnd({
      profile: search.start(),
      estimate: search.estimate,
      highest: search.highest,
      reach,
      firstDistance: reach * search.roughError,
      direction,
      bound,
    });
  return { lower: towards(-1, search.bounds[0]), upper: towards(1, search.bounds[1]) };
};

/** Climbs under one constraint after another, each from where the last one ended, or from the fit where that fails. */
const followConstraint = (maximum: PeaksMaximum) => {
  let last: Float64Array | null = null;
  return (constraint: TailConstraint): ConstrainedTail | null => {
    const depth = Math.max(depthOf(maximum, constraint.tail), leastDepth);
    const fitted = Float64Array.of(maximum.gpd.fit.shape, Math.log(depth));
    const reached =
      (last === null ? null : maximisePeaksUnder(maximum, constraint, last)) ??
      maximisePeaksUnder(maximum, constraint, fitted);
    if (reached !== null) last = reached.point;
    return reached;
  };
};

/** How far a level lies beyond the threshold: ln(ζ/tail), ζ the observed share beyond it. */
const depthOf = ({ count, beyond }: PeaksMaximum, tail: number): number => Math.log(beyond / count / tail);

/** Where a search must start for a chance that is larger than the observed share. */
const leastDepth = 0.1;

/** Range in which xi is profiled: above −1, where the likelihood of a given xi still has a highest point. */
const profiledShapes = [-0.95, 5] as const;
const tolerance = 1e-7;
const maxSteps = 100;

/** Ends of xi. A bound means that no xi in the profiled range is that unlikely. */
export const shapeEnds = ({ gpd }: PeaksMaximum, reach: number): PeaksEnds => {
  const start = (): ProfileAt => {
    let logScale = gpd.point[1] as number;
    const gradient = new Float64Array(2);
    const hessian = new Float64Array(4);
    return (shape) => {
      // A short tail must end beyond the largest excess.
      const feasible = shape < 0 ? Math.log(-1.05 * shape * gpd.largest) : Number.NEGATIVE_INFINITY;
      const climb = maximiseByNewton(gpd.objective, Float64Array.of(shape, Math.max(logScale, feasible)), {
        lower: Float64Array.of(shape, Number.NEGATIVE_INFINITY),
        upper: Float64Array.of(shape, Number.POSITIVE_INFINITY),
        tolerance,
        maxSteps,
      });
      if (!climb.converged) return null;
      logScale = climb.point[1] as number;
      gpd.objective(climb.point, gradient, hessian);
      return { value: climb.value, slope: gradient[0] as number };
    };
  };
  return bothEnds(reach, {
    start,
    estimate: gpd.fit.shape,
    highest: gpd.value,
    roughError: gpd.fit.standardErrors.shape,
    bounds: profiledShapes,
  });
};

/** A distance in mean excesses that counts as none. */
const leastDistance = 1e-6;

const distanceEnds = (
  maximum: PeaksMaximum,
  reach: number,
  constraint: Omit<TailConstraint, 'distance'>,
  inScales: number,
  boundedAbove: boolean,
): PeaksEnds => {
  const scale = maximum.gpd.fit.scale / maximum.gpd.unit;
  const estimate = scale * inScales;
  const start = (): ProfileAt => {
    const follow = followConstraint(maximum);
    return (distance) => {
      const reached = follow({ ...constraint, distance });
      return reached === null ? null : { value: reached.value, slope: reached.inDistance };
    };
  };
  return bothEnds(reach, {
    start,
    estimate,
    highest: maximum.value,
    roughError: (scale * (1 + inScales)) / Math.sqrt(maximum.beyond),
    bounds: [leastDistance, boundedAbove ? Number.POSITIVE_INFINITY : estimate],
  });
};

/** Ends of VaR, as distances from the threshold in mean excesses; a lower bound is the threshold itself. */
export const quantileEnds = (maximum: PeaksMaximum, reach: number, tail: number): PeaksEnds =>
  distanceEnds(
    maximum,
    reach,
    { figure: 'quantile', tail },
    quantileBeyond(maximum.gpd.fit.shape, depthOf(maximum, tail)),
    true,
  );

/** Ends of ES in the same units, xi < 1. Where xi = 1 is not ruled out nothing bounds ES from above, which the caller says. */
export const shortfallEnds = (
  maximum: PeaksMaximum,
  reach: number,
  tail: number,
  boundedAbove: boolean,
): PeaksEnds =>
  distanceEnds(
    maximum,
    reach,
    { figure: 'shortfall', tail },
    shortfallBeyond(maximum.gpd.fit.shape, depthOf(maximum, tail)),
    boundedAbove,
  );

/** ln of 1e-12, below which a chance counts as 0: nearer to the end of a short tail its distance from it loses its digits. */
const leastLogTail = Math.log(1e-12);

/** Ends of the logarithm of the chance of a loss `distance` mean excesses beyond the threshold. */
export const logTailEnds = (
  maximum: PeaksMaximum,
  reach: number,
  distance: number,
  logTail: number,
): PeaksEnds => {
  const start = (): ProfileAt => {
    const follow = followConstraint(maximum);
    return (value) => {
      const reached = follow({ figure: 'quantile', tail: Math.exp(value), distance });
      return reached === null ? null : { value: reached.value, slope: reached.inLogTail };
    };
  };
  const estimate = Math.max(logTail, leastLogTail);
  if (logTail < leastLogTail) {
    // Beyond the end of a short tail the smallest chance that counts may already be too unlikely.
    const least = start()(leastLogTail);
    if (least !== null && 2 * (maximum.value - least.value) >= reach * reach)
      return { lower: { kind: 'bound' }, upper: { kind: 'end', figure: leastLogTail } };
  }
  return bothEnds(reach, {
    start,
    estimate,
    highest: maximum.value,
    roughError: 0.5,
    bounds: [leastLogTail, 0],
  });
};
