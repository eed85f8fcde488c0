import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quantileMultiplier, shortfallMultiplier } from '../../../src/stats/losses/studentMultiplier.ts';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { historicalTail } from '../../../src/stats/tails/historicalTail.ts';
import { normalTail } from '../../../src/stats/tails/normalTail.ts';
import { studentTail } from '../../../src/stats/tails/studentTail.ts';
import type {
  Interval,
  TailFigures,
  TailInput,
  TailModelName,
} from '../../../src/stats/tails/tailFigures.ts';
import type { Result } from '../../../src/terms/result.ts';
import { accepted } from '../../laws/outcomes.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(9);
const settings = { seed: 20_260_504, numRuns: 15 };

type Model = (input: TailInput) => Result<TailFigures<TailModelName, unknown>>;
const models: Readonly<Record<string, Model>> = {
  historical: historicalTail,
  normal: normalTail,
  student: (input) => studentTail(input),
};

const sample = fc
  .record({
    stream: fc.nat(1_000_000),
    count: fc.integer({ min: 100, max: 260 }),
    nu: fc.constantFrom(1.2, 2, 4, 10, Number.POSITIVE_INFINITY),
  })
  .map(({ stream, count, nu }) => {
    const random = streams.stream(stream);
    return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));
  });

const ask = (model: Model, returns: Float64Array, tailLevel = '0.95', confidence = '0.95') =>
  accepted(
    model({ returns, tailLevel: level(tailLevel), confidence: level(confidence), streams, replicates: 199 }),
  );

const inside = (figure: number, interval: Interval | null): boolean =>
  interval === null || ((interval.lower ?? -Infinity) <= figure && figure <= (interval.upper ?? Infinity));

/** Is the first interval at least as wide on both sides? A null end is no bound. */
const holds = (wide: Interval | null, narrow: Interval | null): boolean =>
  wide === null ||
  narrow === null ||
  ((wide.lower ?? -Infinity) <= (narrow.lower ?? -Infinity) &&
    (wide.upper ?? Infinity) >= (narrow.upper ?? Infinity));

const finite = (interval: Interval | null): boolean =>
  interval === null || [interval.lower, interval.upper].every((end) => end === null || Number.isFinite(end));

for (const [name, model] of Object.entries(models))
  describe(`Laws of the ${name} tail`, () => {
    it('ES is not below VaR, both lie inside their intervals, and everything is finite', () => {
      fc.assert(
        fc.property(sample, (returns) => {
          const figures = ask(model, returns);
          expect(Number.isFinite(figures.var)).toBe(true);
          expect(figures.es === null || figures.es >= figures.var).toBe(true);
          expect(inside(figures.var, figures.varInterval)).toBe(true);
          if (name !== 'historical')
            expect(inside(figures.es ?? 0, figures.es === null ? null : figures.esInterval)).toBe(true);
          expect(finite(figures.varInterval) && finite(figures.esInterval)).toBe(true);
        }),
        settings,
      );
    });

    it('VaR and ES rise with the tail level, and so do both ends of the VaR interval', () => {
      fc.assert(
        fc.property(sample, (returns) => {
          const [low, high] = [ask(model, returns, '0.9'), ask(model, returns, '0.975')];
          expect(high.var).toBeGreaterThanOrEqual(low.var);
          if (low.es !== null && high.es !== null) expect(high.es).toBeGreaterThanOrEqual(low.es);
          expect((high.varInterval?.lower ?? Infinity) >= (low.varInterval?.lower ?? -Infinity)).toBe(true);
          expect((high.varInterval?.upper ?? Infinity) >= (low.varInterval?.upper ?? -Infinity)).toBe(true);
        }),
        settings,
      );
    });

    it('a higher confidence gives intervals that hold the lower one', () => {
      fc.assert(
        fc.property(sample, (returns) => {
          const [narrow, wide] = [ask(model, returns, '0.95', '0.8'), ask(model, returns, '0.95', '0.98')];
          expect(holds(wide.varInterval, narrow.varInterval)).toBe(true);
          expect(holds(wide.esInterval, narrow.esInterval)).toBe(true);
        }),
        settings,
      );
    });

    it('a change of unit and a shift carry figures and intervals along', () => {
      fc.assert(
        fc.property(sample, (returns) => {
          const [factor, shift] = [3, 0.004];
          const before = ask(model, returns);
          const after = ask(
            model,
            returns.map((value) => factor * value + shift),
          );
          const moved = (figure: number | null | undefined) =>
            figure == null ? null : factor * figure - shift;
          const agree = (figure: number | null | undefined, expected: number | null) => {
            expect(figure === null).toBe(expected === null);
            // the flattest likelihoods carry the rounding of the shifted returns to about 1e-8 of the figure
            if (expected !== null)
              expect(Math.abs((figure ?? Number.NaN) - expected)).toBeLessThan(
                1e-7 * Math.max(1e-3, Math.abs(expected)),
              );
          };
          agree(after.var, moved(before.var));
          agree(after.es, moved(before.es));
          agree(after.varInterval?.lower, moved(before.varInterval?.lower));
          agree(after.varInterval?.upper, moved(before.varInterval?.upper));
        }),
        settings,
      );
    });

    it('the order of the returns does not matter to VaR and ES, and the input stays as it was', () => {
      fc.assert(
        fc.property(sample, (returns) => {
          const kept = returns.slice();
          const before = ask(model, returns);
          const after = ask(model, returns.slice().reverse());
          expect(returns).toEqual(kept);
          expect(Math.abs(after.var - before.var)).toBeLessThan(1e-9);
          expect(Math.abs((after.es ?? 0) - (before.es ?? 0))).toBeLessThan(
            1e-8 * Math.max(1, before.es ?? 0),
          );
        }),
        settings,
      );
    });
  });

describe('Student multiples approach the normal ones as nu grows', () => {
  it('from above for tails that matter, at the rate 1/nu', () => {
    const normal = { var: quantileMultiplier(0.01, Infinity), es: shortfallMultiplier(0.01, Infinity) };
    let lastVar = Infinity;
    let lastEs = Infinity;
    for (const nu of [3, 10, 100, 1e4, 1e6]) {
      const excessVar = quantileMultiplier(0.01, nu) - normal.var;
      const excessEs = shortfallMultiplier(0.01, nu) - normal.es;
      expect(excessVar).toBeGreaterThan(0);
      expect(excessVar).toBeLessThan(lastVar);
      expect(excessEs).toBeGreaterThan(0);
      expect(excessEs).toBeLessThan(lastEs);
      lastVar = excessVar;
      lastEs = excessEs;
    }
    expect(lastVar).toBeLessThan(1e-5);
  });
});
