import { tailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { chiSquareUpperQuantile } from '../distributions/chiSquare.ts';
import { quantileMultiplier, shortfallMultiplier } from '../losses/studentMultiplier.ts';
import type { ProfileEnd } from './internal/profileEnd.ts';
import { esEnds, inverseNuEnds, varEnds } from './internal/studentProfiles.ts';
import { maximiseStudent, type StudentMaximum, type StudentParameters } from './studentFit.ts';
import { fitNotes, lowestNu, notFoundNote, nuIntervalOf } from './studentNu.ts';
import type { Interval, TailFigures, TailInput, TailNote } from './tailFigures.ts';

export type StudentTailParameters = StudentParameters & {
  /** Profile-likelihood interval of nu; its upper end is Infinity where the normal limit lies inside. */
  readonly nuInterval: Interval;
  readonly normalLimit: boolean;
  readonly logLikelihood: number;
};

export type StudentTailFigures = TailFigures<'student', StudentTailParameters>;

type EsFigures = {
  readonly es: number | null;
  readonly esInterval: Interval | null;
  readonly notes: readonly TailNote[];
};

const noMean: EsFigures = {
  es: null,
  esInterval: null,
  notes: [
    {
      figure: 'es',
      code: 'meanNotFinite',
      text: 'nu is at or below 1: the fitted tail is so heavy that the mean loss beyond VaR does not exist. Read VaR alone.',
      needs: null,
    },
  ],
};

const notBoundedAbove: TailNote = {
  figure: 'esInterval',
  code: 'upperEndUnbounded',
  text: 'The interval of nu reaches 1, where ES does not exist: nothing bounds ES from above. Ask for a longer window.',
  needs: null,
};

/** A figure in standard units as a loss in the units of the returns. */
const lossOf = ({ sample }: StudentMaximum, figure: number): number =>
  sample.deviation * figure - sample.mean;

const endOf = (maximum: StudentMaximum, end: ProfileEnd): number | null =>
  end.kind === 'end' ? lossOf(maximum, end.figure) : null;

const figureOf = ({ fit }: StudentMaximum, multiplier: number): number =>
  fit.scale * multiplier - fit.location;

const esFigures = (maximum: StudentMaximum, reach: number, tail: number, bounded: boolean): EsFigures => {
  if (maximum.fit.nu <= 1) return noMean;
  const ends = esEnds(maximum, reach, tail, bounded);
  return {
    es: figureOf(maximum, shortfallMultiplier(tail, maximum.fit.nu)),
    esInterval: { lower: endOf(maximum, ends.lower), upper: endOf(maximum, ends.upper) },
    notes: [...notFoundNote('esInterval', ends), ...(bounded ? [] : [notBoundedAbove])],
  };
};

/**
 * How large is the loss that one day in so many exceeds, and the mean loss beyond it, if returns follow a Student t?
 * Convention: with the maximum-likelihood location m, scale sc and nu, VaR = sc·b − m, b the quantile of t(nu) that the
 * tail lies above, and ES = sc·f(b)/(1−a)·(nu+b²)/(nu−1) − m. Intervals of nu, VaR and ES by profile likelihood: all values
 * at which twice the loss of log-likelihood, everything else chosen best, stays within the chi-square(1) quantile.
 * Domain: as fitStudent; `near` is passed on to it. Refusals are those of the fit.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out; nu a number.
 * Edges: ES is null at nu ≤ 1, and has no upper end where the interval of nu reaches 1. A search for an end that fails
 * leaves that end null with a note. Returns are taken as independent draws of one distribution.
 * Source: ES of t(nu): McNeil, Frey & Embrechts 2005, Quantitative Risk Management, example 2.19; profile likelihood:
 * Venzon & Moolgavkar 1988, Applied Statistics 37, 87-94.
 * Example: at 99% a t(4) fit with scale 0.01 around 0 has VaR 0.0375 and ES 0.0522.
 */
export const studentTail = (input: TailInput, near?: StudentParameters): Result<StudentTailFigures> => {
  const fitted = maximiseStudent(input.returns, near);
  if (!fitted.ok) return fitted;
  const maximum = fitted.value;
  const { fit } = maximum;
  const tail = tailFraction(input.tailLevel);
  const reach = Math.sqrt(chiSquareUpperQuantile(tailFraction(input.confidence), 1));
  const inverseNu = inverseNuEnds(maximum, reach);
  const nuInterval = nuIntervalOf(inverseNu);
  const varProfile = varEnds(maximum, reach, tail);
  const shortfall = esFigures(maximum, reach, tail, (nuInterval.lower ?? lowestNu) > 1);
  return succeed({
    model: 'student',
    target: 'unconditional',
    var: figureOf(maximum, quantileMultiplier(tail, fit.nu)),
    varInterval: { lower: endOf(maximum, varProfile.lower), upper: endOf(maximum, varProfile.upper) },
    varIntervalMethod: 'profileLikelihood',
    varAttainedLevel: null,
    es: shortfall.es,
    esInterval: shortfall.esInterval,
    esIntervalMethod: shortfall.esInterval === null ? null : 'profileLikelihood',
    parameters: {
      location: fit.location,
      scale: fit.scale,
      nu: fit.nu,
      nuInterval,
      normalLimit: fit.normalLimit,
      logLikelihood: fit.logLikelihood,
    },
    notes: [...fitNotes(fit, inverseNu), ...notFoundNote('varInterval', varProfile), ...shortfall.notes],
  });
};
