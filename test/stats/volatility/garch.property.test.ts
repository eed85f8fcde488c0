import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitGarch, type GarchFit } from '../../../src/stats/volatility/garch.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { simulateGarchReturns } from './simulateReturns.ts';

const runs = { seed: 20261127, numRuns: 12 } as const;
const process = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;

const fitOf = (returns: Float64Array): GarchFit | null => {
  const fit = fitGarch(returns);
  return fit.ok ? fit.value : null;
};

describe('laws of the GARCH fit', () => {
  test('a change of unit changes mu and omega and nothing else', () => {
    fc.assert(
      fc.property(fc.nat(1000), fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (replicate, unit) => {
        const returns = simulateGarchReturns(500, process, 5, replicate);
        const plain = fitOf(returns);
        const scaled = fitOf(returns.map((value) => value * unit));
        fc.pre(plain?.clustering === true);
        // Two climbs to within 1e-8 standard errors; the errors are below the values of α, β and ω taken together.
        expect(scaled?.clustering).toBe(true);
        expect(relativeError(scaled?.alpha ?? 0, plain?.alpha ?? 1)).toBeLessThan(1e-6);
        expect(relativeError(scaled?.beta ?? 0, plain?.beta ?? 1)).toBeLessThan(1e-6);
        expect(relativeError(scaled?.nu ?? 0, plain?.nu ?? 1)).toBeLessThan(1e-6);
        expect(relativeError(scaled?.omega ?? 0, (plain?.omega ?? 1) * unit * unit)).toBeLessThan(1e-6);
      }),
      runs,
    );
  });

  test('returns moved by a constant move mu alone', () => {
    fc.assert(
      fc.property(fc.nat(1000), fc.double({ min: -0.05, max: 0.05, noNaN: true }), (replicate, shift) => {
        const returns = simulateGarchReturns(500, process, 5, replicate);
        const plain = fitOf(returns);
        const moved = fitOf(returns.map((value) => value + shift));
        fc.pre(plain?.clustering === true);
        expect(Math.abs((moved?.mu ?? 0) - (plain?.mu ?? 0) - shift)).toBeLessThan(1e-9);
        expect(relativeError(moved?.alpha ?? 0, plain?.alpha ?? 1)).toBeLessThan(1e-6);
      }),
      runs,
    );
  });
});
