import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type ArrangementClass,
  arrangementClasses,
  exactIndependenceP,
} from '../../../src/stats/backtests/exactIndependence.ts';
import { independenceRatio } from '../../../src/stats/backtests/independence.ts';
import { transitionsOf } from '../../../src/stats/backtests/transitions.ts';

const counts = fc
  .integer({ min: 2, max: 3000 })
  .chain((days) => fc.tuple(fc.constant(days), fc.integer({ min: 1, max: days - 1 })));

/** Every way to put the exceedances into the days. */
const arrangements = (days: number): Uint8Array[] =>
  Array.from({ length: 2 ** days }, (_, bits) =>
    Uint8Array.from({ length: days }, (__, day) => Math.floor(bits / 2 ** day) % 2),
  );

describe('arrangements by runs', () => {
  test('their shares sum to one and their transitions to the days', () => {
    fc.assert(
      fc.property(counts, ([days, exceedances]) => {
        const classes = arrangementClasses(exceedances, days);
        const total = classes.reduce((sum, { share }) => sum + share, 0);
        // Each share is the exponential of a difference of log-gammas up to 2e4: their rounding is 1e-12.
        expect(Math.abs(total - 1)).toBeLessThan(5e-12);
        const sound = ({ transitions: { n00, n01, n10, n11 } }: ArrangementClass) =>
          Math.min(n00, n01, n10, n11) >= 0 && n00 + n01 + n10 + n11 === days - 1 && Math.abs(n01 - n10) <= 1;
        expect(classes.filter((one) => !sound(one))).toEqual([]);
      }),
      { seed: 1998, numRuns: 60 },
    );
  });

  test('p is the share of all arrangements that reach the ratio, counted one by one on nine days', () => {
    const all = arrangements(9);
    for (const hits of all) {
      const exceedances = hits.reduce((sum, hit) => sum + hit, 0);
      if (exceedances === 0 || exceedances === 9) continue;
      const ratio = independenceRatio(transitionsOf(hits));
      const alike = all.filter((other) => other.reduce((sum, hit) => sum + hit, 0) === exceedances);
      const reaching = alike.filter((other) => independenceRatio(transitionsOf(other)) >= ratio - 1e-9);
      const p = exactIndependenceP(exceedances, 9, transitionsOf(hits)) ?? 0;
      // Binomial coefficients below 130: rounding only.
      expect(Math.abs(p - reaching.length / alike.length)).toBeLessThan(1e-12);
    }
  });
});
