import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { centralMoments } from '../../../src/stats/moments/centralMoments.ts';
import { centre } from '../../../src/stats/moments/centre.ts';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { jarqueBera } from '../../../src/stats/moments/jarqueBera.ts';
import { arithmeticMean } from '../../../src/stats/moments/mean.ts';
import {
  excessKurtosis,
  remarkableKurtosis,
  remarkableSkewness,
  shapeOf,
  skewness,
} from '../../../src/stats/moments/shape.ts';
import { relativeError } from '../../laws/relativeError.ts';

describe('by hand', () => {
  test('mean and deviation', () => {
    expect(arithmeticMean([1, 2, 6])).toBe(3);
    expect(arithmeticMean([7])).toBe(7);
    expect(sampleStandardDeviation([1, 2, 3])).toBe(1);
    expect(sampleStandardDeviation([0.1, 0.1, 0.1])).toBe(0);
  });

  test('moments around the mean with divisor n', () => {
    // Deviations −2, −1, 3: squares 14/3, cubes 18/3, fourth powers 98/3.
    const { mean, m2, m3, m4 } = centralMoments([1, 2, 6]);
    expect([mean, m3]).toEqual([3, 6]);
    // One rounding of a third.
    expect(relativeError(m2, 14 / 3)).toBeLessThan(2e-16);
    expect(relativeError(m4, 98 / 3)).toBeLessThan(2e-16);
  });

  test('shape', () => {
    // g1 = 6/(14/3)^1.5; g2 of two equally frequent values is −2; a few roundings each.
    expect(relativeError(skewness([1, 2, 6]), 6 / (14 / 3) ** 1.5)).toBeLessThan(1e-15);
    expect(excessKurtosis([-1, 1, -1, 1])).toBe(-2);
    expect(shapeOf([-1, 1, -1, 1])).toEqual({ skewness: 0, excessKurtosis: -2 });
  });

  test('Jarque-Bera', () => {
    // 4/6·(0 + 4/4) = 2/3; chi-square with two degrees of freedom has the upper tail exp(−x/2).
    const { statistic, p } = jarqueBera([-1, 1, -1, 1]);
    expect(relativeError(statistic, 2 / 3)).toBeLessThan(1e-15);
    expect(relativeError(p, Math.exp(-1 / 3))).toBeLessThan(1e-13);
  });

  test('what counts as remarkable', () => {
    expect([remarkableKurtosis(24), remarkableSkewness(96)]).toEqual([2, 0.5]);
  });
});

describe('what must not be lost', () => {
  test.each([
    // In doubles the sum of three tenths over three is 0.10000000000000002; the like holds for the other two.
    [0.1, 3],
    [0.01, 29],
    [0.013, 5],
  ])('%f, %i times, is its own mean without any deviation', (value, count) => {
    const { mean, deviations } = centre(new Array<number>(count).fill(value));
    expect(mean).toBe(value);
    expect([...deviations]).toEqual(new Array<number>(count).fill(0));
  });

  test('a large level does not swallow a small spread', () => {
    // 2^30 is exact, so the spread of the data read is exactly 1/8.
    const values = Array.from({ length: 1_000 }, (_, index) => 2 ** 30 + (index % 2) / 8);
    const exact = Math.sqrt((1_000 * (1 / 16) ** 2) / 999);
    expect(relativeError(sampleStandardDeviation(values), exact)).toBeLessThan(1e-15);
  });
});

describe('laws', () => {
  const values = fc.array(fc.integer({ min: -10_000, max: 10_000 }), { minLength: 4, maxLength: 60 });

  test('deviations sum to zero and moments match the deviation', () => {
    fc.assert(
      fc.property(values, (whole) => {
        const { deviations } = centre(whole);
        const sum = deviations.reduce((total, value) => total + value, 0);
        // Sixty additions of numbers up to 20,000.
        expect(Math.abs(sum)).toBeLessThan(1e-9);
        const { m2 } = centralMoments(whole);
        const s = sampleStandardDeviation(whole);
        expect(Math.abs(s * s * (whole.length - 1) - m2 * whole.length)).toBeLessThanOrEqual(
          1e-13 * m2 * whole.length,
        );
      }),
      { seed: 19_080_301, numRuns: 200 },
    );
  });
});

describe('misuse throws', () => {
  test.each([
    ['no value', () => arithmeticMean([]), /^centre: expected at least 1/],
    ['one value', () => sampleStandardDeviation([1]), /^sampleStandardDeviation: expected at least 2/],
    ['two values', () => skewness([1, 2]), /^skewness: expected at least 3 values, got 2/],
    ['three values', () => excessKurtosis([1, 2, 3]), /^excessKurtosis: expected at least 4/],
    ['equal values', () => shapeOf([1, 1, 1, 1]), /^shapeOf: expected values that differ/],
    ['equal values', () => jarqueBera([1, 1, 1, 1]), /values that differ/],
  ])('%s', (_, misuse, message) => {
    expect(misuse).toThrow(message);
  });
});
