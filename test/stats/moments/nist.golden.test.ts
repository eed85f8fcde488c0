import { describe, expect, test } from 'vitest';
import { lag1Autocorrelation } from '../../../src/stats/dependence/autocorrelation.ts';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { arithmeticMean } from '../../../src/stats/moments/mean.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { exactMoments, exactRelativeError, exactRelativeErrorOfRoot } from '../exactMoments.ts';
import { fixtureJson } from '../readFixture.ts';

type DataSet = {
  readonly cases: readonly {
    readonly certified: {
      readonly mean: number;
      readonly standard_deviation: number;
      readonly lag1_autocorrelation: number;
    };
    readonly data: readonly number[];
  }[];
};

// Digits of the certified standard deviation that a double can reach: the decimals of the last two sets are not
// doubles (10000000.2 is off by 7e-10, against a deviation of 0.1), so the data read differ from the data certified.
const sets = [
  ['lew', 13],
  ['lottery', 13],
  ['mavro', 13],
  ['michelso', 13],
  ['numacc1', 13],
  ['numacc2', 13],
  ['numacc3', 9],
  ['numacc4', 8],
  ['pidigits', 13],
] as const;

describe.each(sets)('NIST StRD %s', (name, deviationDigits) => {
  const [only] = fixtureJson<DataSet>(`nist-strd-univariate/${name}.json`).cases;
  if (only === undefined) throw new Error(`${name}: no case in the fixture`);
  const { certified, data } = only;

  test('certified digits', () => {
    // Certified values carry 15 digits; the goal is 13, and 10 for the autocorrelation.
    expect(relativeError(arithmeticMean(data), certified.mean)).toBeLessThan(1e-13);
    expect(relativeError(sampleStandardDeviation(data), certified.standard_deviation)).toBeLessThan(
      10 ** -deviationDigits,
    );
    expect(relativeError(lag1Autocorrelation(data), certified.lag1_autocorrelation)).toBeLessThan(1e-10);
  });

  test('exact rational arithmetic on the doubles read', () => {
    // 1e-13 is the promise; the corrected two-pass sums stay near 1e-16.
    const exact = exactMoments(data);
    expect(exactRelativeError(arithmeticMean(data), exact.mean)).toBeLessThan(1e-13);
    expect(exactRelativeErrorOfRoot(sampleStandardDeviation(data), exact.sampleVariance)).toBeLessThan(1e-13);
    expect(exactRelativeError(lag1Autocorrelation(data), exact.lag1Autocorrelation)).toBeLessThan(1e-13);
  });
});
