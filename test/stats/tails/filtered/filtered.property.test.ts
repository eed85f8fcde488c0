import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { filteredBeyond } from '../../../../src/stats/tails/filtered/filteredBeyond.ts';
import { type FilterOptions, filteredTail } from '../../../../src/stats/tails/filtered/filteredTail.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';
import { simulateGarchReturns } from '../../volatility/simulateReturns.ts';

const seed = 20261127;
const streams = testStreams(32);
const process = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;

/** Few resamples: these laws hold for any number of them. */
const figuresOf = (returns: Float64Array, tailLevel: string, confidence: string, options: FilterOptions) => {
  const outcome = filteredTail(
    { returns, tailLevel: level(tailLevel), confidence: level(confidence), streams, replicates: 39 },
    options,
  );
  return outcome.ok ? outcome.value : null;
};

describe.each([
  ['ewma', 60, 300, 30],
  ['garch', 500, 600, 5],
] as const)('laws of the filtered figures, %s', (kind, least, most, numRuns) => {
  const runs = { seed, numRuns };
  const samples = fc
    .record({ replicate: fc.nat(100_000), count: fc.integer({ min: least, max: most }) })
    .map(({ replicate, count }) => simulateGarchReturns(count, process, 5, replicate));

  test('figures are finite, ES is not below VaR, a higher level gives larger ones', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        const figures = figuresOf(returns, '0.95', '0.95', { kind });
        const higher = figuresOf(returns, '0.98', '0.95', { kind });
        fc.pre(figures !== null && higher !== null);
        expect(Number.isFinite(figures.var)).toBe(true);
        expect(figures.es).toBeGreaterThanOrEqual(figures.var);
        expect(higher.var).toBeGreaterThanOrEqual(figures.var);
        expect(higher.es).toBeGreaterThanOrEqual(figures.es ?? 0);
      }),
      runs,
    );
  });

  test('a higher confidence gives a wider interval', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        const figures = figuresOf(returns, '0.95', '0.8', { kind })?.varInterval ?? null;
        const surer = figuresOf(returns, '0.95', '0.95', { kind })?.varInterval ?? null;
        fc.pre(figures !== null && surer !== null);
        expect(surer.lower).toBeLessThanOrEqual(figures.lower ?? 0);
        // No upper end is an upper end beyond all others.
        expect(surer.upper ?? Number.POSITIVE_INFINITY).toBeGreaterThanOrEqual(
          figures.upper ?? Number.POSITIVE_INFINITY,
        );
      }),
      runs,
    );
  });

  test('a change of unit changes every loss by it', () => {
    fc.assert(
      fc.property(samples, fc.constantFrom(0.01, 3, 100), (returns, unit) => {
        const figures = figuresOf(returns, '0.95', '0.95', { kind });
        const scaled = figuresOf(
          returns.map((value) => unit * value),
          '0.95',
          '0.95',
          { kind },
        );
        fc.pre(figures !== null);
        // Two climbs to within 1e-8 standard errors; resamples to within 1e-4, but by the same steps.
        expect(relativeError(scaled?.var ?? 0, unit * figures.var)).toBeLessThan(1e-6);
        expect(relativeError(scaled?.es ?? 0, unit * (figures.es ?? 0))).toBeLessThan(1e-6);
      }),
      runs,
    );
  });

  test('a larger loss is not more likely', () => {
    fc.assert(
      fc.property(samples, fc.double({ min: 0, max: 0.05, noNaN: true }), (returns, threshold) => {
        const chanceOf = (loss: number) => {
          const outcome = filteredBeyond(
            { returns, threshold: loss, confidence: level95, streams },
            { kind },
          );
          return outcome.ok ? outcome.value : null;
        };
        const chance = chanceOf(threshold);
        const rarer = chanceOf(threshold + 0.005);
        fc.pre(chance !== null && rarer !== null);
        expect(rarer.probability).toBeLessThanOrEqual(chance.probability);
        expect(chance.interval?.lower).toBeLessThanOrEqual(chance.probability);
        expect(chance.interval?.upper).toBeGreaterThanOrEqual(chance.probability);
      }),
      { seed, numRuns: 2 },
    );
  });
});
