import { describe, expect, test } from 'vitest';
import {
  lag1Autocorrelation,
  ljungBox,
  robustAutocorrelation,
  testedLags,
} from '../../../src/stats/dependence/autocorrelation.ts';
import { volatilityClustering } from '../../../src/stats/dependence/clustering.ts';
import {
  neweyWest,
  neweyWestBandwidth,
  neweyWestStandardError,
} from '../../../src/stats/dependence/neweyWest.ts';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { fixtureJson, indexCloses } from '../readFixture.ts';

const dax = simpleReturns(indexCloses('DAX'));
const last = (count: number) => dax.subarray(dax.length - count);

// q and p: numpy 2.4.6 with the formula written out anew, p by scipy 1.17.1 stats.chi2.sf. numpy sums plainly, which
// leaves 1e-13 or so at these lengths; 1e-11 relative.
const near = (actual: number, expected: number) =>
  expect(relativeError(actual, expected)).toBeLessThan(1e-11);

describe('tests of autocorrelation on the DAX', () => {
  test.each([
    [20, 4, 1.9754395240168996, 0.740276415186176],
    [60, 10, 2.2401340835557435, 0.9941463362923034],
    [250, 10, 4.137060952931495, 0.940952139967263],
    [1859, 10, 6.50099550111663, 0.7715637139618883],
  ])('Ljung-Box over %i returns with its own %i lags', (count, lags, q, p) => {
    const found = ljungBox(last(count));
    expect(found.lags).toBe(lags);
    near(found.q, q);
    near(found.p, p);
  });

  test.each([
    [20, 4, 2.163359485936202, 0.7057426640633961],
    [60, 10, 2.644377124597242, 0.988600641572277],
    [250, 10, 3.6296276184441245, 0.9625125687275621],
    [1859, 10, 4.265706834350217, 0.9345654100389279],
  ])('robust test over %i returns', (count, lags, q, p) => {
    const found = robustAutocorrelation(last(count));
    expect(found.lags).toBe(lags);
    near(found.q, q);
    near(found.p, p);
  });

  test.each([
    [60, 5.601140421444155, 0.8475872422961788],
    [1859, 69.16045302844776, 6.43805537465653e-11],
  ])('clustering over %i returns', (count, q, p) => {
    const found = volatilityClustering(last(count));
    near(found.q, q);
    near(found.p, p);
  });
});

describe('edges', () => {
  test('lags are a fifth of the count, at most ten', () => {
    expect([4, 5, 9, 10, 49, 50, 500].map(testedLags)).toEqual([0, 1, 1, 2, 9, 10, 10]);
  });

  test('with no lag to test nothing is found', () => {
    expect(robustAutocorrelation([1, 2, 3, 5])).toEqual({ q: 0, p: 1, lags: 0 });
    expect(ljungBox([1, 2, 3, 5])).toEqual({ q: 0, p: 1, lags: 0 });
  });

  test('the robust test finds nothing where nothing varies', () => {
    expect(volatilityClustering([0.01, -0.01, 0.01, -0.01, 0.01])).toEqual({ q: 0, p: 1, lags: 1 });
  });

  test('values that alternate', () => {
    // By hand: n = 4, r1 = −3/4.
    near(lag1Autocorrelation([1, -1, 1, -1]), -0.75);
  });

  test('misuse throws', () => {
    expect(() => lag1Autocorrelation([1, 2])).toThrow(/^lag1Autocorrelation: expected at least 3/);
    expect(() => lag1Autocorrelation([1, 1, 1])).toThrow(/values that differ/);
    expect(() => ljungBox([1, 2, 3], 3)).toThrow(/from 0 to 2, got 3/);
    expect(() => ljungBox([1, 2, 3], 0.5)).toThrow(RangeError);
    expect(() => ljungBox([1, 2, 3], -1)).toThrow(RangeError);
    expect(() => neweyWestStandardError([1, 2], 2)).toThrow(/^neweyWestStandardError/);
    expect(() => neweyWestStandardError([1], 0)).toThrow(RangeError);
    expect(() => neweyWestStandardError([1, 2, 3], 0.5)).toThrow(RangeError);
    expect(() => neweyWestStandardError([1, 2, 3], -1)).toThrow(RangeError);
  });
});

type NeweyWestCase = {
  readonly name: string;
  readonly values: readonly {
    readonly series: string;
    readonly n: number;
    readonly newey_west_bartlett: readonly { readonly lag: number; readonly standard_error: number }[];
  }[];
};

describe('Newey-West standard error', () => {
  const { cases } = fixtureJson<{ readonly cases: readonly NeweyWestCase[] }>('risk-worked-examples.json');
  const series = cases
    .find(({ name }) => name === 'newey_west_standard_error_of_mean')
    ?.values.find((one) => one.series === 'DAX');

  test.each(series?.newey_west_bartlett ?? [])('DAX with $lag lags', ({ lag, standard_error: expected }) => {
    // R 4.2.2, sandwich 3.0-2, 15 digits printed; the reference divides by n where the convention here is n − 1.
    const factor = Math.sqrt(dax.length / (dax.length - 1));
    expect(relativeError(neweyWestStandardError(dax, lag), expected * factor)).toBeLessThan(1e-13);
  });

  test('the reference has six bandwidths', () => {
    expect(series?.newey_west_bartlett.length).toBe(6);
  });

  test('without lags it is the plain standard error', () => {
    near(neweyWestStandardError(dax, 0), sampleStandardDeviation(dax) / Math.sqrt(dax.length));
  });

  test('bandwidths', () => {
    // 4·(n/100)^(2/9) by hand at 100; elsewhere plain arithmetic in Python 3: 2.80, 2.990, 3.01, 3.99, 7.66.
    expect([20, 27, 28, 99, 100, 1859].map(neweyWestBandwidth)).toEqual([2, 2, 3, 3, 4, 7]);
    expect(neweyWest(dax).bandwidth).toBe(7);
    // Two values have one lag only, whatever the rule says.
    expect(neweyWest([0, 1]).bandwidth).toBe(1);
  });

  test('values that are all equal have no error', () => {
    expect(neweyWest([3, 3, 3]).standardError).toBe(0);
  });
});
