import { maximiseByNewton, type NewtonMaximum, type SmoothObjective } from '../../numerics/boundedNewton.ts';
import { garchObjective } from './garchDerivatives.ts';
import { garchLogLikelihood, parameter, parameterCount } from './garchLikelihood.ts';

/** Which innovations a fit allows; `normal` holds 1/nu at 0. */
export type Innovations = 'normal' | 'student';

/** Largest 1/nu searched: nu of 2.0004, next to which the variance is no longer finite. */
export const largestInverseNu = 0.4999;
/** Returns are brought to mean 0 and mean square 1, so these bounds on ln ω hold for every price. */
const leastLogOmega = Math.log(1e-9);
const mostLogOmega = Math.log(1e3);
/** Beyond this sum of α and β the likelihood is not looked at: the variance would explode within the window. */
const largestPersistence = 1.2;

/** A reported fit is finished at this |gradient|·standard error. */
const tolerance = 1e-8;
/** Close enough to tell summits apart. */
const coarseTolerance = 1e-4;
/** The last step of a climb squares what is left, so a resample ends near 1e-4 standard errors of its summit. */
const resampleTolerance = 1e-2;
/** Enough for a climb with a clear summit; only the highest is followed to the end. */
const stepsToExplore = 40;
const stepsToFinish = 300;
/** Bands of β in which separate maxima are seen; the best start of each band is followed. */
const startBetaBands = [[0], [0.3, 0.6], [0.8, 0.9], [0.96, 0.985]];
const startAlphas = [0.01, 0.03, 0.08, 0.2];
const startInverseNu = 0.15;

export const pointOf = (
  mu: number,
  logOmega: number,
  alpha: number,
  beta: number,
  inverseNu: number,
): Float64Array => {
  const point = new Float64Array(parameterCount);
  point[parameter.mu] = mu;
  point[parameter.logOmega] = logOmega;
  point[parameter.alpha] = alpha;
  point[parameter.beta] = beta;
  point[parameter.inverseNu] = inverseNu;
  return point;
};

const highestInverseNu = (innovations: Innovations): number =>
  innovations === 'normal' ? 0 : largestInverseNu;

/** Newton's climb from one start; α and β may be held at 0, which is the constant variance. */
const climbFrom = (
  objective: SmoothObjective,
  start: Float64Array,
  innovations: Innovations,
  constantVariance: boolean,
  maxSteps: number,
  stopAt = tolerance,
): NewtonMaximum => {
  return maximiseByNewton(
    (point, gradient, hessian) =>
      (point[parameter.alpha] as number) + (point[parameter.beta] as number) > largestPersistence
        ? -Infinity
        : objective(point, gradient, hessian),
    start,
    {
      lower: pointOf(-Infinity, leastLogOmega, 0, 0, 0),
      upper: pointOf(
        Infinity,
        mostLogOmega,
        constantVariance ? 0 : 1,
        constantVariance ? 0 : 1,
        highestInverseNu(innovations),
      ),
      tolerance: stopAt,
      maxSteps,
    },
  );
};

/** The most promising start of each band. The grid is fixed, which makes the search deterministic. */
const chooseStarts = (returns: Float64Array, inverseNu: number): Float64Array[] =>
  startBetaBands.map((betas) => {
    let best = { point: pointOf(0, 0, 0, 0, inverseNu), value: -Infinity };
    for (const beta of betas) {
      for (const alpha of startAlphas) {
        if (alpha + beta >= 0.999) continue;
        const point = pointOf(0, Math.log(1 - alpha - beta), alpha, beta, inverseNu);
        const value = garchLogLikelihood(returns, point);
        if (value > best.value) best = { point, value };
      }
    }
    return best.point;
  });

/** The highest climb of a search, and the fit of a constant variance to compare it with. */
export type GarchSearch = { readonly clustered: NewtonMaximum; readonly constant: NewtonMaximum };

/** The constant variance alone: α = β = 0. */
export const fitConstantVariance = (objective: SmoothObjective, innovations: Innovations): NewtonMaximum => {
  const inverseNu = Math.min(startInverseNu, highestInverseNu(innovations));
  return climbFrom(objective, pointOf(0, 0, 0, 0, inverseNu), innovations, true, stepsToFinish);
};

/** One climb from a known point nearby, such as yesterday's fit. */
export const climbNear = (
  returns: Float64Array,
  start: Float64Array,
  innovations: Innovations,
): NewtonMaximum => climbFrom(garchObjective(returns), start, innovations, false, stepsToExplore);

/** A climb that stops short of the last digits, and need not arrive: one that creeps along α = 0 is left where it is. */
const explore = (
  objective: SmoothObjective,
  start: Float64Array,
  innovations: Innovations,
  stopAt = coarseTolerance,
): NewtonMaximum => climbFrom(objective, start, innovations, false, stepsToExplore, stopAt);

/**
 * The climb for a resample of the returns that were fitted at `start`. Most need five steps; one that creeps along α = 0
 * is not followed further, because the constant variance that it stands for is fitted by itself.
 */
export const climbResample = (
  objective: SmoothObjective,
  start: Float64Array,
  innovations: Innovations,
): NewtonMaximum => {
  const first = explore(objective, start, innovations, resampleTolerance);
  const unfinished = !first.converged && first.point[parameter.alpha] !== 0;
  return unfinished ? explore(objective, first.point, innovations, resampleTolerance) : first;
};

/** Searches from every promising start. `returns` have mean 0 and mean square 1. */
export const searchGarch = (returns: Float64Array, innovations: Innovations): GarchSearch => {
  const inverseNu = Math.min(startInverseNu, highestInverseNu(innovations));
  const objective = garchObjective(returns);
  const climbs = chooseStarts(returns, inverseNu).map((start) => explore(objective, start, innovations));
  const highest = climbs.reduce((best, next) => (next.value > best.value ? next : best));
  const clusters = highest.point[parameter.alpha] !== 0;
  return {
    clustered: clusters ? climbFrom(objective, highest.point, innovations, false, stepsToFinish) : highest,
    constant: fitConstantVariance(objective, innovations),
  };
};
