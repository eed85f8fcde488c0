import { problem } from '../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import { type StandardSample, standardise } from '../moments/standardSample.ts';
import type { NewtonMaximum } from '../numerics/boundedNewton.ts';
import { maximiseByNewton } from '../numerics/boundedNewton.ts';
import { leastCounts, refuseUnusable } from '../returns/leastCounts.ts';
import { mostFrequentValue } from '../returns/mostFrequentValue.ts';
import { type StudentLikelihood, studentLikelihood } from './internal/studentLikelihood.ts';
import { isHigherElsewhere, studentMaxima, studentSettings } from './internal/studentMaxima.ts';

/** Location and scale in the units of the returns; the scale is not the standard deviation. */
export type StudentParameters = { readonly location: number; readonly scale: number; readonly nu: number };

export type StudentFit = StudentParameters & {
  /** The fit is the normal distribution; nu is then Infinity. */
  readonly normalLimit: boolean;
  /** nu ended on 0.5, the lower end of its range, and was held there. */
  readonly nuOnBound: boolean;
  readonly logLikelihood: number;
  /** The log-likelihood of the normal distribution fitted to the same returns (divisor n). */
  readonly normalLogLikelihood: number;
};

/** A fit with what a profile of its likelihood needs: the returns in standard units, and the maximum there. */
export type StudentMaximum = {
  readonly sample: StandardSample;
  readonly likelihood: StudentLikelihood;
  /** (location, ln scale, 1/nu) in standard units. */
  readonly point: Float64Array;
  readonly standardErrors: Float64Array;
  readonly value: number;
  readonly fit: StudentFit;
};

const figure = 'A Student fit';

/** From this share of equal returns up the likelihood can grow without end inside nu ≥ 0.5. */
const refuseUnbounded = (returns: Float64Array): Refusal | null => {
  const { value, count } = mostFrequentValue(returns);
  if (3 * count < returns.length) return null;
  return refuse(
    problem(
      'likelihoodUnbounded',
      `${figure} needs returns of which fewer than a third are equal, and the return ${value} occurs ${count} times ` +
        `in ${returns.length}: its likelihood has no highest point. Ask for a longer window or for the historical model.`,
    ),
  );
};

const notConverged = (count: number): Refusal =>
  refuse(
    problem(
      'fitNotConverged',
      `${figure} to these ${count} returns did not reach its stopping rule. Ask for another window or for the historical model.`,
    ),
  );

/** Gains of log-likelihood per return over the normal fit that cannot be told from rounding. */
const noGain = 1e-15;

const isNormalLimit = (maximum: NewtonMaximum, normalValue: number, count: number): boolean =>
  maximum.point[2] === 0 || maximum.value - normalValue <= noGain * count;

const describe = (
  sample: StandardSample,
  likelihood: StudentLikelihood,
  maximum: NewtonMaximum,
): StudentMaximum => {
  const { count } = likelihood;
  const shift = -count * Math.log(sample.deviation);
  const normalValue = -0.5 * count * (Math.log(2 * Math.PI) + 1);
  const normalLimit = isNormalLimit(maximum, normalValue, count);
  const point = normalLimit ? new Float64Array(3) : maximum.point;
  const value = normalLimit ? normalValue : maximum.value;
  const fit: StudentFit = {
    location: sample.mean + sample.deviation * (point[0] as number),
    scale: sample.deviation * Math.exp(point[1] as number),
    nu: normalLimit ? Number.POSITIVE_INFINITY : 1 / (point[2] as number),
    normalLimit,
    nuOnBound: maximum.side[2] === 1,
    logLikelihood: value + shift,
    normalLogLikelihood: normalValue + shift,
  };
  return { sample, likelihood, point, standardErrors: maximum.standardErrors, value, fit };
};

const nearbyMaximum = (
  sample: StandardSample,
  likelihood: StudentLikelihood,
  start: StudentParameters,
): NewtonMaximum =>
  maximiseByNewton(
    likelihood.objective,
    Float64Array.of(
      (start.location - sample.mean) / sample.deviation,
      Math.log(start.scale / sample.deviation),
      Math.min(1 / start.nu, studentSettings.upper[2] as number),
    ),
    studentSettings,
  );

/** The highest maximum; null where none was reached, or where one that was not reached already lies higher. */
const highestOf = (maxima: readonly NewtonMaximum[]): NewtonMaximum | null => {
  let highest: NewtonMaximum | null = null;
  for (const maximum of maxima) if (highest === null || maximum.value > highest.value) highest = maximum;
  return highest?.converged === true ? highest : null;
};

/** The fit with its standard-unit parts; see {@link fitStudent}. */
export const maximiseStudent = (returns: Float64Array, near?: StudentParameters): Result<StudentMaximum> => {
  const refusal = refuseUnusable(returns, leastCounts.studentTail, figure) ?? refuseUnbounded(returns);
  if (refusal !== null) return refusal;
  const sample = standardise(returns);
  const likelihood = studentLikelihood(sample.values);
  if (near !== undefined) {
    const maximum = nearbyMaximum(sample, likelihood, near);
    if (maximum.converged && !isHigherElsewhere(likelihood, sample, maximum.value))
      return succeed(describe(sample, likelihood, maximum));
  }
  const highest = highestOf(studentMaxima(likelihood, sample));
  return highest === null ? notConverged(returns.length) : succeed(describe(sample, likelihood, highest));
};

/**
 * Which Student distribution, moved and stretched, makes these returns most likely?
 * Convention: maximum likelihood in location, scale and nu, nu from 0.5 to infinity. Every maximum along 1/nu is found
 * from a grid of the profile likelihood and the highest is taken; where the excess kurtosis is not positive and nothing
 * on the grid is higher the fit is the normal distribution with the mean and √m2 (divisor n). Finished when every free
 * parameter of (location, ln scale, 1/nu) has |gradient|·standard error ≤ 1e-8, the errors from the observed information.
 * Domain: at least 20 finite returns that differ and of which fewer than a third are equal.
 * Units: returns as decimal fractions; location and scale as decimal fractions, nu a number.
 * Edges: `near` (yesterday's fit, say) makes it climb to the maximum close by first; the full search follows where that
 * climb fails or the profile stands higher on a coarse grid. nu = 0.5 is a bound: the fit is then held there.
 * Source: Lange, Little & Taylor 1989, JASA 84, 881-896; fixed-nu step of Kent, Tyler & Vardi 1994; bounded below by
 * n and the most frequent value as in Kent & Tyler 1991, Annals of Statistics 19, 2102-2119.
 * Example: daily returns of a share index give nu near 4.
 */
export const fitStudent = (returns: Float64Array, near?: StudentParameters): Result<StudentFit> => {
  const maximum = maximiseStudent(returns, near);
  return maximum.ok ? succeed(maximum.value.fit) : maximum;
};
