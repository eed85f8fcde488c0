import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { historicalTail } from '../../../../src/stats/tails/historicalTail.ts';
import { horizonTail } from '../../../../src/stats/tails/horizon/horizonTail.ts';
import { accepted } from '../../../laws/outcomes.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { level } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';
import { simulateGarchReturns } from '../../volatility/simulateReturns.ts';

const runs = { seed: 20261127, numRuns: 4 } as const;
const process = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;
const samples = fc.nat(10_000).map((replicate) => simulateGarchReturns(250, process, 5, replicate));

/** Without its interval, which a confidence of 99.9% is out of reach of. */
const over = (returns: Float64Array, horizonDays: number, tailLevel: string) => {
  const question = {
    returns,
    tailLevel: level(tailLevel),
    confidence: level('0.999'),
    streams: testStreams(71),
    replicates: 39,
  };
  const oneDay = accepted(historicalTail(question));
  return accepted(horizonTail(oneDay, { ...question, horizonDays, returnType: 'log', position: 'long' }));
};

describe('laws of a simulated horizon', () => {
  test('a higher level gives larger figures, and ES is not below VaR', () => {
    fc.assert(
      fc.property(samples, fc.integer({ min: 1, max: 20 }), (returns, days) => {
        const figures = over(returns, days, '0.95');
        const higher = over(returns, days, '0.99');
        expect(figures.es).toBeGreaterThanOrEqual(figures.var);
        expect(higher.var).toBeGreaterThan(figures.var);
        expect(higher.es).toBeGreaterThan(figures.es ?? 0);
      }),
      runs,
    );
  });

  test('log losses scale with the returns', () => {
    fc.assert(
      fc.property(samples, fc.constantFrom(0.5, 4), (returns, factor) => {
        const figures = over(returns, 5, '0.99');
        const scaled = over(
          returns.map((value) => factor * value),
          5,
          '0.99',
        );
        // The factors are powers of two, so that only the order of sums could differ, and it does not.
        expect(relativeError(scaled.var, factor * figures.var)).toBeLessThan(1e-14);
        expect(relativeError(scaled.es ?? 0, factor * (figures.es ?? 0))).toBeLessThan(1e-14);
      }),
      runs,
    );
  });
});
