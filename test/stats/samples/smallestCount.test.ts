import fc from 'fast-check';
import { expect, test } from 'vitest';
import { smallestCount } from '../../../src/stats/samples/internal/smallestCount.ts';

test('finds the first count that is enough, from any guess', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: 5000 }),
      fc.double({ min: -10, max: 6000, noNaN: true }),
      (first, guess) => {
        expect(smallestCount((count) => count >= first, guess)).toBe(Math.max(2, first));
      },
    ),
    { seed: 2, numRuns: 500 },
  );
});

test.each([2, 3, 4, 5])('from a guess of %i down to 2', (guess) => {
  expect(smallestCount(() => true, guess)).toBe(2);
});
