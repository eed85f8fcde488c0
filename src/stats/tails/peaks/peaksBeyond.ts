import { tailFraction } from '../../../terms/level.ts';
import { type Result, succeed } from '../../../terms/result.ts';
import { chiSquareUpperQuantile } from '../../distributions/chiSquare.ts';
import { historicalBeyond } from '../historicalBeyond.ts';
import { beyondFigures } from '../internal/beyondFigures.ts';
import type { ProfileEnd } from '../internal/profileEnd.ts';
import { notFoundNote } from '../studentNu.ts';
import type { BeyondFigures, BeyondInput } from '../tailFigures.ts';
import { depthAt } from './internal/gpdTail.ts';
import { maximisePeaks } from './internal/peaksMaximum.ts';
import { logTailEnds } from './internal/peaksProfiles.ts';

const probabilityAt = (end: ProfileEnd, atBound: number): number | null => {
  if (end.kind === 'notFound') return null;
  return end.kind === 'bound' ? atBound : Math.exp(end.figure);
};

/**
 * How likely is a loss of at least so much, judged by the largest losses alone?
 * Convention: beyond the threshold of peaksTail ζ·(1 + xi·(x − u)/β)^(−1/xi), interval by the profile likelihood of that chance; at or
 * below the threshold the share of days, with its exact binomial interval.
 * Domain: as peaksTail, without a level; a finite threshold x.
 * Units: returns and threshold as decimal fractions (a loss of 4% is 0.04); probabilities in 0..1.
 * Edges: beyond the end of a short tail (xi < 0) the probability is 0 and the mean return time null; an upper end of 1e-12
 * says that no larger chance will do. A search that fails leaves its end null with a note. Returns are taken as independent.
 * Source: McNeil & Frey 2000, Journal of Empirical Finance 7, 271-300; profile likelihood: Venzon & Moolgavkar 1988,
 * Applied Statistics 37, 87-94.
 * Example: with u 2%, β 1%, xi 0.2 and ζ a tenth, a loss of at least 4% has probability 0.0186, once in 54 sessions.
 */
export const peaksBeyond = (input: BeyondInput): Result<BeyondFigures> => {
  const fitted = maximisePeaks(input.returns, null);
  if (!fitted.ok) return fitted;
  const maximum = fitted.value;
  const { peaks, gpd, beyond, count } = maximum;
  if (input.threshold <= peaks.threshold) {
    const empirical = historicalBeyond(input);
    return empirical.ok ? succeed({ ...empirical.value, model: 'peaks' }) : empirical;
  }
  const excess = input.threshold - peaks.threshold;
  const logTail = Math.log(beyond / count) - depthAt(gpd.fit.shape, excess / gpd.fit.scale);
  const reach = Math.sqrt(chiSquareUpperQuantile(tailFraction(input.confidence), 1));
  const ends = logTailEnds(maximum, reach, excess / gpd.unit, logTail);
  const interval = { lower: probabilityAt(ends.lower, 0), upper: probabilityAt(ends.upper, 1) };
  return succeed(
    beyondFigures('peaks', Math.exp(logTail), interval, 'profileLikelihood', notFoundNote('interval', ends)),
  );
};
