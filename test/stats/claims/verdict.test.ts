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
] as const)('claimed %d in %s to %s: %s', (claimed, lower, upper, verdict) => {
  const estimate = lower === null ? (upper ?? 0) - 5 : upper === null ? lower + 5 : (lower + upper) / 2;
  expect(verdictOn({ claimed, estimate, ends: { lower, upper }, smallestThatMatters: 5 })).toBe(verdict);
});
