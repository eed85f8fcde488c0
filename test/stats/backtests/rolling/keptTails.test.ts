import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { createKeptTails } from '../../../../src/stats/backtests/rolling/keptTails.ts';
import { createSortedLosses } from '../../../../src/stats/backtests/rolling/sortedLosses.ts';
import { level } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';

describe('losses kept in order', () => {
  test('after every step the window is that of a fresh sort', () => {
    const returns = fc.array(fc.integer({ min: -6, max: 6 }), { minLength: 3, maxLength: 60 });
    fc.assert(
      fc.property(returns, fc.integer({ min: 1, max: 20 }), (values, wanted) => {
        const size = Math.min(wanted, values.length - 1);
        const sorted = createSortedLosses(Float64Array.from(values.slice(0, size)));
        for (let day = size; day < values.length; day += 1) {
          sorted.replace(0 - (values[day - size] ?? 0), 0 - (values[day] ?? 0));
          const fresh = values.slice(day - size + 1, day + 1).map((value) => 0 - value);
          expect([...sorted.values]).toEqual([...Float64Array.from(fresh).sort()]);
        }
      }),
      { seed: 250, numRuns: 200 },
    );
  });
});

describe('draws beyond an empirical VaR', () => {
  // Losses 1 … 50 at 95%: k = 48, n(1 − a) = 2.5, so 50 and 49 weigh 1 each and 48 weighs ½.
  const span = {
    returns: new Float64Array(60),
    firstDay: 50,
    dayCount: 2,
    estimationReturns: 50,
    tailLevel: level('0.95'),
  };
  const tails = createKeptTails(span);
  tails.keep(
    50,
    Float64Array.from({ length: 50 }, (_, index) => index + 1),
  );
  tails.keep(
    51,
    Float64Array.from({ length: 50 }, (_, index) => 100 * (index + 1)),
  );

  test('shares of the worst losses', () => {
    const random = testStreams(2).stream(0);
    const count = 50_000;
    const drawn = Float64Array.from({ length: count }, () => tails.draw(50, random));
    const share = (loss: number) => drawn.filter((value) => value === loss).length / count;
    // 0.4, 0.4, 0.2 within four binomial standard errors of 50,000 draws (0.0022).
    expect(Math.abs(share(50) - 0.4)).toBeLessThan(0.009);
    expect(Math.abs(share(49) - 0.4)).toBeLessThan(0.009);
    expect(Math.abs(share(48) - 0.2)).toBeLessThan(0.009);
    expect(share(50) + share(49) + share(48)).toBe(1);
  });

  test('each day draws from its own', () => {
    expect(tails.draw(51, testStreams(2).stream(1))).toBeGreaterThanOrEqual(4800);
  });
});
