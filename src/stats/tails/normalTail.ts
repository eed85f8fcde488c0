import { halfTailFraction, levelText, tailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { noncentralTQuantile } from '../distributions/noncentralT.ts';
import { normalDensity, normalQuantile } from '../distributions/normal.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { normalEsPivots } from './internal/normalEsPivots.ts';
import { parametricReplicates } from './internal/parametricReplicates.ts';
import type { Interval, TailFigures, TailInput, TailNote } from './tailFigures.ts';

export type NormalTailParameters = { readonly mean: number; readonly sampleStandardDeviation: number };

export type NormalTailFigures = TailFigures<'normal', NormalTailParameters>;

/** √n·(VaR − estimate of −mean)/s follows the noncentral t with n − 1 degrees of freedom and noncentrality z·√n. */
const varIntervalOf = (summary: ReturnSummary, score: number, beyond: number): Interval => {
  const { mean, standardError, degreesOfFreedom, count } = summary;
  const noncentrality = score * Math.sqrt(count);
  const lower = noncentralTQuantile(beyond, degreesOfFreedom, noncentrality);
  const upper = -noncentralTQuantile(beyond, degreesOfFreedom, -noncentrality);
  return { lower: -mean + standardError * lower, upper: -mean + standardError * upper };
};

type EsInterval = { readonly interval: Interval | null; readonly notes: readonly TailNote[] };

const esIntervalOf = (summary: ReturnSummary, multiplier: number, input: TailInput): EsInterval => {
  const { confidence, streams, replicates = parametricReplicates } = input;
  const pivots = normalEsPivots(summary.count, multiplier, confidence, streams, replicates);
  if (pivots === null) {
    const text = `A confidence of ${levelText(confidence)} is beyond what the resamples can reach. Ask for a lower one.`;
    return {
      interval: null,
      notes: [{ figure: 'esInterval', code: 'levelBeyondResamples', text, needs: null }],
    };
  }
  const end = (pivot: number) => -summary.mean + summary.sampleStandardDeviation * (multiplier - pivot);
  return { interval: { lower: end(pivots.upper), upper: end(pivots.lower) }, notes: [] };
};

/**
 * How large is the loss that one day in so many exceeds, and the mean loss beyond it, if returns follow the bell curve?
 * Convention: VaR = −mean + s·z and ES = −mean + s·φ(z)/(1−a), s the sample standard deviation (n − 1). The VaR interval is
 * exact for normal returns, by the noncentral t. The ES interval is a parametric bootstrap, B = 999: ends at the order
 * statistics of (ES* − ES)/s* over normal samples of the same count, so that its width follows the uncertainty of s.
 * Domain: at least 20 finite returns that differ.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out.
 * Edges: a confidence that 999 resamples cannot reach leaves the ES interval null with a note.
 * Source: noncentral t for a normal quantile: Johnson & Welch 1940, Biometrika 31, 362-389; bootstrap-t: Davison & Hinkley
 * 1997, Bootstrap Methods and their Application, section 5.2.
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
  const shortfall = esIntervalOf(summary, multiplier, input);
  return succeed({
    model: 'normal',
    target: 'unconditional',
    var: -mean + sampleStandardDeviation * score,
    varInterval: varIntervalOf(summary, score, halfTailFraction(input.confidence)),
    varIntervalMethod: 'noncentralT',
    varAttainedLevel: null,
    es: -mean + sampleStandardDeviation * multiplier,
    esInterval: shortfall.interval,
    esIntervalMethod: shortfall.interval === null ? null : 'parametricBootstrap',
    parameters: { mean, sampleStandardDeviation },
    notes: shortfall.notes,
  });
};
