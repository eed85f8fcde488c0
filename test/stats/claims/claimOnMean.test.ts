import { describe, expect, test } from 'vitest';
import { claimOnMean, type MeanClaim } from '../../../src/stats/claims/claimOnMean.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';

const ask = (returns: ArrayLike<number>, more: Partial<MeanClaim> = {}) =>
  claimOnMean({
    returns,
    claimed: 0,
    level: level95,
    side: 'both',
    robust: false,
    smallestMeanThatMatters: 0.0005,
    ...more,
  });

type Case = { readonly name: string; readonly recomputed: Record<string, number>; readonly data: number[] };
const handbook = fixtureJson<{ readonly cases: readonly Case[] }>('nist-handbook.json').cases;

describe('one-sample t', () => {
  test('ZARR13 against 5, NIST/SEMATECH e-Handbook 1.3.5.2', () => {
    const zarr13 = handbook.find(({ name }) => name === 'confidence_limits_mean_zarr13');
    const claim = accepted(ask(zarr13?.data ?? [], { claimed: 5 }));
    // Lag-1 autocorrelation is 0.28 in these data, so that Newey-West decides; the plain standard error gives the printed t.
    expect(claim.decidedBy).toBe('neweyWest');
    const plainT = (claim.estimate - 5) / claim.plainStandardError;
    // mpmath at 40 digits, printed to 16; the spread is 0.002 of the mean, so 1e-12.
    expect(relativeError(plainT, zarr13?.recomputed['one_sample_t_against_5'] ?? 0)).toBeLessThan(1e-12);
    expect(claim.verdict).toBe('contradicted');
  });

  // SciPy 1.17.1: scipy.stats.ttest_1samp(r, 0.002, alternative=...), r the last 60 simple returns of DAX in the fixture.
  test.each([
    ['both', 0.22839594308705],
    ['above', 0.885802028456475],
    ['below', 0.114197971543525],
  ] as const)('DAX over 60 days, %s', (side, p) => {
    const claim = accepted(ask(indexReturns('DAX', '60'), { side, claimed: 0.002 }));
    expect(claim.decidedBy).toBe('plain');
    // SciPy's t distribution is good to about 14 digits, its mean and deviation to 15.
    expect(relativeError(claim.t, -1.2171430092140887)).toBeLessThan(1e-12);
    expect(relativeError(claim.p, p)).toBeLessThan(1e-12);
    expect(claim.degreesOfFreedom).toBe(59);
  });

  test('what 60 days of DAX can tell', () => {
    const claim = accepted(ask(indexReturns('DAX', '60'), { claimed: 0.002 }));
    // SciPy 1.17.1: brentq on nct.sf(t975, 59, d) + nct.cdf(-t975, 59, d) - 0.8, times s/sqrt(60); nct is good to 1e-10.
    expect(relativeError(claim.detectableAt80, 0.004876873043872165)).toBeLessThan(1e-9);
    // The same power at noncentrality 0.002/s*sqrt(n): 0.8 is passed at this count.
    expect(claim.returnsNeeded).toBe(348);
    const oneSided = accepted(ask(indexReturns('DAX', '60'), { claimed: 0.002, side: 'below' }));
    // As above with nct.sf(t95, 59, d) alone.
    expect(relativeError(oneSided.detectableAt80, 0.004307149008200935)).toBeLessThan(1e-9);
  });
});

/** ±1 around a mean of 0, in pairs: s² = n/(n − 1). Alternation has strong negative autocorrelation, runs a positive one. */
const alternating = (count: number) =>
  Float64Array.from({ length: count }, (_, day) => (day % 2 === 0 ? 1 : -1));
const runs = (count: number) => Float64Array.from({ length: count }, (_, day) => (day % 20 < 10 ? 1 : -1));

describe('dependence', () => {
  test.each([
    ['positive autocorrelation widens', runs(200), 1],
    ['negative autocorrelation narrows', alternating(200), -1],
  ] as const)('%s the deciding standard error', (_, returns, direction) => {
    const claim = accepted(ask(returns, { claimed: 0.5 }));
    expect(claim.decidedBy).toBe('neweyWest');
    expect(Math.sign(claim.standardError - claim.plainStandardError)).toBe(direction);
  });

  test('returns needed grow with positive autocorrelation and never shrink', () => {
    const plain = accepted(ask(indexReturns('DAX', '60'), { claimed: 0.1 * 0.013263 }));
    const grown = accepted(ask(runs(200), { claimed: 0.1 }));
    const kept = accepted(ask(alternating(200), { claimed: 0.1 }));
    // A claim of a tenth of s needs about 787 returns (power-mean.json) without dependence.
    expect(Math.abs((plain.returnsNeeded ?? 0) - 787)).toBeLessThan(3);
    expect(Math.abs((kept.returnsNeeded ?? 0) - 787)).toBeLessThan(10);
    expect(grown.returnsNeeded ?? 0).toBeGreaterThan(2 * 787);
  });

  test('below 20 returns the plain one decides, and asking for the other is refused', () => {
    const returns = alternating(18);
    expect(accepted(ask(returns)).decidedBy).toBe('plain');
    expect(refusalCode(ask(returns, { robust: true }))).toBe('tooFewReturns');
    expect(refusalMessage(ask(returns, { robust: true }))).toMatch(
      /^A verdict that allows for autocorrelation needs at least 20 returns/,
    );
  });

  test('with 20 returns Newey-West decides', () => {
    expect(accepted(ask(alternating(20))).decidedBy).toBe('neweyWest');
  });
});

describe('verdicts on DAX over 60 days (mean −0.8 bp, 95% interval −35.1 to +33.4 bp)', () => {
  test.each([
    [0.002, 'both', 'cannot tell'],
    [0.004, 'both', 'contradicted'],
    [-0.004, 'both', 'contradicted'],
    [0.004, 'above', 'cannot tell'],
    [-0.004, 'above', 'contradicted'],
    [0, 'both', 'cannot tell'],
  ] as const)('%d %s: %s', (claimed, side, verdict) => {
    expect(accepted(ask(indexReturns('DAX', '60'), { claimed, side })).verdict).toBe(verdict);
  });

  test('a claim of zero is borne out where the half-width does not matter', () => {
    const claim = accepted(ask(indexReturns('DAX', '60'), { smallestMeanThatMatters: 0.0035 }));
    expect(claim.verdict).toBe('consistent');
    expect(claim.returnsNeeded).toBeNull();
  });

  test('a mean away from zero bears out a claim near it', () => {
    const returns = indexReturns('DAX', '60').map((value) => value + 0.005);
    expect(accepted(ask(returns, { claimed: 0.004 })).verdict).toBe('consistent');
    expect(accepted(ask(returns, { claimed: 0.004, side: 'above' })).verdict).toBe('consistent');
  });
});

describe('refusals', () => {
  test('one return', () => {
    expect(refusalCode(ask([0.01]))).toBe('tooFewReturns');
    expect(refusalMessage(ask([0.01]))).toMatch(/^A claim on the mean needs at least 2 returns/);
  });
  test('a price that stands still', () =>
    expect(refusalCode(ask([0.01, 0.01, 0.01]))).toBe('priceDoesNotMove'));
});
