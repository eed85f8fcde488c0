import { describe, expect, test } from 'vitest';
import { garchObjective } from '../../../../src/stats/volatility/internal/garchDerivatives.ts';
import {
  garchLogLikelihood,
  parameterCount,
} from '../../../../src/stats/volatility/internal/garchLikelihood.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { simulateGarchReturns } from '../simulateReturns.ts';

const returns = simulateGarchReturns(300, { mu: 0.1, omega: 0.05, alpha: 0.1, beta: 0.85 }, 5, 1);
const points = {
  'inside the range': [0.05, Math.log(0.08), 0.12, 0.8, 0.21],
  'near the normal limit': [0.3, Math.log(0.02), 0.05, 0.93, 1e-4],
  'just below where logarithms of products begin': [0.05, Math.log(0.08), 0.12, 0.8, 0.0099],
  'just above where logarithms of products begin': [0.05, Math.log(0.08), 0.12, 0.8, 0.0101],
  'without the variance of the day before': [-0.1, Math.log(0.6), 0.3, 0, 0.1],
  'near two degrees of freedom': [0.02, Math.log(0.1), 0.2, 0.6, 0.45],
} as const;

const differentiate = (point: Float64Array) => {
  const gradient = new Float64Array(parameterCount);
  const hessian = new Float64Array(parameterCount * parameterCount);
  const value = garchObjective(returns)(point, gradient, hessian);
  return { value, gradient, hessian };
};

/** Central difference with one step of Richardson's extrapolation: error of fourth order in the step. */
const slopeOf = (f: (shift: number) => number, step: number): number => {
  const central = (width: number) => (f(width) - f(-width)) / (2 * width);
  return (4 * central(step / 2) - central(step)) / 3;
};

const moved = (point: Float64Array, index: number, shift: number): Float64Array => {
  const result = point.slice();
  result[index] = (result[index] as number) + shift;
  return result;
};

describe.each(Object.entries(points))('derivatives of the GARCH likelihood %s', (_, values) => {
  const point = Float64Array.from(values);
  const { value, gradient, hessian } = differentiate(point);
  const indices = Array.from({ length: parameterCount }, (__, index) => index);

  test('the value is the one of the likelihood alone', () => {
    // Logarithms of products here, of single factors there: roundings of a sum of 300.
    expect(relativeError(value, garchLogLikelihood(returns, point))).toBeLessThan(1e-13);
  });

  // Steps of 2e-5 leave a truncation error near 1e-9 and a rounding error near 1e-13·|value|/step: 1e-6 of the largest entry.
  test.each(indices)('gradient in parameter %s', (index) => {
    const numeric = slopeOf((shift) => garchLogLikelihood(returns, moved(point, index, shift)), 2e-5);
    const size = Math.max(1, ...gradient.map(Math.abs));
    expect(Math.abs((gradient[index] as number) - numeric) / size).toBeLessThan(1e-6);
  });

  test.each(indices)('second derivatives in parameter %s', (index) => {
    const size = Math.max(...hessian.map(Math.abs));
    for (const other of indices) {
      const numeric = slopeOf(
        (shift) => differentiate(moved(point, index, shift)).gradient[other] as number,
        2e-5,
      );
      const analytic = hessian[parameterCount * index + other] as number;
      expect(Math.abs(analytic - numeric) / size).toBeLessThan(1e-7);
    }
  });
});

test('the likelihood is minus infinity where the variance overflows', () => {
  const explosive = Float64Array.of(0, 0, 100, 100, 0.2);
  expect(
    garchLogLikelihood(simulateGarchReturns(2000, { mu: 0, omega: 1, alpha: 0, beta: 0 }, 5, 2), explosive),
  ).toBe(Number.NEGATIVE_INFINITY);
});

test('where it is no number the likelihood is minus infinity, so that no climb goes there', () => {
  const nowhere = Float64Array.of(Number.NaN, 0, 0.1, 0.1, 0.1);
  expect(garchLogLikelihood(returns, nowhere)).toBe(Number.NEGATIVE_INFINITY);
  expect(differentiate(nowhere).value).toBe(Number.NEGATIVE_INFINITY);
});
