import { describe, expect, test } from 'vitest';
import { welchMeanDifference } from '../../../src/stats/comparisons/meanDifference.ts';
import { brownForsytheTest } from '../../../src/stats/comparisons/spread.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { fixtureJson } from '../readFixture.ts';

type Case = {
  readonly name: string;
  readonly recomputed: Readonly<Record<string, number>>;
};
type OneSample = Case & { readonly data: readonly number[] };
type TwoSamples = Case & {
  readonly data: Readonly<Record<'us_miles_per_gallon' | 'japan_miles_per_gallon', readonly number[]>>;
};

const handbook = fixtureJson<{ readonly cases: readonly Case[] }>('nist-handbook.json').cases;
const isNamed =
  <T extends Case>(name: string) =>
  (one: Case): one is T =>
    one.name === name;
const caseNamed = <T extends Case>(name: string): T => {
  const found = handbook.find(isNamed<T>(name));
  if (found === undefined) throw new Error(`the handbook fixture has no case ${name}`);
  return found;
};

describe('NIST/SEMATECH e-Handbook', () => {
  test('1.3.5.3, AUTO83B with unequal variances', () => {
    const { recomputed } = caseNamed('two_sample_t_unequal_variances_auto83b');
    const { data } = caseNamed<TwoSamples>('two_sample_t_pooled_auto83b');
    const actual = accepted(
      welchMeanDifference(data.us_miles_per_gallon, data.japan_miles_per_gallon, { digits: 95, places: 2 }),
    );
    // Recomputed with mpmath at 40 digits, printed to 16.
    expect(relativeError(actual.t, recomputed['t'] ?? 0)).toBeLessThan(1e-13);
    expect(relativeError(actual.degreesOfFreedom, recomputed['df'] ?? 0)).toBeLessThan(1e-13);
    expect(relativeError(actual.p, recomputed['p_value'] ?? 0)).toBeLessThan(1e-12);
    expect(relativeError(actual.lower, recomputed['lower_95_difference'] ?? 0)).toBeLessThan(1e-13);
    expect(relativeError(actual.upper, recomputed['upper_95_difference'] ?? 0)).toBeLessThan(1e-13);
    // The printed statistic, −12.94627, as printed.
    expect(actual.t.toFixed(5)).toBe('-12.94627');
  });

  test('1.3.5.10, median version over the ten batches of GEAR', () => {
    const { recomputed } = caseNamed('brown_forsythe_gear');
    const { data } = caseNamed<OneSample>('chi_square_sd_gear');
    const batches = Array.from({ length: 10 }, (_, batch) => data.slice(10 * batch, 10 * batch + 10));
    const actual = brownForsytheTest(batches);
    // The data have three decimals near 1 and spread by 0.006: doubles carry about 13 digits of the distances.
    expect(relativeError(actual?.statistic ?? 0, recomputed['W'] ?? 0)).toBeLessThan(1e-12);
    expect(relativeError(actual?.p ?? 0, recomputed['p_value'] ?? 0)).toBeLessThan(1e-12);
  });
});
