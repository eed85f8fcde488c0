import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { putLargestLast } from '../../../src/stats/numerics/selection.ts';

const seed = 20_261_201;

const tailOf = (values: readonly number[], count: number): readonly number[] => {
  const reordered = Float64Array.from(values);
  putLargestLast(reordered, count);
  return [...reordered.subarray(values.length - count)];
};

/** Of what a sort would leave there: the numbers are only moved, so the comparison is exact. */
const sortedTail = (values: readonly number[], count: number): readonly number[] =>
  values.toSorted((a, b) => a - b).slice(values.length - count);

// Few different values make ties, which a split must not run past.
const samples = fc.oneof(
  fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { maxLength: 400 }),
  fc.array(fc.integer({ min: 0, max: 5 }), { maxLength: 400 }),
);

describe('the largest values last', () => {
  test('are those of a sort, and nothing is lost', () => {
    fc.assert(
      fc.property(samples, fc.double({ min: 0, max: 1, noNaN: true }), (values, share) => {
        // A sort tells −0 from 0, and losses have no −0.
        const plain = values.map((value) => value + 0);
        const count = Math.round(share * plain.length);
        expect(tailOf(plain, count)).toEqual(sortedTail(plain, count));
        expect(tailOf(plain, count).length).toBe(count);
        const reordered = Float64Array.from(plain);
        putLargestLast(reordered, count);
        expect([...reordered].sort((a, b) => a - b)).toEqual(plain.toSorted((a, b) => a - b));
      }),
      { seed, numRuns: 300 },
    );
  });

  const ramp = Array.from({ length: 1_000 }, (_, index) => index);
  test.each([
    ['ascending', ramp],
    ['descending', ramp.toReversed()],
    ['all equal', ramp.map(() => 7)],
    ['rising and falling', [...ramp, ...ramp.toReversed()]],
    ['two values', ramp.map((value) => value % 2)],
  ] as const)('%s', (_, values) => {
    for (const count of [0, 1, 25, 500, values.length - 1, values.length])
      expect(tailOf(values, count)).toEqual(sortedTail(values, count));
  });
});
