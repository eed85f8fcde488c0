import { describe, expect, test } from 'vitest';
import { lag1Autocorrelation, ljungBox } from '../../../src/stats/dependence/autocorrelation.ts';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { jarqueBera } from '../../../src/stats/moments/jarqueBera.ts';
import { shapeOf } from '../../../src/stats/moments/shape.ts';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { chiSquareInterval } from '../../../src/stats/spread/chiSquareInterval.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson, indexCloses } from '../readFixture.ts';

type Ends = { readonly lower: number; readonly upper: number };
type Statistic = { readonly statistic: number; readonly p_value: number };
type WindowCase = {
  readonly ticker: string;
  readonly window: string;
  readonly n: number;
  readonly mean: number;
  readonly standard_deviation: number;
  readonly t_interval_mean: Readonly<Record<string, Ends>>;
  readonly chi_square_interval_sd_95: Ends;
  readonly lag1_autocorrelation: number;
  readonly ljung_box_10: Statistic | null;
  readonly skewness_g1: number;
  readonly excess_kurtosis_g2: number;
  readonly jarque_bera: Statistic;
};

// Computed with mpmath 1.2.1 at 40 digits from the closes, and again in R 4.2.2; both agree to 11 or more digits, hence
// a relative tolerance of 1e-10 throughout. The file's Ljung-Box takes 10 lags at every count.
const { cases } = fixtureJson<{ readonly cases: readonly (WindowCase | { readonly pair: string })[] }>(
  'eu-indices/reference.json',
);
const windows = cases.filter((found): found is WindowCase => 'ticker' in found);

test('the reference holds five windows of two indices', () => {
  expect(windows.length).toBe(10);
});

describe.each(windows)('$ticker over $window returns', (reference) => {
  const returns = simpleReturns(indexCloses(reference.ticker).slice(-reference.n - 1));
  const near = (actual: number | null, expected: number) =>
    expect(relativeError(actual ?? Number.NaN, expected)).toBeLessThan(1e-10);

  test('mean and its intervals', () => {
    expect(Object.keys(reference.t_interval_mean)).toEqual(['0.9', '0.95', '0.99', '0.999']);
    for (const [text, ends] of Object.entries(reference.t_interval_mean)) {
      const interval = accepted(meanInterval(returns, level(text), 'both'));
      near(interval.mean, reference.mean);
      near(interval.sampleStandardDeviation, reference.standard_deviation);
      near(interval.lower, ends.lower);
      near(interval.upper, ends.upper);
    }
  });

  test('chi-square interval of the standard deviation', () => {
    const interval = accepted(chiSquareInterval(returns, level95));
    near(interval.lower, reference.chi_square_interval_sd_95.lower);
    near(interval.upper, reference.chi_square_interval_sd_95.upper);
  });

  test('autocorrelation', () => {
    near(lag1Autocorrelation(returns), reference.lag1_autocorrelation);
    if (reference.ljung_box_10 === null) {
      expect(() => ljungBox(returns, 10)).toThrow(RangeError);
      return;
    }
    const { q, p } = ljungBox(returns, 10);
    near(q, reference.ljung_box_10.statistic);
    near(p, reference.ljung_box_10.p_value);
  });

  test('shape', () => {
    const { skewness, excessKurtosis } = shapeOf(returns);
    near(skewness, reference.skewness_g1);
    near(excessKurtosis, reference.excess_kurtosis_g2);
    const { statistic, p } = jarqueBera(returns);
    near(statistic, reference.jarque_bera.statistic);
    near(p, reference.jarque_bera.p_value);
  });
});
