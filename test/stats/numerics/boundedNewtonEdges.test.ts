import { describe, expect, it } from 'vitest';
import { maximiseByNewton, type SmoothObjective } from '../../../src/stats/numerics/boundedNewton.ts';

const free = Number.POSITIVE_INFINITY;

const climbFrom = (
  objective: SmoothObjective,
  start: readonly number[],
  lower: readonly number[] = start.map(() => -free),
  upper: readonly number[] = start.map(() => free),
  maxSteps = 100,
) => {
  const asked: number[][] = [];
  const noted: SmoothObjective = (point, gradient, hessian) => {
    asked.push([...point]);
    return objective(point, gradient, hessian);
  };
  const settings = {
    lower: Float64Array.from(lower),
    upper: Float64Array.from(upper),
    tolerance: 1e-8,
    maxSteps,
  };
  return { ...maximiseByNewton(noted, Float64Array.from(start), settings), asked };
};

/** −(x − 2)². */
const hill: SmoothObjective = (point, gradient, hessian) => {
  const x = (point[0] as number) - 2;
  gradient[0] = -2 * x;
  hessian[0] = -2;
  return -x * x;
};

/** x + y/2·sign − x² − y² − 1.8·sign·xy: on y = 0 highest at x = 1/2, value 1/4, where the slope in y is −0.4·sign. */
const slanted =
  (sign: number): SmoothObjective =>
  (point, gradient, hessian) => {
    const x = point[0] as number;
    const y = sign * (point[1] as number);
    gradient.set([1 - 2 * x - 1.8 * y, sign * (0.5 - 2 * y - 1.8 * x)]);
    hessian.set([-2, -1.8 * sign, -1.8 * sign, -2]);
    return x + y / 2 - x * x - y * y - 1.8 * x * y;
  };

// Every figure below follows by hand from the quadratics above; the arithmetic is exact to rounding.
describe('bounds', () => {
  it.each([
    ['upper', 0, 1, 1],
    ['lower', 3, 5, -1],
    ['upper, at its very top', 0, 2, 1],
    ['lower, at its very top', 2, 5, -1],
  ] as const)('ends on the %s bound', (_, lower, upper, side) => {
    const bound = side === 1 ? upper : lower;
    const top = climbFrom(hill, [bound], [lower], [upper]);
    expect(top.converged).toBe(true);
    expect([...top.point]).toEqual([bound]);
    expect([...top.side]).toEqual([side]);
    expect([...top.standardErrors]).toEqual([0]);
    expect(top.steps).toBe(0);
  });

  it.each([
    [1, [-free, 0], [free, free], -1],
    [-1, [-free, -free], [free, 0], 1],
  ] as const)(
    'holds a parameter whose step, not its slope, leaves the box (%s)',
    (sign, lower, upper, side) => {
      const top = climbFrom(slanted(sign), [0, 0], lower, upper);
      expect(top.converged).toBe(true);
      expect(top.point[0]).toBeCloseTo(0.5, 14);
      expect(top.point[1]).toBeCloseTo(0, 14);
      expect(top.value).toBeCloseTo(0.25, 14);
      expect([...top.side]).toEqual([0, side]);
      expect(top.steps).toBe(1);
      // the first step is that of x alone, slope 1 over curvature 2
      expect(top.asked[1]?.[0]).toBeCloseTo(0.5, 14);
      // with y held, x has the curvature 2 to itself
      expect(top.standardErrors[0]).toBeCloseTo(Math.SQRT1_2, 14);
      expect(top.standardErrors[1]).toBe(0);
    },
  );

  it('meets a bound from inside and stays there', () => {
    const top = climbFrom(hill, [0], [-1], [1]);
    expect(top.asked[1]).toEqual([1]); // the full step to 2, cut at the bound
    expect(top).toMatchObject({ converged: true, value: -1, steps: 1 });
    expect([...top.side]).toEqual([1]);
  });
});

describe('curvature that does not point down', () => {
  it('adds the first ridge that turns the step uphill', () => {
    const valley: SmoothObjective = (point, gradient, hessian) => {
      const x = point[0] as number;
      gradient[0] = 2 * x;
      hessian[0] = 2;
      return x * x;
    };
    const top = climbFrom(valley, [0.5], [-1], [2]);
    // ridges of 0.001, 0.01, 0.1 and 1 times 2 leave −2 + 2 or less; ten times gives 18: a step of 1/18
    expect(top.asked[1]?.[0]).toBeCloseTo(0.5 + 1 / 18, 14);
    expect(top).toMatchObject({ converged: true, value: 4 });
    expect([...top.side]).toEqual([1]);
  });

  it('gives up where no ridge helps', () => {
    const broken: SmoothObjective = (_, gradient, hessian) => {
      gradient[0] = 1;
      hessian[0] = Number.NaN;
      return 0;
    };
    const top = climbFrom(broken, [3]);
    expect(top).toMatchObject({ converged: false, value: 0, steps: 0 });
    expect(top.asked.length).toBe(1);
  });

  it('climbs the walls of Rosenbrock 1960 to the known top (1, 1)', () => {
    // Rosenbrock 1960, The Computer Journal 3, 175-184: 100(y − x²)² + (1 − x)², lowest 0 at (1, 1)
    const rosenbrock: SmoothObjective = (point, gradient, hessian) => {
      const x = point[0] as number;
      const gap = (point[1] as number) - x * x;
      gradient.set([400 * x * gap + 2 * (1 - x), -200 * gap]);
      hessian.set([400 * gap - 800 * x * x - 2, 400 * x, 400 * x, -200]);
      return -100 * gap * gap - (1 - x) ** 2;
    };
    const inside = climbFrom(rosenbrock, [0.2, 0.2], [-free, -free], [0.5, free]);
    // x held at 1/2: y = 1/4, value −(1/2)², standard error 1/√200
    expect(inside.converged).toBe(true);
    expect([...inside.side]).toEqual([1, 0]);
    expect(inside.point[1]).toBeCloseTo(0.25, 12);
    expect(inside.value).toBeCloseTo(-0.25, 12);
    expect(inside.standardErrors[1]).toBeCloseTo(1 / Math.sqrt(200), 12);
    // inverse of [[802, −400], [−400, 200]], determinant 400: 200/400 and 802/400
    const top = climbFrom(rosenbrock, [-1.2, 1]);
    expect(top.standardErrors[0]).toBeCloseTo(Math.sqrt(0.5), 6);
    expect(top.standardErrors[1]).toBeCloseTo(Math.sqrt(2.005), 6);
  });
});

describe('ends', () => {
  it('halves fifty times at most where the value never rises', () => {
    const lying: SmoothObjective = (point, gradient, hessian) => {
      gradient[0] = 1;
      hessian[0] = -1;
      return (point[0] as number) === 0 ? 0 : -1;
    };
    const top = climbFrom(lying, [0]);
    expect(top).toMatchObject({ converged: false, value: 0, steps: 0 });
    expect([...top.point]).toEqual([0]);
    expect(top.asked.length).toBe(51);
    expect(top.asked[2]).toEqual([0.5]);
  });

  it('keeps its value where the last step cannot improve on it', () => {
    // a slope too small to count, and a value that falls whichever way
    const spike: SmoothObjective = (point, gradient, hessian) => {
      gradient[0] = 1e-9;
      hessian[0] = -1;
      return (point[0] as number) === 0 ? 7 : 6;
    };
    expect(climbFrom(spike, [0])).toMatchObject({ converged: true, value: 7 });
  });

  it('asks once without steps, or from where nothing is defined', () => {
    const idle = climbFrom(hill, [0], [-free], [free], 0);
    expect(idle).toMatchObject({ converged: false, value: -4, steps: 0 });
    expect(idle.asked.length).toBe(1);
    const nowhere = climbFrom(() => Number.NEGATIVE_INFINITY, [0]);
    expect(nowhere).toMatchObject({ converged: false, steps: 0 });
    expect(nowhere.asked.length).toBe(1);
  });

  it('is finished by slope times standard error', () => {
    // −x²/2·c: slope c·x, error 1/√c, so the rule is √c·|x| ≤ 1e-8: for c = 1e-4 met at 0.9e-6 and missed at 1.1e-6
    const flat: SmoothObjective = (point, gradient, hessian) => {
      const x = point[0] as number;
      gradient[0] = -1e-4 * x;
      hessian[0] = -1e-4;
      return -0.5e-4 * x * x;
    };
    expect(climbFrom(flat, [0.9e-6]).steps).toBe(0);
    expect(climbFrom(flat, [1.1e-6]).steps).toBe(1);
  });
});
