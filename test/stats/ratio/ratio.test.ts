import { describe, expect, test } from 'vitest';
import { ratioInterval } from '../../../src/stats/ratio/interval.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level95 } from '../levels.ts';

describe('ratioInterval', () => {
  // mpmath 1.3.0 at 40 digits, rounded to doubles: the distribution of Φ(t·s − δ) integrated over s, the root found by secants.
  // 1e-9 relative: the noncentrality is found by a search on a tail that is itself good to 1e-12 or so.
  test.each([
    ['10', -0.3576395031423108, -0.9893182677272151, 0.29231559757662645],
    ['60', -0.006337371681129113, -0.2593434119773513, 0.2467222579275428],
  ])('DAX over %s returns', (window, ratio, lower, upper) => {
    const found = accepted(ratioInterval(indexReturns('DAX', window), level95));
    expect(relativeError(found.ratio, ratio)).toBeLessThan(1e-10);
    expect(relativeError(found.lower, lower)).toBeLessThan(1e-9);
    expect(relativeError(found.upper, upper)).toBeLessThan(1e-9);
  });

  test('a mean of zero gives a symmetric interval', () => {
    const { ratio, lower, upper } = accepted(ratioInterval([-0.02, -0.01, 0, 0.01, 0.02], level95));
    expect(ratio).toBe(0);
    expect(relativeError(upper, -lower)).toBeLessThan(1e-12);
  });

  test('turning the sign of the returns mirrors the interval', () => {
    const returns = indexReturns('DAX', '60');
    const there = accepted(ratioInterval(returns, level95));
    const back = accepted(
      ratioInterval(
        returns.map((value) => -value),
        level95,
      ),
    );
    expect(relativeError(back.lower, -there.upper)).toBeLessThan(1e-12);
    expect(relativeError(back.upper, -there.lower)).toBeLessThan(1e-12);
  });

  test('refusals', () => {
    expect(refusalCode(ratioInterval([0.1], level95))).toBe('tooFewReturns');
    expect(refusalMessage(ratioInterval([0.1], level95))).toMatch(
      /^An interval for the ratio of mean to standard deviation needs at least 2 returns/,
    );
    expect(refusalCode(ratioInterval([0.1, 0.1], level95))).toBe('priceDoesNotMove');
  });
});
