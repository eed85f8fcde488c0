import { describe, expect, test } from 'vitest';
import { filterByGarch, rebuildReturns } from '../../../src/stats/volatility/garchPath.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { simulateGarchReturns } from './simulateReturns.ts';

const process = { mu: 0.5, omega: 0.25, alpha: 0.5, beta: 0.25 };

describe('returns rebuilt from residuals', () => {
  test('picked in their own order the residuals give the returns back', () => {
    const returns = simulateGarchReturns(200, { mu: 0.1, omega: 0.05, alpha: 0.1, beta: 0.85 }, 5, 2);
    const fitted = { mu: 0.1, omega: 0.05, alpha: 0.1, beta: 0.85 };
    const { residuals } = filterByGarch(returns, fitted);
    const picks = Uint32Array.from(returns, (_, day) => day);
    const again = rebuildReturns(returns, fitted, residuals, picks);
    // A root, a division and a product each way.
    again.forEach((value, day) => {
      expect(Math.abs(value - (returns[day] ?? 0))).toBeLessThan(1e-13);
    });
  });

  test('by hand: the variance of each day follows from the day rebuilt before it', () => {
    // Presample variance ((1.5 − 0.5)² + (−0.5 − 0.5)²)/2 = 1. Day 1: h = 0.25 + 0.5 + 0.25 = 1, r = 0.5 + 1·2 = 2.5.
    // Day 2: h = 0.25 + 0.5·4 + 0.25·1 = 2.5, r = 0.5 − √2.5. Day 3: h = 0.25 + 0.5·2.5 + 0.25·2.5 = 2.125, r = 0.5 + 2·√2.125.
    const rebuilt = rebuildReturns(
      Float64Array.of(1.5, -0.5),
      process,
      Float64Array.of(-1, 2),
      Uint32Array.of(1, 0, 1),
    );
    expect(rebuilt).toHaveLength(3);
    [2.5, 0.5 - Math.sqrt(2.5), 0.5 + 2 * Math.sqrt(2.125)].forEach((expected, day) => {
      expect(relativeError(rebuilt[day] ?? Number.NaN, expected)).toBeLessThan(1e-15);
    });
  });
});
