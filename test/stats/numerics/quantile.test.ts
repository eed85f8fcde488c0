import { describe, expect, it } from 'vitest';
import { ascending, orderStatistic, quantileType7 } from '../../../src/stats/numerics/quantile.ts';

describe('order statistics', () => {
  const values = [9, -3, 5];

  it('sort a copy by value', () => {
    expect([...ascending([10, 9, 100])]).toEqual([9, 10, 100]);
    ascending(values);
    expect(values).toEqual([9, -3, 5]);
  });

  it('count ranks from 1', () => {
    const sorted = ascending(values);
    expect([1, 2, 3].map((rank) => orderStatistic(sorted, rank))).toEqual([-3, 5, 9]);
    for (const rank of [0, 4, 1.5]) expect(() => orderStatistic(sorted, rank)).toThrow(/^orderStatistic/);
  });
});

describe('quantileType7', () => {
  it('interpolates at 1 + (n − 1)p', () => {
    // by hand from the definition, Hyndman & Fan 1996; position 1 + 3·0.1 = 1.3 and so on
    const sorted = [1, 2, 4, 8];
    expect(quantileType7(sorted, 0)).toBe(1);
    expect(quantileType7(sorted, 0.1)).toBeCloseTo(1.3, 14);
    expect(quantileType7(sorted, 0.5)).toBe(3);
    expect(quantileType7(sorted, 0.9)).toBeCloseTo(6.8, 14);
    expect(quantileType7(sorted, 1)).toBe(8);
    expect(quantileType7([7], 0.3)).toBe(7);
  });

  it('throws outside its domain', () => {
    expect(() => quantileType7([], 0.5)).toThrow(RangeError);
    for (const p of [-0.1, 1.1, Number.NaN]) expect(() => quantileType7([1], p)).toThrow(/^quantileType7/);
  });
});
