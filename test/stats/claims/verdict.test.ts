import { expect, test } from 'vitest';
import { verdictOn } from '../../../src/stats/claims/verdict.ts';

// The rule by hand, in basis points.
test.each([
  [20, -21, 34, 'cannot tell'],
  [20, -21, 19, 'contradicted'],
  [20, 5, 34, 'consistent'],
  [20, 20, 34, 'consistent'],
  [20, 0, 34, 'cannot tell'],
  [-20, -34, -20, 'consistent'],
  [0, -5, 5, 'consistent'],
  [0, -6, 6, 'cannot tell'],
  [0, 1, 3, 'contradicted'],
  [20, 5, null, 'consistent'],
  [20, 21, null, 'contradicted'],
  [20, -1, null, 'cannot tell'],
  [20, null, 19, 'contradicted'],
  [-20, null, 19, 'cannot tell'],
] as const)('claimed %d in %s to %s: %s', (claimed, lower, upper, verdict) => {
  const estimate = lower === null ? (upper ?? 0) - 5 : upper === null ? lower + 5 : (lower + upper) / 2;
  expect(verdictOn({ claimed, estimate, ends: { lower, upper }, smallestThatMatters: 5 })).toBe(verdict);
});

// By hand: the estimate 1 is 7 from the farther end of a two-sided interval, 5 or 6 from the one end of the others.
test.each([
  [-6, 3, 6.5, 'cannot tell'],
  [-6, 3, 7, 'consistent'],
  [-1, 8, 6.5, 'cannot tell'],
  [-1, 8, 7, 'consistent'],
  [-4, null, 5, 'consistent'],
  [-5, null, 5, 'cannot tell'],
  [null, 6, 5, 'consistent'],
  [null, 7, 5, 'cannot tell'],
] as const)(
  'a claim of zero in %s to %s, where %d matters: %s',
  (lower, upper, smallestThatMatters, verdict) => {
    expect(verdictOn({ claimed: 0, estimate: 1, ends: { lower, upper }, smallestThatMatters })).toBe(verdict);
  },
);

test('the end that a one-sided interval does not have adds nothing to its half-width', () => {
  // By hand: the one end is 1 from the estimate, which itself is 4 from zero.
  const judge = (estimate: number, lower: number | null, upper: number | null) =>
    verdictOn({ claimed: 0, estimate, ends: { lower, upper }, smallestThatMatters: 2 });
  expect(judge(4, null, 5)).toBe('consistent');
  expect(judge(-4, -5, null)).toBe('consistent');
});
