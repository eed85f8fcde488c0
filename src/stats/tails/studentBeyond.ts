import { tailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { chiSquareUpperQuantile } from '../distributions/chiSquare.ts';
import { studentTUpperTail } from '../distributions/studentT.ts';
import { beyondFigures } from './internal/beyondFigures.ts';
import type { ProfileEnd } from './internal/profileEnd.ts';
import { logOddsEnds } from './internal/studentProfiles.ts';
import { maximiseStudent, type StudentParameters } from './studentFit.ts';
import { notFoundNote } from './studentNu.ts';
import type { BeyondFigures, BeyondInput } from './tailFigures.ts';

/** A probability from the log-odds where its search ended; `atBound` where it ran to the edge of what a double holds. */
const probabilityAt = (end: ProfileEnd, atBound: number): number | null => {
  if (end.kind === 'notFound') return null;
  return end.kind === 'bound' ? atBound : 1 / (1 + Math.exp(-end.figure));
};

/**
 * How likely is a loss of at least so much if returns follow a Student t?
 * Convention: the upper tail of the fitted t(nu) at (threshold + location)/scale. Interval by the profile likelihood of
 * the probability: all values at which twice the loss of log-likelihood, everything else chosen best, stays within the
 * chi-square(1) quantile.
 * Domain: as fitStudent; a finite threshold; `near` is passed on to the fit.
 * Units: returns and threshold as decimal fractions (a loss of 4% is 0.04); probabilities in 0..1.
 * Edges: ends beyond what a double holds are 0 or 1; a search that fails leaves its end null with a note.
 * Source: profile likelihood: Venzon & Moolgavkar 1988, Applied Statistics 37, 87-94.
 * Example: a t(4) with scale 0.01 around 0 has a loss of at least 4% with probability 0.0081, once in 124 sessions.
 */
export const studentBeyond = (input: BeyondInput, near?: StudentParameters): Result<BeyondFigures> => {
  const fitted = maximiseStudent(input.returns, near);
  if (!fitted.ok) return fitted;
  const maximum = fitted.value;
  const { fit, sample } = maximum;
  const probability = studentTUpperTail((input.threshold + fit.location) / fit.scale, fit.nu);
  const reach = Math.sqrt(chiSquareUpperQuantile(tailFraction(input.confidence), 1));
  const threshold = (input.threshold + sample.mean) / sample.deviation;
  const ends = logOddsEnds(maximum, reach, threshold, probability);
  const interval = { lower: probabilityAt(ends.lower, 0), upper: probabilityAt(ends.upper, 1) };
  return succeed(
    beyondFigures('student', probability, interval, 'profileLikelihood', notFoundNote('interval', ends)),
  );
};
