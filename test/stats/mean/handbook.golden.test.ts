import { describe, expect, test } from 'vitest';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { chiSquareInterval } from '../../../src/stats/spread/chiSquareInterval.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';

type HandbookCase = {
  readonly name: string;
  readonly recomputed: Readonly<Record<string, number>>;
  readonly data: readonly number[];
};

const handbook = fixtureJson<{ readonly cases: readonly HandbookCase[] }>('nist-handbook.json');

const caseNamed = (name: string): HandbookCase => {
  const found = handbook.cases.find((one) => one.name === name);
  if (found === undefined) throw new Error(`no case ${name} in the fixture`);
  return found;
};

// NIST/SEMATECH e-Handbook, recomputed with mpmath 1.2.1 at 40 digits; 1e-12 is what the quantiles promise, with room
// for the difference that a mean near 9.26 minus a width near 0.003 takes from it.
const near = (actual: number | null, expected: number | undefined) =>
  expect(relativeError(actual ?? Number.NaN, expected ?? Number.NaN)).toBeLessThan(1e-12);

describe('heat flow meter calibration, section 1.3.5.2', () => {
  const { recomputed, data } = caseNamed('confidence_limits_mean_zarr13');
  const both = accepted(meanInterval(data, level95, 'both'));

  test('two-sided limits', () => {
    near(both.mean, recomputed.mean);
    near(both.sampleStandardDeviation, recomputed.standard_deviation);
    near(both.criticalT, recomputed.t_critical_95_two_sided);
    near(both.lower, recomputed.lower_95);
    near(both.upper, recomputed.upper_95);
    // As printed in the handbook, to its six decimals.
    expect(both.lower?.toFixed(6)).toBe('9.258242');
    expect(both.upper?.toFixed(6)).toBe('9.264679');
  });

  test('one-sample t against 5', () => {
    near((both.mean - 5) / both.standardError, recomputed.one_sample_t_against_5);
  });

  test('one-sided limits take the whole of the other 5%', () => {
    const above = accepted(meanInterval(data, level95, 'above'));
    const below = accepted(meanInterval(data, level95, 'below'));
    near(above.criticalT, recomputed.t_critical_95_one_sided);
    near(below.criticalT, recomputed.t_critical_95_one_sided);
    near(above.lower, both.mean - above.criticalT * both.standardError);
    near(below.upper, both.mean + below.criticalT * both.standardError);
    expect([above.upper, above.normalUpper, below.lower, below.normalLower]).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });
});

describe('gear diameters, section 1.3.5.8', () => {
  test('limits of the standard deviation', () => {
    const { recomputed, data } = caseNamed('chi_square_sd_gear');
    const { lower, upper } = accepted(chiSquareInterval(data, level95));
    near(lower, recomputed.sd_lower_95);
    near(upper, recomputed.sd_upper_95);
    // As printed, to four decimals.
    expect([lower.toFixed(4), upper.toFixed(4)]).toEqual(['0.0055', '0.0073']);
  });
});
