import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { jointLoss, quantileLoss } from '../../../src/stats/backtests/losses.ts';
import { relativeError } from '../../laws/relativeError.ts';

describe('quantile loss', () => {
  // By hand from (l − V)(a − 1{l < V}).
  test.each([
    [0.05, 0.03, 0.99, 0.0198],
    [0.01, 0.03, 0.99, 0.0002],
    [0.03, 0.03, 0.99, 0],
    [-0.02, -0.01, 0.95, 0.0005],
  ])('loss %d, VaR %d at %d: %d', (loss, valueAtRisk, fraction, expected) => {
    // One subtraction of decimals and one product: 1e-14 relative.
    expect(relativeError(quantileLoss(loss, valueAtRisk, fraction), expected)).toBeLessThan(1e-14);
  });

  test('the mean over a sample is lowest at its quantile', () => {
    // Losses 1 … 200 at 97.5%: minimisers are all values from l(195) to l(196).
    const losses = Array.from({ length: 200 }, (_, index) => index + 1);
    const mean = (valueAtRisk: number) =>
      losses.reduce((sum, loss) => sum + quantileLoss(loss, valueAtRisk, 0.975), 0) / 200;
    for (const other of [190, 193, 194.9, 196.1, 198, 210])
      expect(mean(other)).toBeGreaterThan(mean(195.5) + 1e-9);
  });
});

describe('joint loss', () => {
  test('by hand', () => {
    // 0.02/(0.01·0.04) + 0.75 + ln 0.04 − 1 with ln 0.04 = −3.2188758248682006.
    const beyond = 50 + 0.75 - 3.2188758248682006 - 1;
    expect(relativeError(jointLoss(0.05, 0.03, 0.04, 0.01), beyond)).toBeLessThan(1e-14);
    expect(relativeError(jointLoss(0.03, 0.03, 0.04, 0.01), beyond - 50)).toBeLessThan(1e-14);
  });

  test('differences do not depend on the unit of the loss', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.1, max: 0.2, noNaN: true }),
        fc.tuple(
          fc.double({ min: 0.001, max: 0.1, noNaN: true }),
          fc.double({ min: 1, max: 3, noNaN: true }),
        ),
        fc.tuple(
          fc.double({ min: 0.001, max: 0.1, noNaN: true }),
          fc.double({ min: 1, max: 3, noNaN: true }),
        ),
        (loss, [first, firstFactor], [second, secondFactor]) => {
          const difference = (unit: number) =>
            jointLoss(unit * loss, unit * first, unit * first * firstFactor, 0.025) -
            jointLoss(unit * loss, unit * second, unit * second * secondFactor, 0.025);
          // Losses of size up to 40·200; rounding of a few units in the last place of the larger one.
          expect(Math.abs(difference(100) - difference(1))).toBeLessThan(1e-10);
        },
      ),
      { seed: 2019, numRuns: 300 },
    );
  });

  test('an ES of 0 or less has no logarithm', () => {
    expect(() => jointLoss(0.1, 0, 0, 0.01)).toThrow('jointLoss: ES must be positive, got 0');
  });

  test('the mean over a sample is lowest at its VaR and ES', () => {
    // Losses 1 … 200 at 97.5%: VaR 195.5 lies between the minimisers, ES = (196 + … + 200)/5 = 198.
    const losses = Array.from({ length: 200 }, (_, index) => index + 1);
    const mean = (valueAtRisk: number, expectedShortfall: number) =>
      losses.reduce((sum, loss) => sum + jointLoss(loss, valueAtRisk, expectedShortfall, 0.025), 0) / 200;
    for (const [valueAtRisk, expectedShortfall] of [
      [195.5, 197],
      [195.5, 199],
      [193, 198],
      [198, 199],
    ] as const)
      expect(mean(valueAtRisk, expectedShortfall)).toBeGreaterThan(mean(195.5, 198));
  });
});
