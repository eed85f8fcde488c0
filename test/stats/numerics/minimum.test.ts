import { expect, it } from 'vitest';
import { minimiseOnInterval } from '../../../src/stats/numerics/minimum.ts';

it('finds the bottom of a parabola at once', () => {
  const { argument, value, evaluations, converged } = minimiseOnInterval((x) => (x - 2) ** 2 + 1, 0, 5);
  // values cannot tell arguments apart closer than √epsilon, 1.5e-8
  expect(Math.abs(argument - 2)).toBeLessThan(5e-8);
  expect(value).toBeCloseTo(1, 14);
  expect(converged).toBe(true);
  expect(evaluations).toBeLessThan(15);
});

it('finds the bottom of an uneven curve', () => {
  // x ln x has its minimum −1/e at 1/e
  const { argument, value } = minimiseOnInterval((x) => x * Math.log(x), 0, 3);
  expect(Math.abs(argument - Math.exp(-1))).toBeLessThan(5e-8);
  expect(value).toBeCloseTo(-Math.exp(-1), 14);
});

it('approaches a minimum on an end', () => {
  expect(minimiseOnInterval((x) => x, 1, 2).argument).toBeLessThan(1 + 1e-6);
  expect(minimiseOnInterval((x) => -x, 1, 2).argument).toBeGreaterThan(2 - 1e-6);
});

it('leans on a forbidden region', () => {
  const { argument } = minimiseOnInterval((x) => (x < 0.7 ? Number.NaN : (x - 0.5) ** 2), 0, 2);
  expect(argument).toBeGreaterThanOrEqual(0.7);
  expect(argument).toBeLessThan(0.7 + 1e-6);
});

it('finds a corner', () => {
  // |x| has no curvature for a parabola to use; golden-section steps get there
  expect(Math.abs(minimiseOnInterval((x) => Math.abs(x - 1.25), -3, 7).argument - 1.25)).toBeLessThan(1e-7);
});

it('counts what it asks and says when it ran out', () => {
  let asked = 0;
  const counted = (x: number): number => {
    asked += 1;
    return Math.cosh(x - 1);
  };
  const outcome = minimiseOnInterval(counted, -30, 40, { maxEvaluations: 6 });
  expect(outcome).toMatchObject({ converged: false, evaluations: 6 });
  expect(asked).toBe(6);
});
