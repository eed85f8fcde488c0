import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { nextStudentT } from '../../../../src/stats/random/studentDraw.ts';
import { gpdLogLikelihood } from '../../../../src/stats/tails/peaks/internal/gpdLikelihood.ts';
import { depthAt, quantileBeyond } from '../../../../src/stats/tails/peaks/internal/gpdTail.ts';
import { peaksBeyond } from '../../../../src/stats/tails/peaks/peaksBeyond.ts';
import { peaksTail } from '../../../../src/stats/tails/peaks/peaksTail.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';

const runs = { seed: 20261127, numRuns: 60 } as const;
const streams = testStreams(22);
const samples = fc
  .record({
    stream: fc.nat(100_000),
    count: fc.integer({ min: 250, max: 1500 }),
    nu: fc.constantFrom(1.5, 3, 5, Number.POSITIVE_INFINITY),
  })
  .map(({ stream, count, nu }) => {
    const random = streams.stream(stream);
    return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));
  });

const figuresOf = (returns: Float64Array, tailLevel = '0.99', confidence = '0.95') => {
  const outcome = peaksTail({ returns, tailLevel: level(tailLevel), confidence: level(confidence), streams });
  return outcome.ok ? outcome.value : null;
};

const finite = (value: number | null): boolean => value === null || Number.isFinite(value);

describe('laws of the figures of the largest losses', () => {
  test('figures are finite, ES is not below VaR, and both lie inside their intervals', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        const figures = figuresOf(returns);
        fc.pre(figures !== null);
        const { varInterval, esInterval, es } = figures;
        expect(
          [figures.var, es, varInterval?.lower, varInterval?.upper, esInterval?.lower, esInterval?.upper].map(
            (value) => finite(value ?? null),
          ),
        ).not.toContain(false);
        expect(figures.notes.map(({ code }) => code)).not.toContain('profileNotConverged');
        expect(varInterval?.lower).toBeLessThan(figures.var);
        expect(varInterval?.upper).toBeGreaterThan(figures.var);
        if (es === null) return;
        expect(es).toBeGreaterThan(figures.var);
        expect(esInterval?.lower).toBeLessThan(es);
        if (esInterval?.upper !== null) expect(esInterval?.upper).toBeGreaterThan(es);
      }),
      runs,
    );
  });

  test('a higher level gives larger figures, a higher confidence a wider interval', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        const figures = figuresOf(returns);
        const higher = figuresOf(returns, '0.995');
        const surer = figuresOf(returns, '0.99', '0.99');
        fc.pre(figures !== null && higher !== null && surer !== null);
        expect(higher.var).toBeGreaterThan(figures.var);
        if (figures.es !== null) expect(higher.es).toBeGreaterThan(figures.es);
        expect(surer.varInterval?.lower).toBeLessThan(figures.varInterval?.lower ?? 0);
        expect(surer.varInterval?.upper).toBeGreaterThan(figures.varInterval?.upper ?? 0);
      }),
      runs,
    );
  });

  test('a change of unit changes losses by it and xi not at all', () => {
    fc.assert(
      fc.property(samples, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (returns, unit) => {
        const figures = figuresOf(returns);
        const scaled = figuresOf(returns.map((value) => unit * value));
        fc.pre(figures !== null);
        // Both climbs end within 1e-8 standard errors.
        expect(relativeError(scaled?.var ?? 0, unit * figures.var)).toBeLessThan(1e-7);
        expect(Math.abs((scaled?.parameters.shape ?? 9) - figures.parameters.shape)).toBeLessThan(1e-7);
        expect(
          relativeError(scaled?.varInterval?.upper ?? 0, unit * (figures.varInterval?.upper ?? 1)),
        ).toBeLessThan(1e-6);
      }),
      runs,
    );
  });

  test('the order of the days does not matter', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        expect(figuresOf(returns.slice().reverse())).toEqual(figuresOf(returns));
      }),
      runs,
    );
  });

  test('the chance of a loss as large as VaR is the tail probability, with the interval that VaR has', () => {
    fc.assert(
      fc.property(samples, (returns) => {
        const figures = figuresOf(returns);
        fc.pre(figures !== null);
        const chanceOf = (threshold: number) => {
          const outcome = peaksBeyond({ returns, threshold, confidence: level95, streams });
          return outcome.ok ? outcome.value : null;
        };
        expect(relativeError(chanceOf(figures.var)?.probability ?? 0, 0.01)).toBeLessThan(1e-9);
        // A loss is an end of VaR exactly where the tail probability is an end of its chance.
        const upper = figures.varInterval?.upper ?? 0;
        expect(relativeError(chanceOf(upper)?.interval?.upper ?? 0, 0.01)).toBeLessThan(1e-6);
        const lower = figures.varInterval?.lower ?? 0;
        if (lower > figures.parameters.threshold)
          expect(relativeError(chanceOf(lower)?.interval?.lower ?? 0, 0.01)).toBeLessThan(1e-6);
      }),
      runs,
    );
  });

  test('the derivatives of the Pareto likelihood are those of its values', () => {
    const parameters = fc.record({
      shape: fc.double({ min: -0.3, max: 1.5, noNaN: true }),
      logScale: fc.double({ min: 0.5, max: 2, noNaN: true }),
    });
    const objective = gpdLogLikelihood(Float64Array.of(0.2, 0.4, 1, 1.7, 3, 4.5));
    const at = (shape: number, logScale: number) => {
      const gradient = new Float64Array(2);
      const hessian = new Float64Array(4);
      const value = objective(Float64Array.of(shape, logScale), gradient, hessian);
      return { value, gradient, hessian };
    };
    fc.assert(
      fc.property(parameters, ({ shape, logScale }) => {
        const step = 1e-5;
        fc.pre(1 + (shape - step) * 4.5 * Math.exp(step - logScale) > 0.1);
        const { gradient, hessian } = at(shape, logScale);
        const byShape = [at(shape + step, logScale), at(shape - step, logScale)] as const;
        const byScale = [at(shape, logScale + step), at(shape, logScale - step)] as const;
        // Central differences: truncation near 1e-10 times the third derivative, at most 1e4 here.
        const near = (found: number | undefined, plus: number, minus: number) =>
          expect(Math.abs((found ?? Number.NaN) - (plus - minus) / (2 * step))).toBeLessThan(1e-4);
        near(gradient[0], byShape[0].value, byShape[1].value);
        near(gradient[1], byScale[0].value, byScale[1].value);
        near(hessian[0], byShape[0].gradient[0] as number, byShape[1].gradient[0] as number);
        near(hessian[1], byScale[0].gradient[0] as number, byScale[1].gradient[0] as number);
        near(hessian[3], byScale[0].gradient[1] as number, byScale[1].gradient[1] as number);
        expect(hessian[2]).toBe(hessian[1]);
      }),
      runs,
    );
  });

  test('depth and distance undo each other, also next to xi = 0', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.double({ min: -0.5, max: 1.5, noNaN: true }), fc.constantFrom(0, 1e-12, -1e-12)),
        fc.double({ min: 0.01, max: 5, noNaN: true }),
        (shape, depth) => {
          expect(relativeError(depthAt(shape, quantileBeyond(shape, depth)), depth)).toBeLessThan(1e-12);
        },
      ),
      runs,
    );
  });
});
