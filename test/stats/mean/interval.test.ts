import { describe, expect, test } from 'vitest';
import { annualDeviation, annualMean, annualRatio } from '../../../src/stats/mean/annual.ts';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { meanLadder } from '../../../src/stats/mean/ladder.ts';
import { neweyWestInterval } from '../../../src/stats/mean/neweyWestInterval.ts';
import { predictionInterval } from '../../../src/stats/mean/prediction.ts';
import { meanWidths } from '../../../src/stats/mean/widths.ts';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level, level95 } from '../levels.ts';
import { indexCloses } from '../readFixture.ts';

const returns = simpleReturns(indexCloses('DAX').slice(-61));

// Figures below: DAX, last 60 simple returns, numpy 2.4.6 and scipy 1.17.1 (stats.t.ppf), formula written out anew.
// scipy's quantiles are good to about 1e-13; ends are differences of figures of like size, so 1e-11 relative.
const near = (actual: number | null, expected: number) =>
  expect(relativeError(actual ?? Number.NaN, expected)).toBeLessThan(1e-11);

describe('meanInterval', () => {
  test('normal ends are narrower by the stated share', () => {
    const interval = accepted(meanInterval(returns, level95, 'both'));
    // Standard normal 97.5% point, DLMF/tables: 1.959963984540054.
    near(interval.normalCritical, 1.959963984540054);
    near(interval.normalUpper, interval.mean + 1.959963984540054 * interval.standardError);
    near(interval.normalLower, interval.mean - 1.959963984540054 * interval.standardError);
    near(interval.normalShortfall, 1 - 1.959963984540054 / interval.criticalT);
    expect(interval.degreesOfFreedom).toBe(59);
  });

  test('a lower bound alone', () => {
    near(accepted(meanInterval(returns, level95, 'above')).lower, -0.0029453812777877303);
  });

  test('two returns: t with one degree of freedom is a Cauchy quantile', () => {
    const { lower, upper } = accepted(meanInterval([0, 0.02], level95, 'both'));
    // tan(0.475·π) = 12.706204736174698 (exact formula), s/√2 = 0.01.
    near(upper, 0.01 + 0.12706204736174698);
    near(lower, 0.01 - 0.12706204736174698);
  });

  test('at 50% one-sided the bound is the mean itself', () => {
    const { lower, mean, normalShortfall } = accepted(meanInterval(returns, level('0.5'), 'above'));
    // The critical value is 0 up to rounding of the quantile.
    expect(Math.abs((lower ?? Number.NaN) - mean)).toBeLessThan(1e-15);
    expect(Number.isFinite(normalShortfall)).toBe(true);
  });

  test('refusals', () => {
    expect(refusalCode(meanInterval([0.01], level95, 'both'))).toBe('tooFewReturns');
    expect(refusalCode(meanInterval([], level95, 'both'))).toBe('tooFewReturns');
    expect(refusalCode(meanInterval([0.01, 0.01, 0.01], level95, 'both'))).toBe('priceDoesNotMove');
  });
});

describe('meanLadder', () => {
  test('is the interval at 90, 95, 99 and 99.9%', () => {
    const ladder = accepted(meanLadder(returns, 'below'));
    expect(ladder.map((step) => step.level.digits / 10 ** step.level.places)).toEqual([
      0.9, 0.95, 0.99, 0.999,
    ]);
    for (const step of ladder) {
      const { lower, upper } = accepted(meanInterval(returns, step.level, 'below'));
      expect(step).toMatchObject({ lower, upper });
    }
  });

  test('is refused like the interval', () => {
    expect(refusalCode(meanLadder([0, 0], 'both'))).toBe('priceDoesNotMove');
  });
});

describe('meanWidths', () => {
  test('two, four and ten times the returns', () => {
    const widths = accepted(meanWidths(returns, level95, 'both'));
    expect(widths.map(({ returnCount }) => returnCount)).toEqual([120, 240, 600]);
    const expected = [0.0023973927967108066, 0.001686514072435783, 0.0010633925143708838];
    for (const [index, { halfWidth }] of widths.entries()) near(halfWidth, expected[index] ?? Number.NaN);
  });

  test('is refused like the interval', () => {
    expect(refusalCode(meanWidths([0.1], level95, 'both'))).toBe('tooFewReturns');
  });
});

describe('predictionInterval', () => {
  test.each([
    ['0.9', -0.022431742990771372, 0.02226363750074304],
    ['0.95', -0.02684355926776547, 0.026675453777737137],
    ['0.99', -0.03568001237114046, 0.03551190688111214],
  ])('at %s', (text, lower, upper) => {
    const interval = accepted(predictionInterval(returns, level(text), 'both'));
    near(interval.lower, lower);
    near(interval.upper, upper);
  });

  test('empirical quantiles are of type 7', () => {
    // By hand: 0, 1, …, 40 in hundredths; position 0.025·40 = 1 and 0.975·40 = 39.
    const steps = Array.from({ length: 41 }, (_, index) => index / 100);
    const { empirical } = accepted(predictionInterval(steps, level95, 'both'));
    near(empirical.lower, 0.01);
    near(empirical.upper, 0.39);
    const oneSided = accepted(predictionInterval(steps, level95, 'above'));
    near(oneSided.empirical.lower, 0.02);
    expect([oneSided.upper, oneSided.empirical.upper]).toEqual([null, null]);
    near(accepted(predictionInterval(steps, level95, 'below')).empirical.upper, 0.38);
  });

  test('is marked too narrow from 99% on where tails are fat', () => {
    const fat = [
      ...Array.from({ length: 58 }, (_, index) => (index % 2 === 0 ? 0.001 : -0.001)),
      0.05,
      -0.05,
    ];
    const marked = (text: string, sample: readonly number[] | Float64Array) =>
      accepted(predictionInterval(sample, level(text), 'both')).tooNarrow;
    expect(['0.95', '0.98', '0.99', '0.999'].map((text) => marked(text, fat))).toEqual([
      false,
      false,
      true,
      true,
    ]);
    // DAX over 60 days has an excess kurtosis of 0.04.
    expect(marked('0.999', returns)).toBe(false);
    expect(marked('0.999', [0.01, 0.02, 0.5])).toBe(false);
  });

  test('is refused like the interval', () => {
    expect(refusalCode(predictionInterval([0.1], level95, 'both'))).toBe('tooFewReturns');
  });
});

describe('neweyWestInterval', () => {
  test('three lags at 60 returns', () => {
    const interval = accepted(neweyWestInterval(returns, level95, 'both'));
    expect(interval).toMatchObject({ bandwidth: 3, degreesOfFreedom: 59 });
    near(interval.standardError, 0.0017036242533373708);
    near(interval.lower, -0.003492997001941318);
    near(interval.upper, 0.0033248915119129894);
  });

  test('needs 20 returns', () => {
    expect(refusalCode(neweyWestInterval(returns.subarray(0, 19), level95, 'both'))).toBe('tooFewReturns');
    expect(neweyWestInterval(returns.subarray(0, 20), level95, 'both').ok).toBe(true);
  });
});

describe('annual figures', () => {
  test('multiply by the periods or by their root', () => {
    // By hand: 0.0005·252, 0.01·√256, 0.05·√256.
    near(annualMean(0.0005, 252), 0.126);
    near(annualDeviation(0.01, 256), 0.16);
    near(annualRatio(0.05, 256), 0.8);
  });
});
