import { describe, expect, it } from 'vitest';
import {
  maximiseByNewton,
  type NewtonSettings,
  type SmoothObjective,
} from '../../../src/stats/numerics/boundedNewton.ts';

const free = Number.POSITIVE_INFINITY;

const settings = (lower: readonly number[], upper: readonly number[], maxSteps = 100): NewtonSettings => ({
  lower: Float64Array.from(lower),
  upper: Float64Array.from(upper),
  tolerance: 1e-8,
  maxSteps,
});

/** −(x − 2)² − 2(y + 1)² − (x − 2)(y + 1): highest at (2, −1). */
const bowl: SmoothObjective = (point, gradient, hessian) => {
  const x = (point[0] as number) - 2;
  const y = (point[1] as number) + 1;
  gradient.set([-2 * x - y, -4 * y - x]);
  hessian.set([-2, -1, -1, -4]);
  return -x * x - 2 * y * y - x * y;
};

/** ln x − x for x > 0 on a log-free scale: highest at 1, not defined at or below 0. */
const halfLine: SmoothObjective = (point, gradient, hessian) => {
  const x = point[0] as number;
  if (x <= 0) return Number.NEGATIVE_INFINITY;
  gradient[0] = 1 / x - 1;
  hessian[0] = -1 / (x * x);
  return Math.log(x) - x;
};

/** The negative of Rosenbrock's valley: highest at (1, 1), curved, not concave everywhere. */
const valley: SmoothObjective = (point, gradient, hessian) => {
  const x = point[0] as number;
  const y = point[1] as number;
  const gap = y - x * x;
  gradient.set([400 * x * gap + 2 * (1 - x), -200 * gap]);
  hessian.set([400 * gap - 800 * x * x - 2, 400 * x, 400 * x, -200]);
  return -100 * gap * gap - (1 - x) ** 2;
};

describe('Newton on bounded parameters', () => {
  it('reaches the top of a bowl in one step, with the standard errors of its curvature', () => {
    const top = maximiseByNewton(bowl, Float64Array.of(40, 40), settings([-free, -free], [free, free]));
    expect(top.converged).toBe(true);
    expect(top.point[0]).toBeCloseTo(2, 12);
    expect(top.point[1]).toBeCloseTo(-1, 12);
    // inverse of [[2, 1], [1, 4]] is [[4, −1], [−1, 2]]/7
    expect(top.standardErrors[0]).toBeCloseTo(Math.sqrt(4 / 7), 12);
    expect(top.standardErrors[1]).toBeCloseTo(Math.sqrt(2 / 7), 12);
  });

  it('holds a parameter on its bound and brings the other to its highest point there', () => {
    const top = maximiseByNewton(bowl, Float64Array.of(0, 0), settings([-free, 0], [free, free]));
    expect(top.converged).toBe(true);
    expect([...top.side]).toEqual([0, -1]);
    expect(top.point[1]).toBe(0);
    // d/dx at y = 0: −2(x − 2) − 1 = 0
    expect(top.point[0]).toBeCloseTo(1.5, 12);
    expect(top.standardErrors[1]).toBe(0);
  });

  it('leaves a bound on which it starts when the gradient points inward', () => {
    const top = maximiseByNewton(bowl, Float64Array.of(0, -5), settings([0, -5], [free, free]));
    expect(top.converged).toBe(true);
    expect(top.point[0]).toBeCloseTo(2, 12);
    expect(top.point[1]).toBeCloseTo(-1, 12);
  });

  it('comes back from where the objective does not exist', () => {
    const top = maximiseByNewton(halfLine, Float64Array.of(1.99), settings([-free], [free]));
    expect(top.converged).toBe(true);
    expect(top.point[0]).toBeCloseTo(1, 12);
  });

  it('follows a curved valley with directions of both signs of curvature', () => {
    const top = maximiseByNewton(valley, Float64Array.of(-1.2, 1), settings([-free, -free], [free, free]));
    expect(top.converged).toBe(true);
    expect(top.point[0]).toBeCloseTo(1, 10);
    expect(top.point[1]).toBeCloseTo(1, 10);
  });

  it('says when its steps run out, and keeps the best point', () => {
    const start = Float64Array.of(-1.2, 1);
    const top = maximiseByNewton(valley, start, settings([-free, -free], [free, free], 3));
    expect(top.converged).toBe(false);
    expect(top.steps).toBe(3);
    expect(top.value).toBeGreaterThan(-24.2); // the value at the start
    expect([...start]).toEqual([-1.2, 1]);
  });

  it('does not call the middle of a saddle a maximum', () => {
    const saddle: SmoothObjective = (point, gradient, hessian) => {
      const x = point[0] as number;
      gradient[0] = 2 * x;
      hessian[0] = 2;
      return x * x;
    };
    const top = maximiseByNewton(saddle, Float64Array.of(0), settings([-free], [free]));
    expect(top.converged).toBe(false);
  });

  it('refuses a start at which the objective does not exist', () => {
    const top = maximiseByNewton(halfLine, Float64Array.of(-1), settings([-free], [free]));
    expect(top.converged).toBe(false);
  });
});
