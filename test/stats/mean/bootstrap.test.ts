import { describe, expect, test } from 'vitest';
import { stationaryBootstrapInterval } from '../../../src/stats/mean/stationaryBootstrap.ts';
import { studentisedBootstrapInterval } from '../../../src/stats/mean/studentisedBootstrap.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(21);
// Made up: few, and lopsided to the right.
const lopsided = [0.001, 0.003, -0.002, 0.012, 0, 0.004, -0.001, 0.035, 0.002, 0.007, 0.001, 0.019];

describe('studentisedBootstrapInterval', () => {
  const asked = { returns: lopsided, level: level95, streams } as const;

  test('agrees with a million resamples made elsewhere', () => {
    // numpy 2.4.6, a million resamples, two seeds: 0.001786 and 0.001771, 0.02367 and 0.02371. Standard deviation of an
    // end at 9,999 resamples, by the same program: 7e-5 and 6.7e-4; four of them.
    const { lower, upper } = accepted(studentisedBootstrapInterval({ ...asked, side: 'both' }));
    expect(Math.abs((lower ?? Number.NaN) - 0.001778)).toBeLessThan(3e-4);
    expect(Math.abs((upper ?? Number.NaN) - 0.02369)).toBeLessThan(2.8e-3);
  });

  test('one end alone lies inside the two ends of the same level, and is an end of a lower one', () => {
    const both = accepted(studentisedBootstrapInterval({ ...asked, side: 'both' }));
    const above = accepted(studentisedBootstrapInterval({ ...asked, side: 'above' }));
    const below = accepted(studentisedBootstrapInterval({ ...asked, side: 'below' }));
    const ninety = accepted(studentisedBootstrapInterval({ ...asked, level: level('0.9'), side: 'both' }));
    expect([above.upper, below.lower]).toEqual([null, null]);
    expect(above.lower).toBe(ninety.lower);
    expect(below.upper).toBe(ninety.upper);
    expect(above.lower).toBeGreaterThan(both.lower ?? Number.NaN);
    expect(below.upper).toBeLessThan(both.upper ?? Number.NaN);
  });

  test('resamples without spread are drawn again', () => {
    // Nine equal returns and one other: more than a third of all resamples are equal throughout.
    const returns = [...new Array<number>(9).fill(0), 0.01];
    const { lower, upper } = accepted(studentisedBootstrapInterval({ ...asked, returns, side: 'both' }));
    expect(Number.isFinite(lower)).toBe(true);
    expect(Number.isFinite(upper)).toBe(true);
  });

  test('refusals', () => {
    const refused = (more: object) =>
      refusalCode(studentisedBootstrapInterval({ ...asked, side: 'both', ...more }));
    expect(refused({ returns: lopsided.slice(0, 9) })).toBe('tooFewReturns');
    expect(refused({ returns: new Array<number>(12).fill(0) })).toBe('priceDoesNotMove');
    expect(refused({ level: level('0.9999') })).toBe('levelOutside');
  });
});

describe('stationaryBootstrapInterval', () => {
  const returns = indexReturns('SMI', '60');
  const asked = { returns, level: level95, side: 'both', streams } as const;

  test('with blocks of one it is the percentile interval of the mean', () => {
    // The block length of this window is 1 (numpy 2.4.6). A percentile interval of the mean is near mean ± 1.96·√(m2/n);
    // its skewness and the resampling move an end by a few hundredths of the standard error.
    const { lower, upper, blockLength } = accepted(stationaryBootstrapInterval(asked));
    expect(blockLength).toBe(1);
    const mean = returns.reduce((sum, value) => sum + value, 0) / 60;
    const standardError = Math.sqrt(returns.reduce((sum, value) => sum + (value - mean) ** 2, 0)) / 60;
    expect(Math.abs((lower ?? Number.NaN) - (mean - 1.96 * standardError))).toBeLessThan(0.2 * standardError);
    expect(Math.abs((upper ?? Number.NaN) - (mean + 1.96 * standardError))).toBeLessThan(0.2 * standardError);
  });

  test('long runs widen it', () => {
    const runs = Float64Array.from(
      { length: 60 },
      (_, index) => (index % 20 < 10 ? 0.01 : -0.01) + index * 1e-5,
    );
    const shuffled = Float64Array.from({ length: 60 }, (_, index) => runs[(index * 37) % 60] ?? Number.NaN);
    const width = (sample: Float64Array) => {
      const { lower, upper } = accepted(stationaryBootstrapInterval({ ...asked, returns: sample }));
      return (upper ?? Number.NaN) - (lower ?? Number.NaN);
    };
    expect(width(runs)).toBeGreaterThan(1.5 * width(shuffled));
  });

  test('refusals', () => {
    const refused = (more: object) => refusalCode(stationaryBootstrapInterval({ ...asked, ...more }));
    expect(refused({ returns: returns.subarray(0, 9) })).toBe('tooFewReturns');
    expect(refused({ returns: new Float64Array(12) })).toBe('priceDoesNotMove');
    expect(refused({ level: level('0.9999') })).toBe('levelOutside');
  });
});
