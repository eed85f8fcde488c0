import { expect, test } from 'vitest';
import { sumOfLogarithms } from '../../../src/stats/numerics/sumOfLogarithms.ts';

test.each([0, 1, 7, 8, 9, 100])('of %i factors is the logarithm of their product', (count) => {
  // 2^k has the logarithm k·ln 2; alternating powers keep every product near 1. A few units in the last place of ln 2·50.
  const values = Float64Array.from({ length: count + 1 }, (_, index) => 2 ** ((index % 3) - 1));
  const power = values.reduce((sum, _, index) => sum + (index === 0 ? 0 : (index % 3) - 1), 0);
  expect(sumOfLogarithms(values, 1)).toBeCloseTo(power * Math.LN2, 13);
});

test('of factors up to 1e38 and down to 1e-38 is finite, and beyond it says so', () => {
  // By hand: sixteen times 38·ln 10, to a rounding or two.
  expect(sumOfLogarithms(new Float64Array(16).fill(1e38), 0)).toBeCloseTo(16 * 38 * Math.LN10, 10);
  expect(sumOfLogarithms(new Float64Array(16).fill(1e-38), 0)).toBeCloseTo(-16 * 38 * Math.LN10, 10);
  expect(sumOfLogarithms(new Float64Array(16).fill(1e200), 0)).toBe(Number.POSITIVE_INFINITY);
});
