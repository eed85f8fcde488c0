import { describe, expect, test } from 'vitest';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { blockDeviationInterval } from '../../../src/stats/spread/blockInterval.ts';
import { bonettInterval } from '../../../src/stats/spread/bonett.ts';
import { chiSquareInterval } from '../../../src/stats/spread/chiSquareInterval.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson, indexCloses } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(31);

type BonettCase = {
  readonly name: string;
  readonly recomputed: Readonly<Record<string, number>>;
  readonly printed: Readonly<Record<string, number>>;
  readonly data: readonly number[];
};

describe('bonettInterval', () => {
  test('the printed example', () => {
    const { cases } = fixtureJson<{ readonly cases: readonly BonettCase[] }>('risk-worked-examples.json');
    const example = cases.find(({ name }) => name === 'bonett_interval_standard_deviation');
    const found = accepted(bonettInterval(example?.data ?? [], level95));
    // R 4.2.2, 15 digits printed of data printed with 15 digits: 1e-13 relative.
    const near = (actual: number, name: string) =>
      expect(relativeError(actual, example?.recomputed[name] ?? Number.NaN)).toBeLessThan(1e-13);
    near(found.lower, 'lower');
    near(found.upper, 'upper');
    near(found.kurtosis, 'kurtosis_estimate');
    near(found.trimmedMean, 'trimmed_mean');
    // As printed for the variance (Cross Validated 617684, CC BY-SA), to five decimals.
    expect((found.lower ** 2).toFixed(5)).toBe(String(example?.printed.variance_lower));
    expect((found.upper ** 2).toFixed(5)).toBe(String(example?.printed.variance_upper));
  });

  test('ten values lose two at each end', () => {
    // By hand: ⌊10/(2·√6)⌋ = 2, so the trimmed mean is that of 3, 4, 5, 6, 7, 8 → 5.5; with outliers it stays there.
    const values = [-90, 1, 3, 4, 5, 6, 7, 8, 50, 70];
    expect(accepted(bonettInterval(values, level95)).trimmedMean).toBe(5.5);
  });

  test('is wider than the chi-square interval where tails are fat', () => {
    const all = indexReturns('DAX', 'all');
    const bonett = accepted(bonettInterval(all, level95));
    const chiSquare = accepted(chiSquareInterval(all, level95));
    expect(bonett.upper - bonett.lower).toBeGreaterThan(1.5 * (chiSquare.upper - chiSquare.lower));
  });

  test('needs ten returns that move', () => {
    expect(refusalCode(bonettInterval(indexReturns('DAX', '20').subarray(0, 9), level95))).toBe(
      'tooFewReturns',
    );
    expect(refusalCode(bonettInterval(new Float64Array(10), level95))).toBe('priceDoesNotMove');
  });
});

describe('chiSquareInterval', () => {
  test('two returns', () => {
    // s = √2/100·… by hand: s = 0.0141421…, chi-square with one degree of freedom is a squared normal:
    // the 97.5% point of |z| is 2.241402727604945, the 2.5% point 0.031337982021426 (mpmath 1.3.0, erfinv).
    const { lower, upper } = accepted(chiSquareInterval([0, 0.02], level95));
    expect(relativeError(lower, (0.01 * Math.SQRT2) / 2.241402727604945)).toBeLessThan(1e-12);
    expect(relativeError(upper, (0.01 * Math.SQRT2) / 0.031337982021426465)).toBeLessThan(1e-12);
  });

  test('refusals', () => {
    expect(refusalCode(chiSquareInterval([0.1], level95))).toBe('tooFewReturns');
    expect(refusalCode(chiSquareInterval([0.1, 0.1], level95))).toBe('priceDoesNotMove');
  });
});

describe('blockDeviationInterval', () => {
  test('holds the deviation of the window, and reports the blocks', () => {
    const returns = indexReturns('SMI', '250');
    const { lower, upper, blockLength } = accepted(
      blockDeviationInterval({ returns, level: level95, streams }),
    );
    // numpy 2.4.6, the rule of Politis & White written out anew on squared deviations.
    expect(relativeError(blockLength, 3.372301621565985)).toBeLessThan(1e-10);
    const s = Math.sqrt(
      returns.reduce(
        (sum, value, _, { length }) => sum + (value - returns.reduce((a, b) => a + b) / length) ** 2,
        0,
      ) / 249,
    );
    expect(lower).toBeLessThan(s);
    expect(upper).toBeGreaterThan(s);
  });

  test('clustering widens it beyond what independence would give', () => {
    // Calm and wild stretches in turn, 25 days each.
    const wild = simpleReturns(indexCloses('DAX').slice(-201)).map((value, index) =>
      Math.floor(index / 25) % 2 === 0 ? value : 5 * value,
    );
    const shuffled = wild.map((_, index) => wild[(index * 37) % 200] ?? Number.NaN);
    const width = (returns: Float64Array) => {
      const { lower, upper } = accepted(blockDeviationInterval({ returns, level: level95, streams }));
      return upper - lower;
    };
    expect(width(wild)).toBeGreaterThan(1.3 * width(shuffled));
  });

  test('refusals', () => {
    const refused = (more: object) =>
      refusalCode(
        blockDeviationInterval({ returns: indexReturns('DAX', '20'), level: level95, streams, ...more }),
      );
    expect(refused({ returns: indexReturns('DAX', '20').subarray(0, 9) })).toBe('tooFewReturns');
    expect(refused({ returns: new Float64Array(12) })).toBe('priceDoesNotMove');
    expect(refused({ level: level('0.9999') })).toBe('levelOutside');
  });
});

test('each refusal names the interval that cannot be had', () => {
  const nine = indexReturns('DAX', '20').subarray(0, 9);
  expect(refusalMessage(chiSquareInterval([0.1], level95))).toMatch(
    /^An interval for the standard deviation needs at least 2 returns/,
  );
  expect(refusalMessage(bonettInterval(nine, level95))).toMatch(
    /^An interval for the standard deviation that allows for fat tails needs at least 10 returns/,
  );
  expect(refusalMessage(blockDeviationInterval({ returns: nine, level: level95, streams }))).toMatch(
    /^An interval for the standard deviation that allows for clustering needs at least 10 returns/,
  );
});

test('both ends must be within the resamples', () => {
  // (19 + 1)·0.025 is half a rank, (39 + 1)·0.025 a whole one.
  const asked = { returns: indexReturns('DAX', '60'), level: level95, streams };
  expect(refusalCode(blockDeviationInterval({ ...asked, replicates: 19 }))).toBe('levelOutside');
  const { lower, upper } = accepted(blockDeviationInterval({ ...asked, replicates: 39 }));
  expect(lower).toBeLessThan(upper);
});
