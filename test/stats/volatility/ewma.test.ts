import { describe, expect, test } from 'vitest';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { filterByEwma } from '../../../src/stats/volatility/ewma.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { fixtureJson, indexCloses } from '../readFixture.ts';

type IndexCase = {
  readonly ticker: string;
  readonly window: number | 'all';
  readonly ewma_094_next_day_volatility?: { readonly seed_mean_square_of_window: number };
};

const cases = fixtureJson<{ cases: IndexCase[] }>('eu-indices/reference.json').cases.flatMap(
  ({ ticker, window, ewma_094_next_day_volatility: ewma }) =>
    ewma === undefined ? [] : [{ ticker, window, expected: ewma.seed_mean_square_of_window }],
);

describe('exponentially weighted volatility', () => {
  test('the reference has both indices over five windows', () => expect(cases).toHaveLength(10));

  test.each(cases)('$ticker over $window returns', ({ ticker, window, expected }) => {
    const all = simpleReturns(indexCloses(ticker));
    const returns = window === 'all' ? all : all.slice(-window);
    // Positive terms only: rounding does not grow with the count.
    expect(relativeError(Math.sqrt(filterByEwma(returns).nextVariance), expected)).toBeLessThan(1e-13);
  });

  test('two steps by hand', () => {
    const { residuals, nextVariance, mu } = filterByEwma(Float64Array.of(0.03, -0.01));
    // σ²_1 = (9 + 1)/2·1e-4 = 5e-4, σ²_2 = 0.94·5e-4 + 0.06·9e-4 = 5.24e-4, σ²_3 = 0.94·5.24e-4 + 0.06·1e-4.
    expect(relativeError(residuals[0] as number, 0.03 / Math.sqrt(5e-4))).toBeLessThan(1e-14);
    expect(relativeError(residuals[1] as number, -0.01 / Math.sqrt(5.24e-4))).toBeLessThan(1e-14);
    expect(relativeError(nextVariance, 0.94 * 5.24e-4 + 0.06e-4)).toBeLessThan(1e-14);
    expect(mu).toBe(0);
  });
});
