/**
 * The core against an independent general-purpose library: @stdlib (Apache-2.0), packages stats-base-dists-* and
 * stats-ttest*, versions as pinned in package.json. Tolerances are the accuracy of that library, not of ours: its
 * incomplete beta and gamma functions are good to about 1e-12, its quantiles to about 1e-10.
 */
import betaCdf from '@stdlib/stats-base-dists-beta-cdf';
import binomialCdf from '@stdlib/stats-base-dists-binomial-cdf';
import chiSquareCdf from '@stdlib/stats-base-dists-chisquare-cdf';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import studentCdf from '@stdlib/stats-base-dists-t-cdf';
import studentQuantile from '@stdlib/stats-base-dists-t-quantile';
import oneSample from '@stdlib/stats-ttest';
import twoSamples from '@stdlib/stats-ttest2';
import { describe, expect, test } from 'vitest';
import { claimOnMean } from '../../src/stats/claims/claimOnMean.ts';
import { welchMeanDifference } from '../../src/stats/comparisons/meanDifference.ts';
import * as beta from '../../src/stats/distributions/beta.ts';
import * as binomial from '../../src/stats/distributions/binomial.ts';
import * as chiSquare from '../../src/stats/distributions/chiSquare.ts';
import * as normal from '../../src/stats/distributions/normal.ts';
import * as student from '../../src/stats/distributions/studentT.ts';
import { nextNormal } from '../../src/stats/random/draws.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import { accepted } from '../laws/outcomes.ts';

const close = (actual: number, expected: number, relative: number): void => {
  expect(Math.abs(actual - expected), `${actual} against ${expected}`).toBeLessThanOrEqual(
    relative * Math.abs(expected),
  );
};

const probabilities = [1e-6, 0.001, 0.025, 0.2, 0.5, 0.8, 0.99, 0.9999];
const degrees = [1, 2.3, 4, 9.5, 29, 59, 250, 1858];

describe('distributions', () => {
  test('Student’s t, distribution function and quantile', () => {
    for (const nu of degrees) {
      for (const t of [-6, -2.5, -0.3, 0.7, 1.96, 4.4])
        close(student.studentTCdf(t, nu), studentCdf(t, nu), 1e-11);
      for (const p of probabilities.filter((each) => each !== 0.5))
        close(student.studentTQuantile(p, nu), studentQuantile(p, nu), 1e-9);
    }
  });

  test('chi-square, beta, binomial and normal', () => {
    for (const df of degrees)
      for (const share of [0.2, 0.8, 1, 1.5])
        close(chiSquare.chiSquareCdf(share * df, df), chiSquareCdf(share * df, df), 1e-11);
    for (const [a, b] of [
      [0.5, 3],
      [2, 5],
      [12, 240],
      [100, 90],
    ] as const)
      for (const x of [0.02, 0.3, 0.55, 0.9]) close(beta.betaCdf(x, a, b), betaCdf(x, a, b), 1e-10);
    for (const k of [0, 1, 3, 7, 12])
      close(binomial.binomialCdf(k, 250, 0.01), binomialCdf(k, 250, 0.01), 1e-11);
    for (const p of probabilities.filter((each) => each !== 0.5))
      close(normal.normalQuantile(p), normalQuantile(p, 0, 1), 1e-9);
  });
});

describe('tests on samples', () => {
  const streams = createStreams(new Uint8Array(32).fill(5));
  const sample = (replicate: number, count: number, shift: number): Float64Array => {
    const random = streams.stream(replicate);
    return Float64Array.from({ length: count }, () => shift + 0.01 * nextNormal(random));
  };
  const level = { digits: 95, places: 2 };

  test.each([1, 2, 3, 4, 5])('one-sample t, sample %i', (replicate) => {
    const returns = sample(replicate, 20 + 7 * replicate, 0.001);
    const claim = accepted(
      claimOnMean({
        returns,
        claimed: 0.002,
        level,
        side: 'both',
        robust: false,
        smallestMeanThatMatters: 0.0005,
      }),
    );
    const expected = oneSample(returns, { mu: 0.002, alpha: 0.05 });
    expect(claim.decidedBy).toBe('plain');
    close(claim.t, expected.statistic, 1e-11);
    close(claim.p, expected.pValue, 1e-10);
    close(claim.lower ?? Number.NaN, expected.ci[0] ?? Number.NaN, 1e-9);
    close(claim.upper ?? Number.NaN, expected.ci[1] ?? Number.NaN, 1e-9);
  });

  test.each([6, 7, 8])('Welch’s t, samples %i', (replicate) => {
    const [first, second] = [sample(replicate, 30, 0.001), sample(replicate + 100, 45, -0.002)];
    const ours = accepted(welchMeanDifference(first, second, level));
    const expected = twoSamples(first, second, { variance: 'unequal', alpha: 0.05 });
    close(ours.t, expected.statistic, 1e-11);
    close(ours.p, expected.pValue, 1e-10);
    close(ours.lower, expected.ci[0] ?? Number.NaN, 1e-9);
    close(ours.upper, expected.ci[1] ?? Number.NaN, 1e-9);
  });
});
