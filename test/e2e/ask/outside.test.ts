/**
 * Every window of two index series, asked as a user would: `ask --json` on the CSV.
 * Source of the figures: test/fixtures/eu-indices/reference.json, computed with mpmath 1.2.1 at 40 digits and again with
 * R 4.2.2 (base functions t.test, Box.test); source of the closes: R datasets::EuStockMarkets (see PROVENANCE.md).
 * Tolerance: 1e-10 relative, as tight as the figures were made for.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { run } from './run.ts';

const fixtures = new URL('../../fixtures/eu-indices/', import.meta.url).pathname;

type Ends = { readonly lower: number; readonly upper: number };
type Case = {
  readonly ticker?: string;
  readonly window?: string;
  readonly n: number;
  readonly mean: number;
  readonly standard_deviation: number;
  readonly t_interval_mean: Readonly<Record<string, Ends>>;
  readonly chi_square_interval_sd_95: Ends;
  readonly lag1_autocorrelation: number;
  readonly skewness_g1: number;
  readonly excess_kurtosis_g2: number;
  readonly ljung_box_10: { readonly statistic: number; readonly p_value: number } | null;
};

const reference: { readonly cases: readonly Case[] } = JSON.parse(
  readFileSync(`${fixtures}reference.json`, 'utf8'),
);
const windows = reference.cases.filter(
  (each) => each.t_interval_mean !== undefined && each.ticker !== undefined,
);

const close = (actual: unknown, expected: number): void => {
  expect(Math.abs(Number(actual) - expected), `${String(actual)} against ${expected}`).toBeLessThanOrEqual(
    1e-10 * Math.abs(expected),
  );
};

const askFigures = async (questions: string): Promise<readonly Record<string, unknown>[]> => {
  const { code, stdout, stderr } = await run('ask', [
    '--feed',
    `${fixtures}eu-indices.csv`,
    '--json',
    questions,
  ]);
  expect(code, stderr).toBe(0);
  const { answers } = JSON.parse(stdout) as { answers: readonly { figures: Record<string, unknown> }[] };
  return answers.map(({ figures }) => figures);
};

test('the reference holds ten windows: two tickers at 10, 20, 60, 250 and all returns', () => {
  expect(windows.map(({ ticker, n }) => `${ticker} ${n}`).sort()).toEqual(
    ['DAX', 'SMI'].flatMap((ticker) => [10, 20, 60, 250, 1859].map((n) => `${ticker} ${n}`)).sort(),
  );
});

describe.each(windows)('$ticker over $window returns', (each) => {
  test('mean, deviation, intervals, autocorrelation and shape', async () => {
    const name = `${each.ticker} ${each.n === 1859 ? 'all' : `${each.n}d`}`;
    const [mean, vol] = await askFigures(`interval ${name} at 95%\ninterval vol ${name} at 95%`);
    close(mean?.['mean'], each.mean);
    close(mean?.['sampleStandardDeviation'], each.standard_deviation);
    close(mean?.['lower'], each.t_interval_mean['0.95']?.lower ?? Number.NaN);
    close(mean?.['upper'], each.t_interval_mean['0.95']?.upper ?? Number.NaN);
    close(mean?.['lag1Autocorrelation'], each.lag1_autocorrelation);
    close(mean?.['skewness'], each.skewness_g1);
    close(mean?.['excessKurtosis'], each.excess_kurtosis_g2);
    close(vol?.['lower'], each.chi_square_interval_sd_95.lower);
    close(vol?.['upper'], each.chi_square_interval_sd_95.upper);
    const ladder = (mean?.['ladder'] ?? []) as readonly (Ends & { confidenceLevel: number })[];
    expect(ladder).toHaveLength(4);
    for (const step of ladder) {
      const expected = each.t_interval_mean[String(step.confidenceLevel)];
      close(step.lower, expected?.lower ?? Number.NaN);
      close(step.upper, expected?.upper ?? Number.NaN);
    }
    // The reference always takes 10 lags; ours are min(10, n/5), the same from 50 returns on.
    if (each.n >= 50 && each.ljung_box_10 !== null) {
      expect(mean?.['ljungBoxLags']).toBe(10);
      close(mean?.['ljungBoxQ'], each.ljung_box_10.statistic);
      close(mean?.['ljungBoxP'], each.ljung_box_10.p_value);
    }
  });
});
