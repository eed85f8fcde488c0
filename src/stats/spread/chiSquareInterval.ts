import { halfTailFraction, type Level } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { chiSquareQuantile, chiSquareUpperQuantile } from '../distributions/chiSquare.ts';
import { summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { DeviationEnds } from './deviationEnds.ts';

/**
 * Where can the true standard deviation lie, if returns follow the bell curve?
 * Convention: s·√((n − 1)/χ²) at both tails of the chi-square distribution with n − 1 degrees of freedom; two-sided.
 * Domain: at least 2 finite returns that move; refused otherwise. Exact for independent normal returns.
 * Units: those of the returns, per period.
 * Edges: much too narrow when tails are fat or volatility clusters; see bonettInterval and blockDeviationInterval.
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, section 7.2.3.1.
 * Example: chiSquareInterval(returns, 95%) of 60 returns reaches from 0.85 s to 1.22 s.
 */
export const chiSquareInterval = (returns: ArrayLike<number>, level: Level): Result<DeviationEnds> => {
  const summary = summariseReturns(returns, leastCounts.variance, 'An interval for the standard deviation');
  if (!summary.ok) return summary;
  const { sampleStandardDeviation, degreesOfFreedom } = summary.value;
  const beyond = halfTailFraction(level);
  const end = (chiSquare: number) => sampleStandardDeviation * Math.sqrt(degreesOfFreedom / chiSquare);
  return succeed({
    lower: end(chiSquareUpperQuantile(beyond, degreesOfFreedom)),
    upper: end(chiSquareQuantile(beyond, degreesOfFreedom)),
  });
};
