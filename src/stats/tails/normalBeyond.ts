import { halfTailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { noncentralityAt } from '../distributions/noncentralT.ts';
import { normalUpperTail } from '../distributions/normal.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { beyondFigures } from './internal/beyondFigures.ts';
import type { BeyondFigures, BeyondInput, Interval } from './tailFigures.ts';

/**
 * How likely is a loss of at least so much if returns follow the bell curve?
 * Convention: the upper tail of the normal distribution at (threshold + mean)/s, s the sample standard deviation (n − 1).
 * Interval exact for normal returns: √n·(threshold + mean)/s follows the noncentral t with n − 1 degrees of freedom, and
 * the ends are the tails at those noncentralities, over √n, under which what was seen is just not too unlikely.
 * Domain: at least 20 finite returns that differ; a finite threshold.
 * Units: returns and threshold as decimal fractions (a loss of 4% is 0.04); probabilities in 0..1.
 * Edges: a probability too small for a double is 0, and the mean return time is then null.
 * Source: noncentral t: Johnson & Welch 1940, Biometrika 31, 362-389.
 * Example: with mean 0 and s 1%, a loss of at least 3% has probability 0.00135, once in 741 sessions.
 */
export const normalBeyond = ({ returns, threshold, confidence }: BeyondInput): Result<BeyondFigures> => {
  const summarised = summariseReturns(returns, leastCounts.normalTail, 'A normal chance');
  if (!summarised.ok) return summarised;
  const { mean, sampleStandardDeviation, degreesOfFreedom, count } = summarised.value;
  const score = (threshold + mean) / sampleStandardDeviation;
  const statistic = score * Math.sqrt(count);
  const beyond = halfTailFraction(confidence);
  const largestScore = noncentralityAt(beyond, statistic, degreesOfFreedom) / Math.sqrt(count);
  const leastScore = -noncentralityAt(beyond, -statistic, degreesOfFreedom) / Math.sqrt(count);
  const interval: Interval = { lower: normalUpperTail(largestScore), upper: normalUpperTail(leastScore) };
  return succeed(beyondFigures('normal', normalUpperTail(score), interval, 'noncentralT', []));
};
