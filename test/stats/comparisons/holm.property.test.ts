import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { holmAdjusted } from '../../../src/stats/comparisons/holm.ts';

const pValues = fc.array(fc.option(fc.double({ min: 0, max: 1, noNaN: true }), { freq: 4 }), {
  maxLength: 12,
});

const holds = <Args extends [unknown, ...unknown[]]>(property: fc.IProperty<Args>) =>
  fc.assert(property, { seed: 1979, numRuns: 300 });

const byPair = (values: readonly (number | null)[], check: (first: number, second: number) => void) => {
  for (let i = 0; i < values.length; i += 1) for (let j = 0; j < values.length; j += 1) check(i, j);
};

describe('Holm', () => {
  // By hand: 3·0.01, then 2·0.03, then max(0.06, 0.04); and 4·0.005, 3·0.01, 2·0.03, 0.06 (Holm 1979, the procedure).
  test.each([
    [
      [0.01, 0.04, 0.03],
      [0.03, 0.06, 0.06],
    ],
    [
      [0.01, 0.04, null, 0.03],
      [0.03, 0.06, null, 0.06],
    ],
    [[0.04], [0.04]],
    [[], []],
    [
      [0.9, 0.8],
      [1, 1],
    ],
  ])('%j', (given, adjusted) => expect(holmAdjusted(given)).toEqual(adjusted));

  test('never below the p-value, never above one or m times it; gaps stay', () => {
    holds(
      fc.property(pValues, (given) => {
        const count = given.filter((p) => p !== null).length;
        holmAdjusted(given).forEach((adjusted, index) => {
          const p = given[index] ?? null;
          expect(adjusted === null).toBe(p === null);
          expect(adjusted ?? 0).toBeGreaterThanOrEqual(p ?? 0);
          expect(adjusted ?? 0).toBeLessThanOrEqual(Math.min(1, count * (p ?? 0)));
        });
      }),
    );
  });

  test('keeps the order, and equal stays equal', () => {
    holds(
      fc.property(pValues, (given) => {
        const adjusted = holmAdjusted(given);
        byPair(given, (i, j) => {
          const [first, second] = [given[i] ?? null, given[j] ?? null];
          if (first === null || second === null || first > second) return;
          expect(adjusted[i] ?? 2).toBeLessThanOrEqual(adjusted[j] ?? -1);
          if (first === second) expect(adjusted[i]).toBe(adjusted[j]);
        });
      }),
    );
  });

  test('a further test never makes a p-value smaller', () => {
    holds(
      fc.property(pValues, fc.double({ min: 0, max: 1, noNaN: true }), (given, further) => {
        const alone = holmAdjusted(given);
        holmAdjusted([...given, further])
          .slice(0, given.length)
          .forEach((adjusted, index) => {
            if (adjusted !== null) expect(adjusted).toBeGreaterThanOrEqual(alone[index] ?? 2);
          });
      }),
    );
  });

  test('a p-value outside [0, 1] is a bug of the caller', () => {
    expect(() => holmAdjusted([1.1])).toThrow('holmAdjusted: a p-value lies in [0, 1], got 1.1');
    expect(() => holmAdjusted([-0.1])).toThrow(RangeError);
    expect(() => holmAdjusted([Number.NaN])).toThrow(RangeError);
  });
});
