import { describe, expect, test } from 'vitest';
import { brownForsytheTest, pairedSpreadTest } from '../../../src/stats/comparisons/spread.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';

describe('paired spread of DAX and SMI', () => {
  // SciPy 1.17.1: scipy.stats.ttest_1samp(abs(a - median(a)) - abs(b - median(b)), 0) on the fixture's returns.
  test.each([
    ['60', 0.5384470919919135, 0.5922941539830541],
    ['250', 4.050153934541774, 6.840951893152724e-5],
  ])('last %s returns', (window, statistic, p) => {
    const actual = pairedSpreadTest(indexReturns('DAX', window), indexReturns('SMI', window));
    // Good to about 14 digits there; the differences of distances lose one or two.
    expect(relativeError(actual?.statistic ?? 0, statistic)).toBeLessThan(1e-11);
    expect(relativeError(actual?.p ?? 0, p)).toBeLessThan(1e-11);
  });

  test('swapping the two turns the sign only', () => {
    const dax = indexReturns('DAX', '60');
    const smi = indexReturns('SMI', '60');
    const forward = pairedSpreadTest(dax, smi);
    const backward = pairedSpreadTest(smi, dax);
    expect(backward?.statistic).toBe(-(forward?.statistic ?? 0));
    expect(backward?.p).toBe(forward?.p);
  });
});

describe('two periods', () => {
  test('DAX, the 60 returns before the last 60 against the last 60', () => {
    const returns = indexReturns('DAX', '120');
    const actual = brownForsytheTest([returns.slice(0, 60), returns.slice(60)]);
    // SciPy 1.17.1: scipy.stats.levene(a, b, center='median'), good to about 13 digits for so small a statistic.
    expect(relativeError(actual?.statistic ?? 0, 0.006264576262248694)).toBeLessThan(1e-10);
    expect(relativeError(actual?.p ?? 0, 0.9370481178524325)).toBeLessThan(1e-12);
  });
});

describe('the least that can be tested', () => {
  // SciPy 1.17.1: scipy.stats.levene(a, b, center='median'), ttest_1samp(abs(a - median(a)) - abs(b - median(b)), 0).
  test.each([
    [
      [1, 2, 4],
      [1, 5, 30],
      [1.2426470588235292, 0.3274179261060634],
    ],
    [
      [1, -1, 1, -1],
      [1, 2, 4, 9],
      [1.588235294117647, 0.25437353970150745],
    ],
  ] as const)('%j against %j', (first, second, [statistic, p]) => {
    const actual = brownForsytheTest([first, second]);
    // Small whole numbers lose nothing on the way; SciPy's F is good to about 13 digits.
    expect(relativeError(actual?.statistic ?? 0, statistic)).toBeLessThan(1e-12);
    expect(relativeError(actual?.p ?? 0, p)).toBeLessThan(1e-12);
  });

  test('three pairs', () => {
    const actual = pairedSpreadTest([1, 2, 4], [1, 5, 30]);
    expect(relativeError(actual?.statistic ?? 0, -1.2005684510029864)).toBeLessThan(1e-12);
    expect(relativeError(actual?.p ?? 0, 0.3528252229347988)).toBeLessThan(1e-12);
  });
});

describe('nothing to test', () => {
  test('a group of two lies at one distance from its median', () => {
    expect(
      brownForsytheTest([
        [1, 2],
        [3, 4, 9],
      ]),
    ).toBeNull();
    expect(brownForsytheTest([[1, 2, 3]])).toBeNull();
    expect(pairedSpreadTest([1, 2], [3, 9])).toBeNull();
    expect(pairedSpreadTest([], [])).toBeNull();
  });

  test('distances that do not vary, exactly or but for rounding', () => {
    expect(
      brownForsytheTest([
        [1, -1, 1, -1],
        [2, -2, 2, -2],
      ]),
    ).toBeNull();
    expect(
      brownForsytheTest([
        [0.1, 0.3, 0.1, 0.3],
        [0.7, 0.1, 0.7, 0.1],
      ]),
    ).toBeNull();
    expect(pairedSpreadTest([1, 2, 3], [3, 4, 5])).toBeNull();
  });
});
