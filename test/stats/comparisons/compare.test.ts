import { describe, expect, test } from 'vitest';
import { adjustedForSeveral, type CompareQuestion, compare } from '../../../src/stats/comparisons/compare.ts';
import { deviationRatio } from '../../../src/stats/comparisons/deviationRatio.ts';
import { brownForsytheTest } from '../../../src/stats/comparisons/spread.ts';
import { volatilityClustering } from '../../../src/stats/dependence/clustering.ts';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { indexReturns } from '../indexWindows.ts';
import { level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const dax = indexReturns('DAX', '120');
const smi = indexReturns('SMI', '120');

const question = (more: Partial<CompareQuestion>): CompareQuestion => ({
  first: dax.slice(60),
  second: smi.slice(60),
  paired: true,
  level: level95,
  streams: testStreams(5),
  ...more,
});

describe('ratio of standard deviations, BCa', () => {
  // SciPy 1.17.1: scipy.stats.bootstrap((a, b), log(std(a)/std(b)), paired=…, method='BCa', n_resamples=99999,
  // random_state=1), exponentiated. The deviation of ln(s1/s2) is 0.13 at most; with 99,999 resamples on both sides an end
  // has a Monte Carlo error of 0.0021 (the quantile's own 0.0011, and twice that of the bias correction, both times √2):
  // 0.006 is three of them.
  test('DAX against SMI, paired: 0.907 to 1.237', () => {
    const ratio = accepted(deviationRatio(question({ replicates: 99_999 })));
    expect(ratio.method).toBe('bca');
    expect(ratio.ratio).toBeCloseTo(1.04381460869501, 13);
    expect(Math.abs(ratio.lower - 0.90726628)).toBeLessThan(0.006);
    expect(Math.abs(ratio.upper - 1.23652558)).toBeLessThan(0.006);
  });

  test('DAX, two periods: 0.731 to 1.205', () => {
    const periods = question({
      first: dax.slice(0, 60),
      second: dax.slice(60),
      paired: false,
      replicates: 99_999,
    });
    const ratio = accepted(deviationRatio(periods));
    expect(ratio.method).toBe('bca');
    expect(ratio.ratio).toBeCloseTo(0.9354274116384244, 13);
    expect(Math.abs(ratio.lower - 0.73132699)).toBeLessThan(0.006);
    expect(Math.abs(ratio.upper - 1.2048249)).toBeLessThan(0.006);
  });

  test('the same streams give the same bits', () => {
    expect(deviationRatio(question({ replicates: 199 }))).toEqual(
      deviationRatio(question({ replicates: 199 })),
    );
  });

  test('a series against itself scaled: the ratio is certain', () => {
    const doubled = dax.map((value) => 2 * value);
    const ratio = accepted(deviationRatio(question({ first: doubled, second: dax, replicates: 199 })));
    expect(ratio.ratio).toBe(2);
    expect([ratio.lower, ratio.upper]).toEqual([2, 2]);
  });
});

describe('a ratio of standard deviations is refused', () => {
  const figure = 'An interval for the ratio of two standard deviations';
  const periods = (first: ArrayLike<number>, second: ArrayLike<number>) =>
    deviationRatio(question({ first, second, paired: false, replicates: 199 }));

  test('where either has fewer than ten returns', () => {
    expect(refusalMessage(periods(dax.slice(0, 9), smi))).toContain(
      `${figure} needs at least 10 returns, and there are 9.`,
    );
    expect(refusalMessage(periods(dax, smi.slice(0, 8)))).toContain(
      `${figure} needs at least 10 returns, and there are 8.`,
    );
  });

  test('where pairs are not as many', () => {
    expect(() => deviationRatio(question({ first: dax, replicates: 199 }))).toThrow(
      'deviationRatio: 120 and 60 returns are not pairs',
    );
  });

  test('where the resamples do not reach both ends, drawn singly or in blocks', () => {
    // (19 + 1)·0.025 is half a rank: one end at 95% would be the first of them, two ends are none.
    expect(refusalCode(deviationRatio(question({ replicates: 19 })))).toBe('levelOutside');
    const all = { first: indexReturns('DAX', 'all'), second: indexReturns('SMI', 'all') };
    expect(refusalCode(deviationRatio(question({ ...all, replicates: 19 })))).toBe('levelOutside');
    expect(accepted(deviationRatio(question({ ...all, replicates: 39 }))).method).toBe('stationary');
  });
});

test('clustered squares are drawn in blocks', () => {
  const ratio = accepted(
    deviationRatio(
      question({ first: indexReturns('DAX', 'all'), second: indexReturns('SMI', 'all'), replicates: 199 }),
    ),
  );
  expect(ratio.method).toBe('stationary');
  expect(ratio.lower).toBeLessThan(ratio.ratio);
  expect(ratio.upper).toBeGreaterThan(ratio.ratio);
});

test('one clustered series is enough for blocks', () => {
  const random = testStreams(33).stream(0);
  const steady = Float64Array.from({ length: 250 }, () => nextNormal(random));
  expect(volatilityClustering(steady).p).toBeGreaterThan(0.05);
  const first = indexReturns('DAX', 'all');
  expect(volatilityClustering(first).p).toBeLessThan(0.05);
  const asked = { paired: false, replicates: 199 };
  for (const pair of [
    { first, second: steady },
    { first: steady, second: first },
  ])
    expect(accepted(deviationRatio(question({ ...pair, ...asked }))).method).toBe('stationary');
});

test('of a clustered and an unclustered series the longer blocks are taken', () => {
  // Fifty calm days, fifty wild ones, beside independent days; then the same values with calm and wild alternating.
  const random = testStreams(31).stream(0);
  const steady = Float64Array.from({ length: 500 }, () => nextNormal(random));
  const sizes = Float64Array.from({ length: 500 }, () => nextNormal(random));
  const runs = sizes.map((size, day) => (day % 100 < 50 ? 1 : 4) * size);
  const alternating = sizes.map((size, day) => (day % 2 === 0 ? 1 : 4) * size);
  const width = (first: Float64Array) => {
    const { lower, upper } = accepted(deviationRatio(question({ first, second: steady, replicates: 999 })));
    return Math.log(upper / lower);
  };
  // Blocks of one day would leave the width as it is for alternating days, near 0.3.
  expect(width(runs)).toBeGreaterThan(1.5 * width(alternating));
});

describe('compare', () => {
  test('two tickers are paired, two periods are not', () => {
    const tickers = accepted(compare(question({ replicates: 199 })));
    expect([tickers.kind, tickers.spreadTest]).toEqual(['paired', 'pairedAbsoluteDeviation']);
    expect(tickers.ratio).not.toBeNull();
    const periods = accepted(
      compare(question({ first: dax.slice(0, 40), second: dax.slice(40), paired: false, replicates: 199 })),
    );
    expect([periods.kind, periods.spreadTest]).toEqual(['welch', 'brownForsythe']);
    expect(periods.mean.degreesOfFreedom).toBeGreaterThan(39);
    expect(periods.mean.degreesOfFreedom).toBeLessThan(118);
    expect(periods.spread).toEqual(brownForsytheTest([dax.slice(0, 40), dax.slice(40)]));
  });

  test('nine returns have no ratio, and the rest stands', () => {
    const comparison = accepted(compare(question({ first: dax.slice(0, 9), second: smi.slice(0, 9) })));
    expect(comparison.ratio).toBeNull();
    expect(comparison.ratioProblem?.code).toBe('tooFewReturns');
    expect(comparison.mean.degreesOfFreedom).toBe(8);
  });

  test('refusals', () => {
    expect(refusalCode(compare(question({ second: dax.slice(60) })))).toBe('priceDoesNotMove');
    expect(refusalCode(compare(question({ first: [0.1], second: [0.2] })))).toBe('tooFewReturns');
    expect(refusalCode(compare(question({ first: [0.1, 0.1], paired: false })))).toBe('priceDoesNotMove');
    expect(() => compare(question({ first: [1, 2, 4] }))).toThrow(RangeError);
  });

  test('each refusal names what cannot be had', () => {
    const message = (more: Partial<CompareQuestion>) => refusalMessage(compare(question(more)));
    expect(message({ first: [0.1], second: [0.2] })).toContain(
      'A comparison of two tickers needs at least 2 returns',
    );
    // Binary fractions, so that both differences are 0.25 exactly.
    expect(message({ first: [0.5, 0.75], second: [0.25, 0.5] })).toContain(
      'the two differ by the same 0.25 on all 2 days',
    );
    const one = { paired: false, first: [0.1] };
    expect(message(one)).toContain('The first period of a comparison needs at least 2 returns');
    const other = { paired: false, second: [0.1] };
    expect(message(other)).toContain('The second period of a comparison needs at least 2 returns');
    expect(() => compare(question({ first: [1, 2, 4] }))).toThrow(
      'pairedDifferences: 3 and 60 returns are not pairs',
    );
  });

  test('a comparison without a test of spread has no adjusted p for it', () => {
    const full = accepted(compare(question({ replicates: 199 })));
    const two = accepted(compare(question({ first: [0.1, 0.2], second: [0.4, 0.1] })));
    expect(two.spread).toBeNull();
    expect(adjustedForSeveral([full, two]).map(({ spread }) => spread)).toEqual([full.spread?.p, null]);
  });

  test('several at once: means and spreads adjusted each among themselves', () => {
    const one = accepted(compare(question({ replicates: 199 })));
    const other = accepted(compare(question({ second: dax.slice(0, 60), replicates: 199 })));
    const [first, second] = adjustedForSeveral([one, other]);
    const [low, high] = [one.mean.p, other.mean.p].sort((a, b) => a - b);
    expect(Math.min(first?.mean ?? 0, second?.mean ?? 0)).toBe(Math.min(1, 2 * (low ?? 0)));
    expect(Math.max(first?.mean ?? 0, second?.mean ?? 0)).toBe(
      Math.max(Math.min(1, 2 * (low ?? 0)), high ?? 0),
    );
    expect(first?.spread).toBeGreaterThanOrEqual(one.spread?.p ?? 2);
  });
});
