import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Ends } from '../../../src/stats/mean/ends.ts';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { meanLadder } from '../../../src/stats/mean/ladder.ts';
import { neweyWestInterval } from '../../../src/stats/mean/neweyWestInterval.ts';
import { predictionInterval } from '../../../src/stats/mean/prediction.ts';
import { stationaryBootstrapInterval } from '../../../src/stats/mean/stationaryBootstrap.ts';
import { studentisedBootstrapInterval } from '../../../src/stats/mean/studentisedBootstrap.ts';
import { ratioInterval } from '../../../src/stats/ratio/interval.ts';
import { blockDeviationInterval } from '../../../src/stats/spread/blockInterval.ts';
import { bonettInterval } from '../../../src/stats/spread/bonett.ts';
import { chiSquareInterval } from '../../../src/stats/spread/chiSquareInterval.ts';
import type { Level } from '../../../src/terms/level.ts';
import type { Result } from '../../../src/terms/result.ts';
import { accepted } from '../../laws/outcomes.ts';
import { level, level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const seeded = { seed: 20_260_504, numRuns: 50 };
const streams = testStreams(61);

/** Returns in ten-thousandths, so that shifts and permutations can be made without rounding, and that do move. */
const returnsOf = (least: number) =>
  fc
    .array(fc.integer({ min: -900, max: 900 }), { minLength: least, maxLength: 80 })
    .filter((steps) => new Set(steps).size > 2)
    .map((steps) => Float64Array.from(steps, (step) => step / 10_000));

const withStreams = (returns: Float64Array, asked: Level) =>
  ({ returns, level: asked, side: 'both', streams, replicates: 199 }) as const;

type Procedure = {
  readonly least: number;
  readonly of: (returns: Float64Array, asked: Level) => Result<Ends>;
};

const ofTheMean: Readonly<Record<string, Procedure>> = {
  plain: { least: 2, of: (returns, asked) => meanInterval(returns, asked, 'both') },
  neweyWest: { least: 20, of: (returns, asked) => neweyWestInterval(returns, asked, 'both') },
  studentised: {
    least: 10,
    of: (returns, asked) => studentisedBootstrapInterval(withStreams(returns, asked)),
  },
  stationary: { least: 10, of: (returns, asked) => stationaryBootstrapInterval(withStreams(returns, asked)) },
  prediction: { least: 2, of: (returns, asked) => predictionInterval(returns, asked, 'both') },
};

const ofTheSpread: Readonly<Record<string, Procedure>> = {
  chiSquare: { least: 2, of: chiSquareInterval },
  bonett: { least: 10, of: bonettInterval },
  block: { least: 10, of: (returns, asked) => blockDeviationInterval(withStreams(returns, asked)) },
};

const ofTheRatio: Readonly<Record<string, Procedure>> = { noncentralT: { least: 2, of: ratioInterval } };

const ends = (result: Result<Ends>): { lower: number; upper: number } => {
  const { lower, upper } = accepted(result);
  return { lower: lower ?? Number.NaN, upper: upper ?? Number.NaN };
};

/** Equal up to `tolerance` times the size of the larger figure around. */
const expectNear = (actual: number, expected: number, scale: number, tolerance: number) =>
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(tolerance * scale);

describe.each(Object.entries({ ...ofTheMean, ...ofTheSpread, ...ofTheRatio }))('%s', (_, { least, of }) => {
  test('a higher level never narrows, and the ends are in order', () => {
    fc.assert(
      fc.property(returnsOf(least), (returns) => {
        const [narrow, middle, wide] = ['0.8', '0.95', '0.99'].map((text) => ends(of(returns, level(text))));
        for (const [inner, outer] of [
          [narrow, middle],
          [middle, wide],
        ]) {
          expect(inner?.lower).toBeGreaterThanOrEqual(outer?.lower ?? Number.NaN);
          expect(inner?.upper).toBeLessThanOrEqual(outer?.upper ?? Number.NaN);
          expect(inner?.lower).toBeLessThanOrEqual(inner?.upper ?? Number.NaN);
        }
      }),
      seeded,
    );
  });

  test('leaves the returns as they are', () => {
    fc.assert(
      fc.property(returnsOf(least), (returns) => {
        const before = [...returns];
        of(returns, level95);
        expect([...returns]).toEqual(before);
      }),
      { ...seeded, numRuns: 20 },
    );
  });
});

// A power of two scales without rounding, so every sum is the same with another exponent; the quantiles do not change.
describe.each(Object.entries({ ...ofTheMean, ...ofTheSpread }))(
  '%s scales with the returns',
  (_, { least, of }) => {
    test('by a power of two, exactly', () => {
      fc.assert(
        fc.property(returnsOf(least), fc.integer({ min: -8, max: 8 }), (returns, power) => {
          const factor = 2 ** power;
          const before = ends(of(returns, level95));
          const after = ends(
            of(
              returns.map((value) => value * factor),
              level95,
            ),
          );
          expect([after.lower, after.upper]).toEqual([before.lower * factor, before.upper * factor]);
        }),
        seeded,
      );
    });
  },
);

describe.each(Object.entries(ofTheMean))('%s moves with the returns', (_, { least, of }) => {
  test('by a constant', () => {
    fc.assert(
      fc.property(returnsOf(least), fc.integer({ min: -500, max: 500 }), (returns, steps) => {
        const shift = steps / 10_000;
        const before = ends(of(returns, level95));
        const after = ends(
          of(
            returns.map((value) => value + shift),
            level95,
          ),
        );
        // Shifted returns are rounded anew at 1e-17; bootstrap order statistics and block lengths follow continuously.
        const scale = Math.abs(before.lower) + Math.abs(before.upper) + Math.abs(shift);
        expectNear(after.lower, before.lower + shift, scale, 1e-11);
        expectNear(after.upper, before.upper + shift, scale, 1e-11);
      }),
      seeded,
    );
  });
});

describe.each(Object.entries(ofTheSpread))('%s stays when the returns move', (_, { least, of }) => {
  test('by a constant', () => {
    fc.assert(
      fc.property(returnsOf(least), fc.integer({ min: -500, max: 500 }), (returns, steps) => {
        const before = ends(of(returns, level95));
        const after = ends(
          of(
            returns.map((value) => value + steps / 10_000),
            level95,
          ),
        );
        expectNear(after.lower, before.lower, before.upper, 1e-10);
        expectNear(after.upper, before.upper, before.upper, 1e-10);
      }),
      seeded,
    );
  });
});

const orderFree: readonly (readonly [string, Procedure])[] = [
  ...Object.entries(ofTheMean).filter(([name]) => name === 'plain' || name === 'prediction'),
  ...Object.entries(ofTheSpread).filter(([name]) => name !== 'block'),
  ...Object.entries(ofTheRatio),
];

describe.each(orderFree)('%s', (_, { least, of }) => {
  test('does not depend on the order of the returns', () => {
    fc.assert(
      fc.property(returnsOf(least), (returns) => {
        const before = ends(of(returns, level95));
        const after = ends(of(Float64Array.from(returns).sort(), level95));
        const scale = Math.abs(before.lower) + Math.abs(before.upper);
        // Compensated sums: a few units in the last place.
        expectNear(after.lower, before.lower, scale, 1e-13);
        expectNear(after.upper, before.upper, scale, 1e-13);
      }),
      seeded,
    );
  });
});

describe('ladder', () => {
  test('each step holds the one before', () => {
    fc.assert(
      fc.property(returnsOf(2), (returns) => {
        const ladder = accepted(meanLadder(returns, 'both'));
        for (const [index, step] of ladder.entries()) {
          const inner = ladder[index - 1] ?? { lower: 0, upper: 0 };
          if (index === 0) continue;
          expect(step.lower).toBeLessThan(inner.lower ?? Number.NaN);
          expect(step.upper).toBeGreaterThan(inner.upper ?? Number.NaN);
        }
      }),
      seeded,
    );
  });
});
