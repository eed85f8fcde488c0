import { expect, it } from 'vitest';
import { fillByDifferences, type SmoothValue } from '../../../src/stats/numerics/smoothValue.ts';

/** 3 + 2x + 5x² + x³ of x = 1/nu: slope 2 + 10x + 3x² and curvature 10 + 6x, by hand. */
const cubic = (nu: number): number => 3 + 2 / nu + 5 / nu ** 2 + 1 / nu ** 3;

const at = (x: number): SmoothValue => {
  const into = { value: 0, slope: 0, curvature: 0 };
  fillByDifferences(cubic, x, into);
  return into;
};

it.each([0, 1e-4, 0.05, 0.25, 0.4])('differentiates a cubic in 1/nu at %s', (x) => {
  const { value, slope, curvature } = at(x);
  const expected = 3 + 2 * x + 5 * x ** 2 + x ** 3;
  expect(value).toBeCloseTo(expected, 13);
  // the third derivative, 6, adds h² to a central slope, −2h² to a one-sided one and 6h to a one-sided curvature, h = 1e-4;
  // rounding of values near 3 adds 1e-11 and 1e-7
  expect(Math.abs(slope - (2 + 10 * x + 3 * x ** 2))).toBeLessThan(1e-7);
  expect(Math.abs(curvature - (10 + 6 * x))).toBeLessThan(8e-4);
});

it('asks for the normal limit itself next to it, and for both sides elsewhere', () => {
  const asked: number[] = [];
  const noted = (nu: number): number => {
    asked.push(1 / nu);
    return cubic(nu);
  };
  fillByDifferences(noted, 0, { value: 0, slope: 0, curvature: 0 });
  expect(asked[0]).toBe(0);
  expect(asked[1]).toBeCloseTo(1e-4, 15);
  expect(asked[2]).toBeCloseTo(2e-4, 15);
  asked.length = 0;
  // exactly one step away is not next to the limit any more: 0, one step, two steps around it
  const into = { value: 0, slope: 0, curvature: 0 };
  fillByDifferences(noted, 1e-4, into);
  expect(asked[1]).toBeCloseTo(1e-4, 15);
  expect(into.value).toBe(cubic(1e4));
});
