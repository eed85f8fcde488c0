import { describe, expect, it } from 'vitest';
import { fillStudentNormaliser } from '../../../../src/stats/distributions/studentNormaliser.ts';
import type { SmoothValue } from '../../../../src/stats/numerics/smoothValue.ts';
import { nextStudentT } from '../../../../src/stats/random/studentDraw.ts';
import { climbAtFixedNu } from '../../../../src/stats/tails/internal/fixedNu.ts';
import { studentLikelihood } from '../../../../src/stats/tails/internal/studentLikelihood.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { testStreams } from '../../testStreams.ts';

const random = testStreams(5).stream(0);
const sample = Float64Array.from({ length: 80 }, () => nextStudentT(random, 3));

const evaluate = (point: readonly number[]) => {
  const gradient = new Float64Array(3);
  const hessian = new Float64Array(9);
  const value = studentLikelihood(sample).objective(Float64Array.from(point), gradient, hessian);
  return { value, gradient, hessian };
};

const moved = (point: readonly number[], place: number, by: number) =>
  point.map((value, index) => (index === place ? value + by : value));

describe('The log-density constant in 1/nu', () => {
  const into: SmoothValue = { value: 0, slope: 0, curvature: 0 };

  it('has the value and derivatives of mpmath on both sides of the change from series to gammas', () => {
    // mpmath 1.3.0 at 40 digits: lnΓ((nu+1)/2) − lnΓ(nu/2) − ln(nu·π)/2 and mpmath.diff of it in 1/nu
    const known = [
      [0, -0.9189385332046727, -0.25, 0],
      [1 / 30, -0.9272703253788457, -0.24986141830727887, 0.008296555850024484],
      [0.25, -0.9808292530117262, -0.24297844437420837, 0.050943667122206486],
      [2, -1.3105329259115095, -0.14269908169872414, 0.0387076831544194],
    ] as const;
    for (const [inverseNu, value, slope, curvature] of known) {
      for (const at of inverseNu === 1 / 30
        ? [inverseNu * (1 - 1e-15), inverseNu * (1 + 1e-15)]
        : [inverseNu]) {
        fillStudentNormaliser(at, into);
        expect(relativeError(into.value, value)).toBeLessThan(1e-14);
        expect(relativeError(into.slope, slope)).toBeLessThan(1e-13);
        // nu³ times a difference of three terms of size 1/nu² loses three digits at nu = 30
        expect(relativeError(into.curvature, curvature)).toBeLessThan(2e-10);
      }
    }
  });
});

describe('The Student log-likelihood', () => {
  it('is the sum of log-densities', () => {
    // nu = 4: density 3/8·(1 + u²/4)^(−5/2)
    const scale = Math.exp(0.2);
    const direct = sample.reduce((sum, x) => {
      const u = (x - 0.1) / scale;
      return sum + Math.log(3 / 8) - 2.5 * Math.log1p((u * u) / 4) - 0.2;
    }, 0);
    expect(relativeError(evaluate([0.1, 0.2, 0.25]).value, direct)).toBeLessThan(1e-13);
  });

  for (const inverseNu of [2e-5, 9e-5, 1e-3, 0.2, 1.5])
    it(`has the derivatives of its differences at 1/nu = ${inverseNu}`, () => {
      const point = [0.1, 0.2, inverseNu];
      const at = evaluate(point);
      const step = Math.min(1e-5, inverseNu / 2);
      for (let place = 0; place < 3; place += 1) {
        const below = evaluate(moved(point, place, -step));
        const above = evaluate(moved(point, place, step));
        const slope = (above.value - below.value) / (2 * step);
        // differences of a value near 100 leave 1e-13·100/step, and step² of the third derivative
        const scaleOfSlope = 1 + Math.abs(at.gradient[place] as number);
        expect(Math.abs((at.gradient[place] as number) - slope) / scaleOfSlope).toBeLessThan(2e-6);
        for (let other = 0; other < 3; other += 1) {
          const bend = ((above.gradient[other] as number) - (below.gradient[other] as number)) / (2 * step);
          const entry = at.hessian[3 * place + other] as number;
          expect(Math.abs(entry - bend) / (1 + Math.abs(entry))).toBeLessThan(2e-6);
        }
      }
    });

  it('does not jump where the series per return takes over', () => {
    const below = evaluate([0.1, 0.2, 1e-4 * (1 - 1e-12)]);
    const above = evaluate([0.1, 0.2, 1e-4 * (1 + 1e-12)]);
    expect(relativeError(below.value, above.value)).toBeLessThan(1e-12);
    expect(relativeError(below.gradient[2] as number, above.gradient[2] as number)).toBeLessThan(1e-9);
    // ln(A) divided by (1/nu)³ keeps about five digits at 1/nu = 1e-4
    expect(relativeError(below.hessian[8] as number, above.hessian[8] as number)).toBeLessThan(1e-5);
  });

  it('is finite and normal at 1/nu = 0', () => {
    const normal = sample.reduce((sum, x) => sum - 0.5 * Math.log(2 * Math.PI) - 0.5 * x * x, 0);
    const { value, gradient } = evaluate([0, 0, 0]);
    expect(relativeError(value, normal)).toBeLessThan(1e-13);
    // slope in 1/nu: Σ (u⁴ − 2u² − 1)/4
    const slope = sample.reduce((sum, x) => sum + (x ** 4 - 2 * x * x - 1) / 4, 0);
    expect(relativeError(gradient[2] as number, slope)).toBeLessThan(1e-12);
  });
});

describe('The climb at a fixed nu', () => {
  it('ends on the same point from far away, where Newton alone would run off', () => {
    const likelihood = studentLikelihood(sample);
    const near = climbAtFixedNu(likelihood, 0.5, { location: 0, logScale: 0 }, 1e-9);
    for (const start of [
      { location: 400, logScale: 3 },
      { location: -60, logScale: -6 },
      { location: 0, logScale: 12 },
    ]) {
      const far = climbAtFixedNu(likelihood, 0.5, start, 1e-9);
      expect(far.converged).toBe(true);
      expect(Math.abs(far.location - near.location)).toBeLessThan(1e-8);
      expect(Math.abs(far.logScale - near.logScale)).toBeLessThan(1e-8);
    }
  });
});
