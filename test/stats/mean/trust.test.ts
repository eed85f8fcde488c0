import { describe, expect, test } from 'vitest';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { trustedMeanInterval } from '../../../src/stats/mean/trustedInterval.ts';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { level, level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(41);

/** Autoregressive returns of order one: each keeps `keep` of the one before. */
const autoregressive = (count: number, keep: number): Float64Array => {
  const random = testStreams(43).stream(0);
  const returns = new Float64Array(count);
  let last = 0;
  for (let index = 0; index < count; index += 1) {
    last = keep * last + 0.01 * nextNormal(random);
    returns[index] = last;
  }
  return returns;
};

/** Independent and lopsided: exponentials of normals. */
const lopsided = (count: number): Float64Array =>
  autoregressive(count, 0).map((value) => 0.01 * Math.exp(120 * value));

const trusted = (returns: ArrayLike<number>, more: object = {}) =>
  accepted(trustedMeanInterval({ returns, level: level95, side: 'both', streams, replicates: 999, ...more }));

describe('which interval of the mean to believe', () => {
  test('independent and even: the plain one, and no bootstrap is made', () => {
    const returns = autoregressive(60, 0);
    const found = trusted(returns);
    expect(found).toMatchObject({ trust: 'plain', reason: 'nothingAgainst', bootstrap: null });
    const plain = accepted(meanInterval(returns, level95, 'both'));
    expect([found.lower, found.upper]).toEqual([plain.lower, plain.upper]);
    expect(found.neweyWest).not.toBeNull();
  });

  test('positive autocorrelation: Newey-West, wider, with blocks beside it', () => {
    const found = trusted(autoregressive(120, 0.7));
    expect(found).toMatchObject({ trust: 'neweyWest', reason: 'plainTooNarrow' });
    expect(found.bootstrap?.method).toBe('stationary');
    expect([found.lower, found.upper]).toEqual([found.neweyWest?.lower, found.neweyWest?.upper]);
    expect(found.evidence.lag1Autocorrelation).toBeGreaterThan(0.5);
    expect(found.evidence.robustAutocorrelation?.p).toBeLessThan(0.05);
  });

  test('negative autocorrelation: Newey-West, narrower', () => {
    const found = trusted(autoregressive(120, -0.7));
    expect(found).toMatchObject({ trust: 'neweyWest', reason: 'plainTooWide' });
    expect(found.neweyWest?.standardError).toBeLessThan(found.plain.standardError);
  });

  test('few and lopsided: the studentised bootstrap', () => {
    const found = trusted(lopsided(60));
    expect(found).toMatchObject({ trust: 'bootstrap', reason: 'lopsided' });
    expect(found.bootstrap?.method).toBe('studentised');
    expect([found.lower, found.upper]).toEqual([found.bootstrap?.lower, found.bootstrap?.upper]);
  });

  test('lopsided and a hundred: the plain one again', () => {
    expect(trusted(lopsided(99)).trust).toBe('bootstrap');
    expect(trusted(lopsided(100))).toMatchObject({ trust: 'plain', bootstrap: null });
  });

  test('a bootstrap can be asked for without changing what is trusted', () => {
    const found = trusted(autoregressive(60, 0), { bootstrapAsked: true });
    expect(found.trust).toBe('plain');
    expect(found.bootstrap?.method).toBe('studentised');
  });

  test('doubt is said where nothing better can be had', () => {
    // Nine returns cannot be resampled; fifteen cannot carry Newey-West; 99.999% is beyond the resamples.
    expect(trusted([0.01, -0.001, 0, 0.002, -0.002, 0.2, 0.001, 0, 0.003])).toMatchObject({
      trust: 'plain',
      reason: 'outOfReach',
      bootstrap: null,
      neweyWest: null,
    });
    const rising = Float64Array.from({ length: 15 }, (_, index) => (index - 7) / 100);
    expect(trusted(rising)).toMatchObject({ trust: 'plain', reason: 'outOfReach', neweyWest: null });
    expect(trusted(lopsided(60), { level: level('0.99999') })).toMatchObject({
      trust: 'plain',
      reason: 'outOfReach',
      bootstrap: null,
    });
  });

  test('figures that so few returns cannot carry are null', () => {
    expect(trusted([0, 0.01]).evidence).toMatchObject({
      lag1Autocorrelation: null,
      ljungBox: null,
      robustAutocorrelation: null,
      skewness: null,
      excessKurtosis: null,
    });
    const three = trusted([0, 0.01, 0.05]).evidence;
    expect(three.lag1Autocorrelation).not.toBeNull();
    expect(three.skewness).not.toBeNull();
    expect(three.excessKurtosis).toBeNull();
    // By hand: of 0, 0, 0, 1 the fourth central moment is 21/256 and the second 3/16, so m4/m2² − 3 = −2/3.
    expect(trusted([0, 0, 0, 1]).evidence.excessKurtosis).toBeCloseTo(-2 / 3, 14);
    expect(trusted([0, 0.01, 0.05, 0.02, 0]).evidence.ljungBox?.lags).toBe(1);
  });

  test('is refused like the plain interval', () => {
    expect(refusalCode(trustedMeanInterval({ returns: [0, 0], level: level95, side: 'both', streams }))).toBe(
      'priceDoesNotMove',
    );
  });
});
