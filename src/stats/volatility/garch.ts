import { type Result, succeed } from '../../terms/result.ts';
import { type StandardSample, standardise } from '../moments/standardSample.ts';
import type { NewtonMaximum } from '../numerics/boundedNewton.ts';
import { leastCounts, refuseUnusable } from '../returns/leastCounts.ts';
import type { GarchProcess } from './garchPath.ts';
import { garchObjective } from './internal/garchDerivatives.ts';
import { parameter, presampleVariance } from './internal/garchLikelihood.ts';
import { noClustering, refuseMaximum } from './internal/garchOutcome.ts';
import {
  climbNear,
  climbResample,
  fitConstantVariance,
  type Innovations,
  pointOf,
  searchGarch,
} from './internal/garchSearch.ts';
import { refuseRepeats } from './internal/refuseRepeats.ts';

export type { Innovations } from './internal/garchSearch.ts';

/** How many returns before the 500th the GARCH figures begin to stand beside the simpler ones. */
export const garchOverlap = 10;

/** From the observed information; null for a parameter that was held. That of omega is in the units of omega. */
export type GarchStandardErrors = {
  readonly mu: number;
  readonly omega: number;
  readonly alpha: number | null;
  readonly beta: number | null;
  readonly inverseNu: number | null;
};

/** mu in the units of the returns, omega in their square. */
export type GarchFit = {
  readonly innovations: Innovations;
  readonly mu: number;
  readonly omega: number;
  readonly alpha: number;
  /** Null where no volatility clustering was found: alpha is then 0, and omega the constant variance. */
  readonly beta: number | null;
  /** Infinity for normal innovations, asked for or found. */
  readonly nu: number;
  readonly clustering: boolean;
  /** Student innovations were allowed and the normal limit was the best of them. */
  readonly normalLimit: boolean;
  readonly logLikelihood: number;
  readonly standardErrors: GarchStandardErrors;
};

export type GarchOptions = {
  /** Default student. */
  readonly innovations?: Innovations;
  /**
   * A fit to nearly the same returns: one climb from there replaces the search where it succeeds. Several times faster,
   * and now and then the summit it reaches is not the highest.
   */
  readonly near?: GarchFit;
};

/** The process that {@link filterByGarch} runs. */
export const processOf = ({ mu, omega, alpha, beta }: GarchFit): GarchProcess => ({
  mu,
  omega,
  alpha,
  beta: beta ?? 0,
});

const figure = 'A GARCH fit';

/** Returns as a fit sees them: less a mean, over a deviation. */
type ScaledSample = Pick<StandardSample, 'values' | 'mean' | 'deviation'>;

const describe = (sample: ScaledSample, maximum: NewtonMaximum, innovations: Innovations): GarchFit => {
  const { deviation } = sample;
  const value = (name: keyof typeof parameter): number => maximum.point[parameter[name]] as number;
  const error = (name: keyof typeof parameter): number => maximum.standardErrors[parameter[name]] as number;
  const freeError = (name: keyof typeof parameter): number | null =>
    maximum.side[parameter[name]] === 0 ? error(name) : null;
  const clustering = !noClustering(maximum);
  const omega = deviation * deviation * Math.exp(value('logOmega'));
  const inverseNu = value('inverseNu');
  return {
    innovations,
    mu: sample.mean + deviation * value('mu'),
    omega,
    alpha: value('alpha'),
    beta: clustering ? value('beta') : null,
    nu: inverseNu === 0 ? Number.POSITIVE_INFINITY : 1 / inverseNu,
    clustering,
    normalLimit: innovations === 'student' && inverseNu === 0,
    logLikelihood: maximum.value - sample.values.length * Math.log(deviation),
    standardErrors: {
      mu: deviation * error('mu'),
      omega: omega * error('logOmega'),
      alpha: freeError('alpha'),
      beta: freeError('beta'),
      inverseNu: freeError('inverseNu'),
    },
  };
};

const pointNear = (sample: ScaledSample, near: GarchFit, innovations: Innovations): Float64Array =>
  pointOf(
    (near.mu - sample.mean) / sample.deviation,
    Math.log(near.omega / sample.deviation ** 2),
    near.alpha,
    near.beta ?? 0,
    innovations === 'normal' ? 0 : 1 / near.nu,
  );

/** The highest point of the likelihood, with or without clustering; refused when it is no maximum to report. */
const highest = (sample: StandardSample, innovations: Innovations, near: GarchFit | null): NewtonMaximum => {
  if (near?.clustering === true) {
    const climb = climbNear(sample.values, pointNear(sample, near, innovations), innovations);
    if (climb.converged && !noClustering(climb)) return climb;
  }
  const { clustered, constant } = searchGarch(sample.values, innovations);
  return noClustering(clustered) || clustered.value <= constant.value ? constant : clustered;
};

/**
 * How does volatility cluster in these returns, and how fat are the tails of what remains?
 * Convention: maximum likelihood of GARCH(1,1), h_t = ω + α·e²_{t−1} + β·h_{t−1}, with e²_0 = h_0 = mean (r − mu)² at the current mu, and
 * unit-variance Student (nu > 2) or normal innovations. Newton's method with analytic first and second derivatives in
 * (mu, ln ω, α, β, 1/nu) from the best start of each of four bands of β, finished when every free parameter has
 * |gradient|·standard error ≤ 1e-8 and the observed information is positive definite.
 * Domain: at least 490 returns that differ, none of which fills most of the window (500 for a figure that stands alone).
 * Units: returns as decimal fractions (any unit will do: the fit scales with it); mu in that unit, omega in its square.
 * Edges: alpha = 0 is "no clustering": beta is null and the variance constant. beta = 0 and 1/nu = 0 are held on their
 * bounds. alpha + beta ≥ 0.9999, or nu at 2, is refused; so is a climb that does not finish.
 * Source: Bollerslev 1986, Journal of Econometrics 31, 307-327; Bollerslev 1987, Review of Economics and Statistics 69,
 * 542-547; start and derivatives as in Fiorentini, Calzolari & Panattoni 1996, Journal of Applied Econometrics 11, 399-417.
 * Example: daily returns of the mark against the pound, 1984 to 1991, give alpha 0.153 and beta 0.806 (normal).
 */
export const fitGarch = (returns: Float64Array, options: GarchOptions = {}): Result<GarchFit> => {
  const innovations = options.innovations ?? 'student';
  const refusal =
    refuseUnusable(returns, leastCounts.garch - garchOverlap, figure) ?? refuseRepeats(returns, figure);
  if (refusal !== null) return refusal;
  const sample = standardise(returns);
  const maximum = highest(sample, innovations, options.near ?? null);
  return refuseMaximum(maximum, returns.length) ?? succeed(describe(sample, maximum, innovations));
};

/** Returns less the fitted mu, over the root of their mean square, so that a climb meets numbers near 1. */
const scaleInto = (values: Float64Array, returns: Float64Array, mu: number): number => {
  const deviation = Math.sqrt(presampleVariance(returns, mu));
  for (let day = 0; day < values.length; day += 1) values[day] = ((returns[day] as number) - mu) / deviation;
  return deviation;
};

/**
 * Fits again, and again, to `count` returns resampled from the fit `near`: each time the climb from there alone, until
 * |gradient|·standard error ≤ 0.01 and one step of Newton more, which leaves about 1e-4 standard errors; the constant variance
 * alone where `near` found no clustering. Null where a climb does not finish inside the range that {@link fitGarch} reports.
 */
export const startRefits = (
  count: number,
  near: GarchFit,
): ((returns: Float64Array) => GarchProcess | null) => {
  const { innovations, mu: mean } = near;
  const values = new Float64Array(count);
  const objective = garchObjective(values);
  return (returns) => {
    const deviation = scaleInto(values, returns, mean);
    const sample = { values, mean, deviation };
    const climbed = near.clustering
      ? climbResample(objective, pointNear(sample, near, innovations), innovations)
      : null;
    const maximum =
      climbed === null || noClustering(climbed) ? fitConstantVariance(objective, innovations) : climbed;
    return refuseMaximum(maximum, count) === null ? processOf(describe(sample, maximum, innovations)) : null;
  };
};
