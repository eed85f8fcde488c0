import { halfTailFraction, type Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { normalQuantile } from '../distributions/normal.ts';
import { centre } from '../moments/centre.ts';
import { summariseReturns } from '../moments/summary.ts';
import { sumOfTerms } from '../moments/sumOfTerms.ts';
import { ascending } from '../numerics/quantile.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { DeviationEnds } from './deviationEnds.ts';

export type BonettInterval = DeviationEnds & {
  /** Not the excess: 3 for the bell curve. */
  readonly kurtosis: number;
  readonly trimmedMean: number;
};

/** The mean without the ⌊n·p⌋ smallest and the ⌊n·p⌋ largest values, p = 1/(2·√(n − 4)). */
const trimmedMeanOf = (values: ArrayLike<number>): number => {
  const count = values.length;
  const trimmed = Math.floor(count / (2 * Math.sqrt(count - 4)));
  return centre(ascending(values).subarray(trimmed, count - trimmed)).mean;
};

/** n·Σ(x − trimmed mean)⁴ / (Σ(x − mean)²)². */
const kurtosisAround = (deviations: Float64Array, trimmedDeviation: number): number => {
  const count = deviations.length;
  const fourth = sumOfTerms(0, count, (index) => ((deviations[index] as number) - trimmedDeviation) ** 4);
  const squares = sumOfTerms(0, count, (index) => (deviations[index] as number) ** 2);
  return (count * fourth) / (squares * squares);
};

/**
 * Where can the true standard deviation lie, when tails are fatter than the bell curve's?
 * Convention: √(c·s²·exp(∓z·se)), c = n/(n − z), se = c·√((γ − (n − 3)/n)/(n − 1)), s with divisor n − 1, γ the kurtosis
 * around a trimmed mean with ⌊n/(2·√(n − 4))⌋ values off each end; two-sided.
 * Domain: at least 10 finite returns that move; refused otherwise. For independent returns.
 * Units: those of the returns, per period.
 * Edges: too narrow when volatility clusters; see blockDeviationInterval.
 * Source: Bonett 2006, Computational Statistics & Data Analysis 50(3), 775-782.
 * Example: bonettInterval(returns, 95%) is wider than chiSquareInterval where the tails are fat.
 */
export const bonettInterval = (returns: ArrayLike<number>, level: Level): Result<BonettInterval> => {
  const summary = summariseReturns(
    returns,
    leastCounts.bonett,
    'An interval for the standard deviation that allows for fat tails',
  );
  if (!summary.ok) return summary;
  const { count, mean, deviations, sampleStandardDeviation } = summary.value;
  const z = -normalQuantile(halfTailFraction(level));
  const trimmedMean = trimmedMeanOf(returns);
  const kurtosis = kurtosisAround(deviations, trimmedMean - mean);
  const correction = count / (count - z);
  const standardError = correction * Math.sqrt((kurtosis - (count - 3) / count) / (count - 1));
  const end = (direction: -1 | 1) =>
    Math.sqrt(correction) * sampleStandardDeviation * Math.exp((direction * z * standardError) / 2);
  return succeed({ lower: end(-1), upper: end(1), kurtosis, trimmedMean });
};
