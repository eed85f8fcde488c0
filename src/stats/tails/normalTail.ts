import { halfTailFraction, tailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { noncentralTQuantile } from '../distributions/noncentralT.ts';
import { normalDensity, normalQuantile } from '../distributions/normal.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { Interval, TailFigures, TailInput } from './tailFigures.ts';

export type NormalTailParameters = { readonly mean: number; readonly sampleStandardDeviation: number };

export type NormalTailFigures = TailFigures<'normal', NormalTailParameters>;

/**
 * Of a figure −mu + k·sigma: √n·(figure + mean)/s follows the noncentral t with n − 1 degrees of freedom and noncentrality k·√n.
 */
const exactInterval = (summary: ReturnSummary, multiplier: number, beyond: number): Interval => {
  const { mean, standardError, degreesOfFreedom, count } = summary;
  const noncentrality = multiplier * Math.sqrt(count);
  const lower = noncentralTQuantile(beyond, degreesOfFreedom, noncentrality);
  const upper = -noncentralTQuantile(beyond, degreesOfFreedom, -noncentrality);
  return { lower: -mean + standardError * lower, upper: -mean + standardError * upper };
};

/**
 * How large is the loss that one day in so many exceeds, and the mean loss beyond it, if returns follow the bell curve?
 * Convention: VaR = −mean + s·z and ES = −mean + s·φ(z)/(1−a), s the sample standard deviation (n − 1). Each is the mean and a
 * fixed number of deviations, so both intervals are exact for normal returns, by the noncentral t.
 * Domain: at least 20 finite returns that differ.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out.
 * Edges: a mean of more deviations than the level has makes the figures negative: gains.
 * Source: noncentral t for a normal quantile: Johnson & Welch 1940, Biometrika 31, 362-389; ES is the quantile of another order.
 * Example: with mean 0 and s 0.0126, VaR at 99% is 0.0294 and ES 0.0337.
 */
export const normalTail = (input: TailInput): Result<NormalTailFigures> => {
  const summarised = summariseReturns(input.returns, leastCounts.normalTail, 'A normal tail figure');
  if (!summarised.ok) return summarised;
  const summary = summarised.value;
  const { mean, sampleStandardDeviation } = summary;
  const tail = tailFraction(input.tailLevel);
  const score = -normalQuantile(tail);
  const multiplier = normalDensity(score) / tail;
  const beyond = halfTailFraction(input.confidence);
  return succeed({
    model: 'normal',
    target: 'unconditional',
    var: -mean + sampleStandardDeviation * score,
    varInterval: exactInterval(summary, score, beyond),
    varIntervalMethod: 'noncentralT',
    varAttainedLevel: null,
    es: -mean + sampleStandardDeviation * multiplier,
    esInterval: exactInterval(summary, multiplier, beyond),
    esIntervalMethod: 'noncentralT',
    parameters: { mean, sampleStandardDeviation },
    notes: [],
  });
};
