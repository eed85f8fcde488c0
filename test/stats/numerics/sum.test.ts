import fc from 'fast-check';
import { expect, it } from 'vitest';
import { compensatedSum } from '../../../src/stats/numerics/sum.ts';

it('keeps what plain addition loses', () => {
  // by hand
  expect(compensatedSum([1, 1e100, 1, -1e100])).toBe(2);
  expect(compensatedSum([])).toBe(0);
  expect(compensatedSum(new Float64Array([0.5]))).toBe(0.5);
  expect(compensatedSum([1e308, 1e308])).toBe(Number.POSITIVE_INFINITY);
});

it('adds tenths as well as one rounding allows', () => {
  // the sum of ten thousand doubles nearest 0.1 is 10,000 times that double; plain addition is off by 1.6e-10
  const tenths = new Array<number>(10_000).fill(0.1);
  expect(compensatedSum(tenths)).toBe(1000);
});

it('is exact on whole numbers in any order', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: -(2 ** 40), max: 2 ** 40 }), { maxLength: 50 }), (values) => {
      const exact = Number(values.reduce((sum, value) => sum + BigInt(value), 0n));
      expect(Math.abs(compensatedSum(values) - exact)).toBe(0);
      expect(Math.abs(compensatedSum([...values].reverse()) - exact)).toBe(0);
    }),
    { seed: 1974 },
  );
});
