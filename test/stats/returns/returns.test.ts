import { describe, expect, test } from 'vitest';
import { logReturns, simpleReturns } from '../../../src/stats/returns/returns.ts';
import { relativeError } from '../../laws/relativeError.ts';

describe('simpleReturns', () => {
  test('is the change over the earlier close', () => {
    // By hand: 101/100 − 1, 98.98/101 − 1. Correctly rounded quotients of exact differences, so equal to the last bit.
    expect([...simpleReturns([100, 101, 75.75])]).toEqual([0.01, -0.25]);
  });

  test('keeps the digits of a small change', () => {
    // By hand: 1/2^40 is exact in a double, and so is 1 + 2^-40. P[t]/P[t-1] − 1 would agree only by luck here.
    expect(simpleReturns([1, 1 + 2 ** -40])[0]).toBe(2 ** -40);
  });

  test('gives one return fewer than closes and leaves the closes alone', () => {
    const closes = Object.freeze([10, 20, 10]);
    expect([...simpleReturns(closes)]).toEqual([1, -0.5]);
  });
});

describe('logReturns', () => {
  test('agrees with mpmath for small and large changes', () => {
    // mpmath 1.3.0 at 30 digits, rounded to doubles: log(101/100), log(3), log(1/4). Tolerance 2 ulp: one rounding of the ratio, one of the logarithm.
    const [small, up, down] = logReturns([100, 101, 303, 75.75]);
    expect(relativeError(small ?? 0, 0.009950330853168083)).toBeLessThan(4.5e-16);
    expect(relativeError(up ?? 0, 1.0986122886681098)).toBeLessThan(4.5e-16);
    expect(relativeError(down ?? 0, -1.3862943611198906)).toBeLessThan(4.5e-16);
  });

  test('adds up to the logarithm of the whole change', () => {
    const closes = [88.1, 90.4, 89.2, 91.7, 86.3];
    const sum = logReturns(closes).reduce((total, value) => total + value, 0);
    // Five roundings of numbers near 0.05.
    expect(Math.abs(sum - Math.log(86.3 / 88.1))).toBeLessThan(1e-16);
  });
});

describe('closes that no feed may hand over', () => {
  test.each([[[100]], [[100, 0]], [[-1, 2]], [[100, Number.NaN]], [[Infinity, 1]]])('%j throws', (closes) => {
    expect(() => simpleReturns(closes)).toThrow(/^returns: expected/);
    expect(() => logReturns(closes)).toThrow(/^returns: expected/);
  });
});
