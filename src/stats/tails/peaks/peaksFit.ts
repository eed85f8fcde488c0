import { problem } from '../../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../../terms/result.ts';
import { arithmeticMean } from '../../moments/mean.ts';
import { maximiseByNewton, type NewtonMaximum, type SmoothObjective } from '../../numerics/boundedNewton.ts';
import { gpdLogLikelihood } from './internal/gpdLikelihood.ts';

/** A fitted generalised Pareto tail. The scale is in the units of the excesses. */
export type GpdFit = {
  readonly shape: number;
  readonly scale: number;
  readonly logLikelihood: number;
  readonly standardErrors: { readonly shape: number; readonly scale: number };
};

/** A fit with what a profile of its likelihood needs, the excesses in units of their mean. */
export type GpdMaximum = {
  readonly unit: number;
  readonly objective: SmoothObjective;
  /** (xi, ln β) in those units. */
  readonly point: Float64Array;
  readonly value: number;
  readonly largest: number;
  readonly fit: GpdFit;
};

/** Outside this range of xi the estimator does not work: below it has no usual errors, above it the sample says too little. */
export const shapeRange = { lower: -0.5, upper: 1.5 } as const;

const settings = {
  lower: Float64Array.of(shapeRange.lower, Number.NEGATIVE_INFINITY),
  upper: Float64Array.of(shapeRange.upper, Number.POSITIVE_INFINITY),
  tolerance: 1e-8,
  maxSteps: 100,
};

/** Starts for excesses of mean 1; the short-tailed one must reach past the largest excess. */
const startsFor = (largest: number): readonly Float64Array[] => [
  Float64Array.of(0.1, Math.log(0.9)),
  Float64Array.of(0.7, Math.log(0.5)),
  Float64Array.of(-0.25, Math.log(Math.max(1.25, 0.3 * largest))),
];

const shapeOutside = (shape: number): Refusal =>
  refuse(
    problem(
      'shapeOutside',
      `The tail shape xi runs ${shape < 0 ? 'down to' : 'up to'} ${shape}, the end of the range in which its estimator works. ` +
        'Ask for a longer window or for the historical model.',
    ),
  );

const notConverged = (count: number): Refusal =>
  refuse(
    problem(
      'fitNotConverged',
      `The tail fit to these ${count} losses did not reach its stopping rule. Ask for another window or for the historical model.`,
    ),
  );

const describe = (
  excesses: Float64Array,
  unit: number,
  objective: SmoothObjective,
  largest: number,
  maximum: NewtonMaximum,
): GpdMaximum => {
  const scale = unit * Math.exp(maximum.point[1] as number);
  const fit: GpdFit = {
    shape: maximum.point[0] as number,
    scale,
    logLikelihood: maximum.value - excesses.length * Math.log(unit),
    standardErrors: {
      shape: maximum.standardErrors[0] as number,
      scale: scale * (maximum.standardErrors[1] as number),
    },
  };
  return { unit, objective, point: maximum.point, value: maximum.value, largest, fit };
};

/** The fit with its scaled parts; see {@link fitGpd}. */
export const maximiseGpd = (excesses: Float64Array): Result<GpdMaximum> => {
  const unit = arithmeticMean(excesses);
  const scaled = excesses.map((excess) => excess / unit);
  const largest = scaled.reduce((most, excess) => Math.max(most, excess));
  const objective = gpdLogLikelihood(scaled);
  const climbs = startsFor(largest).map((start) => maximiseByNewton(objective, start, settings));
  const highest = climbs.reduce((best, next) => (next.value > best.value ? next : best));
  if (highest.side[0] !== 0) return shapeOutside(highest.point[0] as number);
  if (!highest.converged) return notConverged(excesses.length);
  return succeed(describe(excesses, unit, objective, largest, highest));
};

/**
 * Which generalised Pareto distribution makes these excesses over a threshold most likely?
 * Convention: distribution 1 − (1 + xi·y/β)^(−1/xi), maximum likelihood by Newton's method in (xi, ln β) from three starts, the
 * highest taken; finished when |gradient|·standard error ≤ 1e-8 in both, the errors from the observed information.
 * Domain: excesses above 0, some dozens.
 * Units: excesses in any one unit; the scale and its error in that unit; xi has none.
 * Edges: refused where xi ends on −0.5 or 1.5.
 * Source: Smith 1987, Annals of Statistics 15, 1174-1207; Davison & Smith 1990, Journal of the Royal Statistical Society B 52,
 * 393-442.
 * Example: the 109 Danish fire losses above 10 million kroner give xi 0.497 and β 6.98.
 */
export const fitGpd = (excesses: Float64Array): Result<GpdFit> => {
  const maximum = maximiseGpd(excesses);
  return maximum.ok ? succeed(maximum.value.fit) : maximum;
};
