import { describe, expect, test } from 'vitest';
import { pairedMeanDifference, welchMeanDifference } from '../../../src/stats/comparisons/meanDifference.ts';
import { brownForsytheTest } from '../../../src/stats/comparisons/spread.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { fixtureJson } from '../readFixture.ts';

type Test = { readonly t: number; readonly df: number; readonly p_value: number };
type Ends = { readonly lower95: number; readonly upper95: number };
type Pair = {
  readonly pair: string;
  readonly window: string;
  readonly welch: Test & Ends;
  readonly paired: Test & Ends & { readonly mean_difference: number };
  readonly brown_forsythe_median: { readonly F: number; readonly p_value: number };
};

const pairs = fixtureJson<{ readonly cases: readonly (Pair | { readonly ticker: string })[] }>(
  'eu-indices/reference.json',
).cases.filter((one): one is Pair => 'pair' in one);

const level = { digits: 95, places: 2 };

// mpmath 1.2.1 and R 4.2.2 agree to 12 digits. 1e-11 leaves room for differences of nearly equal means, whose relative
// error is that of the means times mean/difference.
const tolerance = 1e-11;

describe.each(pairs)('$pair, last $window returns', ({ window, welch, paired, brown_forsythe_median }) => {
  const dax = indexReturns('DAX', window);
  const smi = indexReturns('SMI', window);

  test('paired t', () => {
    const actual = accepted(pairedMeanDifference(dax, smi, level));
    expect(relativeError(actual.difference, paired.mean_difference)).toBeLessThan(tolerance);
    expect(relativeError(actual.t, paired.t)).toBeLessThan(tolerance);
    expect(relativeError(actual.p, paired.p_value)).toBeLessThan(tolerance);
    expect(actual.degreesOfFreedom).toBe(paired.df);
    expect(relativeError(actual.lower, paired.lower95)).toBeLessThan(tolerance);
    expect(relativeError(actual.upper, paired.upper95)).toBeLessThan(tolerance);
  });

  test('Welch', () => {
    const actual = accepted(welchMeanDifference(dax, smi, level));
    expect(relativeError(actual.t, welch.t)).toBeLessThan(tolerance);
    expect(relativeError(actual.degreesOfFreedom, welch.df)).toBeLessThan(tolerance);
    expect(relativeError(actual.p, welch.p_value)).toBeLessThan(tolerance);
    expect(relativeError(actual.lower, welch.lower95)).toBeLessThan(tolerance);
    expect(relativeError(actual.upper, welch.upper95)).toBeLessThan(tolerance);
  });

  test('Brown & Forsythe', () => {
    const actual = brownForsytheTest([dax, smi]);
    expect(relativeError(actual?.statistic ?? 0, brown_forsythe_median.F)).toBeLessThan(tolerance);
    expect(relativeError(actual?.p ?? 0, brown_forsythe_median.p_value)).toBeLessThan(tolerance);
  });
});
