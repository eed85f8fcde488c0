import { describe, expect, test } from 'vitest';
import { refuseStill, refuseTooFew, refuseUnusable } from '../../../src/stats/returns/leastCounts.ts';
import { doesNotMove } from '../../../src/stats/returns/movement.ts';

describe('doesNotMove', () => {
  test.each([
    ['nothing at all', [], true],
    ['zeros', [0, 0, 0], true],
    ['one return', [0.01], true],
    ['the same growth up to rounding', [0.01, 0.01 + 1e-15], true],
    ['a spread just above the rule', [0, 1.01e-12], false],
    ['a spread at the rule', [0, 1e-12], true],
    ['the rule is relative above one', [1000, 1000 + 0.9e-9], true],
    ['and moves beyond it', [1000, 1000 + 1.2e-9], false],
    ['the sign of the largest does not matter', [-1000, -1000 - 0.9e-9], true],
  ])('%s', (_, returns, still) => {
    expect(doesNotMove(returns)).toBe(still);
  });
});

describe('refusals', () => {
  test('too few returns names the count that would do', () => {
    const refusal = refuseTooFew(9, 10, 'A bootstrap interval');
    expect(refusal?.problem).toMatchObject({ code: 'tooFewReturns', needs: 10 });
    expect(refusal?.problem.message).toBe(
      'A bootstrap interval needs at least 10 returns, and there are 9. Ask for a window of 10 days or more.',
    );
    expect(refuseTooFew(1, 10, 'A mean')?.problem.message).toContain('and there is 1. Ask');
    expect(refuseTooFew(10, 10, 'A bootstrap interval')).toBeNull();
  });

  test('a price that stands still is refused in words', () => {
    expect(refuseStill([0, 0], 'A mean')?.problem).toMatchObject({
      code: 'priceDoesNotMove',
      message:
        'A mean needs returns that differ, and all 2 are zero: the price does not move. Check the feed, or ask for a longer window.',
    });
    expect(refuseStill([0.01, 0.01, 0.01], 'A mean')?.problem.message).toContain(
      'all 3 are the same, 0.01: the price',
    );
    expect(refuseStill([0, 0.01], 'A mean')).toBeNull();
  });

  test('the count is checked before the movement', () => {
    expect(refuseUnusable([0], 2, 'A mean')?.problem.code).toBe('tooFewReturns');
    expect(refuseUnusable([0, 0], 2, 'A mean')?.problem.code).toBe('priceDoesNotMove');
    expect(refuseUnusable([0, 1], 2, 'A mean')).toBeNull();
  });
});
