import {
  createWorkspace,
  factorise,
  fillErrors,
  substitute,
  type Workspace,
} from './internal/newtonWorkspace.ts';

/**
 * A smooth function to be maximised. Fills the gradient and the row-major second derivatives at `point` and returns
 * the value; −Infinity where the function does not exist, in which case the derivatives are not read.
 */
export type SmoothObjective = (point: Float64Array, gradient: Float64Array, hessian: Float64Array) => number;

/** `lower` and `upper` bound each parameter; −Infinity and Infinity leave it free. */
export type NewtonSettings = {
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** Finished when every free parameter has |gradient|·standard error at or below this. */
  readonly tolerance: number;
  readonly maxSteps: number;
};

export type NewtonMaximum = {
  readonly converged: boolean;
  readonly value: number;
  readonly point: Float64Array;
  /** −1 on the lower bound, 1 on the upper, 0 free; a parameter on a bound has a gradient that points outward. */
  readonly side: Int8Array;
  /** From the inverse of the negative second derivatives over the free parameters; 0 for a parameter on its bound. */
  readonly standardErrors: Float64Array;
  readonly steps: number;
};

/** A parameter on a bound stays there while its gradient points outward. */
const holdBounds = (work: Workspace, settings: NewtonSettings): void => {
  for (let i = 0; i < work.size; i += 1) {
    const at = work.point[i] as number;
    const slope = work.gradient[i] as number;
    const onLower = at <= (settings.lower[i] as number) && slope <= 0;
    const onUpper = at >= (settings.upper[i] as number) && slope >= 0;
    work.side[i] = onLower ? -1 : onUpper ? 1 : 0;
  }
};

const isFinished = (work: Workspace, tolerance: number): boolean => {
  for (let i = 0; i < work.size; i += 1) {
    if (work.side[i] !== 0) continue;
    if (!(Math.abs(work.gradient[i] as number) * (work.errors[i] as number) <= tolerance)) return false;
  }
  return true;
};

const firstRidge = 1e-3;
const ridgeGrowth = 10;
const mostRidges = 30;

/** Newton's step where the second derivatives allow it, else the smallest ridge that makes it a step uphill. */
const chooseStep = (work: Workspace): boolean => {
  let ridge = 0;
  for (let attempt = 0; attempt < mostRidges; attempt += 1) {
    if (factorise(work, ridge)) {
      for (let i = 0; i < work.size; i += 1)
        work.step[i] = work.side[i] === 0 ? (work.gradient[i] as number) : 0;
      substitute(work.size, work.factor, work.step);
      return true;
    }
    ridge = ridge === 0 ? firstRidge : ridge * ridgeGrowth;
  }
  return false;
};

/** A parameter on a bound whose step leaves the box is held too; true where one was found. */
const holdLeaving = (work: Workspace, settings: NewtonSettings): boolean => {
  let found = false;
  for (let i = 0; i < work.size; i += 1) {
    if (work.side[i] !== 0) continue;
    const at = work.point[i] as number;
    const step = work.step[i] as number;
    const leavesLower = at <= (settings.lower[i] as number) && step < 0;
    const leavesUpper = at >= (settings.upper[i] as number) && step > 0;
    if (leavesLower || leavesUpper) {
      work.side[i] = leavesLower ? -1 : 1;
      found = true;
    }
  }
  return found;
};

/** Puts point + fraction·step, kept inside the bounds, into trial; returns the first-order gain. */
const placeTrial = (work: Workspace, settings: NewtonSettings, fraction: number): number => {
  let gain = 0;
  for (let i = 0; i < work.size; i += 1) {
    const at = work.point[i] as number;
    const wanted = at + fraction * (work.step[i] as number);
    const placed = Math.min(Math.max(wanted, settings.lower[i] as number), settings.upper[i] as number);
    work.trial[i] = placed;
    gain += (work.gradient[i] as number) * (placed - at);
  }
  return gain;
};

const leastShareOfGain = 1e-4;
const mostHalvings = 50;
/** Relative rounding error granted to a function value: below it two values cannot be told apart. */
const valueNoise = 1e-11;

/** Walks along the step until the value rises enough; the new value, or null where it never does. */
const climb = (
  objective: SmoothObjective,
  work: Workspace,
  settings: NewtonSettings,
  value: number,
): number | null => {
  const noise = valueNoise * Math.max(1, Math.abs(value));
  let fraction = 1;
  for (let halving = 0; halving < mostHalvings; halving += 1) {
    const gain = placeTrial(work, settings, fraction);
    const reached = objective(work.trial, work.trialGradient, work.trialHessian);
    const wanted = value + leastShareOfGain * gain - (gain < 1e3 * noise ? noise : 0);
    if (reached >= wanted && gain >= 0) {
      work.point.set(work.trial);
      work.gradient.set(work.trialGradient);
      work.hessian.set(work.trialHessian);
      return reached;
    }
    fraction /= 2;
  }
  return null;
};

/** One step more once the rule is met: it squares the distance that is left, at the price of one evaluation. */
const lastStep = (
  objective: SmoothObjective,
  work: Workspace,
  settings: NewtonSettings,
  value: number,
): number => (chooseStep(work) ? (climb(objective, work, settings, value) ?? value) : value);

const outcome = (work: Workspace, value: number, steps: number, converged: boolean): NewtonMaximum => ({
  converged,
  value,
  point: work.point,
  side: work.side,
  standardErrors: work.errors,
  steps,
});

/**
 * Where is a smooth function of a few bounded parameters highest, near a starting point?
 * Convention: Newton's method on the parameters that are free, with a ridge where the second derivatives do not curve
 * downward, halved until the value rises; a parameter on a bound is held while its gradient points outward.
 * Domain: a start inside the bounds at which the objective is finite.
 * Units: the objective's own; the stopping rule |gradient|·standard error has none.
 * Edges: `converged` is false after `maxSteps`, where no step uphill exists, or where the second derivatives over the
 * free parameters are not negative definite at the end; the best point reached is still returned. Always ends.
 * Source: Nocedal & Wright 2006, Numerical Optimization, sections 3.4 and 16.7 (projection on bounds).
 * Example: an objective −(x − 2)² with bounds 0 and 1 ends at 1, side 1.
 */
export const maximiseByNewton = (
  objective: SmoothObjective,
  start: Float64Array,
  settings: NewtonSettings,
): NewtonMaximum => {
  const work = createWorkspace(start);
  let value = objective(work.point, work.gradient, work.hessian);
  if (!Number.isFinite(value)) return outcome(work, value, 0, false);
  for (let steps = 0; steps < settings.maxSteps; steps += 1) {
    holdBounds(work, settings);
    if (factorise(work, 0)) {
      fillErrors(work);
      if (isFinished(work, settings.tolerance))
        return outcome(work, lastStep(objective, work, settings, value), steps, true);
    }
    do {
      if (!chooseStep(work)) return outcome(work, value, steps, false);
    } while (holdLeaving(work, settings));
    const reached = climb(objective, work, settings, value);
    if (reached === null) return outcome(work, value, steps, false);
    value = reached;
  }
  return outcome(work, value, settings.maxSteps, false);
};
