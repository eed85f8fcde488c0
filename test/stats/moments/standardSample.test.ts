/** Worked by hand: 0, 0, 0, 4 has mean 1, deviations −1, −1, −1, 3, and moments m2 = 3, m3 = 6, m4 = 21. */
import { describe, expect, test } from 'vitest';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { jarqueBera } from '../../../src/stats/moments/jarqueBera.ts';
import {
  excessKurtosis,
  remarkableKurtosis,
  remarkableSkewness,
  shapeOf,
  skewness,
} from '../../../src/stats/moments/shape.ts';
import { standardise } from '../../../src/stats/moments/standardSample.ts';
import { summariseReturns } from '../../../src/stats/moments/summary.ts';

const values = [0, 0, 0, 4];
/** Digits of a double that a handful of operations leaves. */
const digits = 14;

test('a standardised sample has mean 0 and second moment 1, and says what it came from', () => {
  const sample = standardise(values);
  expect(sample.mean).toBe(1);
  expect(sample.deviation).toBeCloseTo(Math.sqrt(3), digits);
  expect(sample.excessKurtosis).toBeCloseTo(-2 / 3, digits);
  expect([...sample.values].map((value) => value * Math.sqrt(3))).toEqual([
    expect.closeTo(-1, digits),
    expect.closeTo(-1, digits),
    expect.closeTo(-1, digits),
    expect.closeTo(3, digits),
  ]);
});

test('skewness, excess kurtosis and the statistic made of both', () => {
  expect(skewness(values)).toBeCloseTo(2 / Math.sqrt(3), digits);
  expect(excessKurtosis(values)).toBeCloseTo(-2 / 3, digits);
  expect(shapeOf(values)).toEqual({ skewness: skewness(values), excessKurtosis: excessKurtosis(values) });
  const { statistic, p } = jarqueBera(values);
  expect(statistic).toBeCloseTo(26 / 27, digits);
  // with two degrees of freedom the upper tail of chi-square is exp(−x/2)
  expect(p).toBeCloseTo(Math.exp(-13 / 27), 12);
});

test('what is remarkable is twice the standard error under normality', () => {
  expect(remarkableKurtosis(96)).toBe(1);
  expect(remarkableSkewness(24)).toBe(1);
});

test('two values have a standard deviation, one has none', () => {
  expect(sampleStandardDeviation([1, 3])).toBeCloseTo(Math.SQRT2, digits);
  expect(() => sampleStandardDeviation([1])).toThrow('expected at least 2 values, got 1');
});

describe('the summary of returns', () => {
  test('by hand: 1, 2, 6', () => {
    const summary = summariseReturns([1, 2, 6], 2, 'A mean');
    if (!summary.ok) throw new Error(summary.problem.message);
    const { deviations, ...figures } = summary.value;
    expect([...deviations]).toEqual([-2, -1, 3]);
    expect(figures).toEqual({
      count: 3,
      mean: 3,
      sampleStandardDeviation: expect.closeTo(Math.sqrt(7), digits),
      standardError: expect.closeTo(Math.sqrt(7 / 3), digits),
      degreesOfFreedom: 2,
    });
  });

  test('refused with its figure where there are too few, or where nothing moves', () => {
    expect(summariseReturns([1], 2, 'A mean')).toMatchObject({
      ok: false,
      problem: { code: 'tooFewReturns', needs: 2 },
    });
    expect(summariseReturns([1, 1], 2, 'A mean')).toMatchObject({
      ok: false,
      problem: { code: 'priceDoesNotMove' },
    });
  });
});
