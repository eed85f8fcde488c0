import { nextNormal } from '../../../random/draws.ts';
import type { NormalTailParameters } from '../../normalTail.ts';
import type { HorizonModel, PathSource } from './pathSource.ts';

const normal =
  (mean: number, deviation: number): PathSource =>
  (random, into) => {
    for (let day = 0; day < into.length; day += 1) into[day] = mean + deviation * nextNormal(random);
  };

/**
 * Normal days. A parameter draw puts chance variables for what is known of their distribution: σ = s·√((n−1)/χ²) and
 * mean − σ·z/√n, whose percentiles are the exact interval of a one-day VaR (generalised pivots: Weerahandi 1993).
 */
export const normalHorizon = (
  count: number,
  { mean, sampleStandardDeviation }: NormalTailParameters,
): HorizonModel => ({
  paths: normal(mean, sampleStandardDeviation),
  drift: mean,
  lossHasMean: true,
  redraw: (random) => {
    let squares = 0;
    for (let degree = 1; degree < count; degree += 1) squares += nextNormal(random) ** 2;
    const deviation = sampleStandardDeviation * Math.sqrt((count - 1) / squares);
    return normal(mean - (deviation * nextNormal(random)) / Math.sqrt(count), deviation);
  },
});
