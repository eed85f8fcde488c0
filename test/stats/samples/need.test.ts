import { describe, expect, test } from 'vitest';
import { normalQuantile } from '../../../src/stats/distributions/normal.ts';
import { need } from '../../../src/stats/samples/need.ts';
import { claimPower, detectableNoncentrality } from '../../../src/stats/samples/power.ts';
import { returnsForHalfWidth } from '../../../src/stats/samples/returnsForHalfWidth.ts';
import { returnsForPower } from '../../../src/stats/samples/returnsForPower.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';

const power = level('0.8');

describe('returns for a half-width', () => {
  // SciPy 1.17.1: the smallest n with scipy.stats.t.ppf(1 - alpha/2, n - 1)/sqrt(n) <= h.
  test.each([
    [10, '0.95', 2],
    [1, '0.95', 7],
    [0.5, '0.95', 18],
    [0.25, '0.95', 64],
    [0.2, '0.95', 99],
    [0.1, '0.95', 387],
    [0.05, '0.95', 1540],
    [0.2, '0.99', 170],
  ])('%d deviations at %s', (width, text, count) => {
    expect(returnsForHalfWidth(width, level(text))).toBe(count);
  });

  test.each([
    [0.001, '0.95', 3_841_462],
    [0.0005, '0.95', 15_365_838],
    [0.0015, '0.95', 1_707_318],
    [0.0007, '0.99', 13_540_610],
  ])('beyond a million by formula, and still exact: %d deviations at %s', (width, text, count) => {
    expect(returnsForHalfWidth(width, level(text))).toBe(count);
  });

  test('a one-sided level of 50% or less has nothing to narrow, however small the width', () => {
    expect(returnsForHalfWidth(1e-4, level('0.4'), 'above')).toBe(2);
    expect(returnsForHalfWidth(1e-4, level('0.5'), 'above')).toBe(2);
  });

  test.each([0, -0.1, Number.NaN])('%d deviations are no width', (width) => {
    expect(() => returnsForHalfWidth(width, level95)).toThrow(
      'returnsForHalfWidth: expected a half-width above 0',
    );
  });
});

describe('returns for a power', () => {
  // mpmath 1.3.0 at 25 digits: E[Φ(δ − cS) + Φ(−δ − cS)] over S = √(χ²/ν), c the t quantile: the first n at or above the
  // power. The wrong tail saves 5 returns at 80% and 8% of them all at 10%.
  test.each([
    [0.002, '0.8', 1_962_218],
    [0.001, '0.9', 10_507_422],
    [0.0005, '0.1', 1_702_287],
  ])(
    'beyond a million by formula, both tails counted: %d deviations at power %s',
    (difference, text, count) => {
      expect(returnsForPower(difference, level(text), { level: level95, side: 'both' })).toBe(count);
    },
  );

  test('a power that chance alone gives needs two returns, however small the difference', () => {
    expect(returnsForPower(1e-5, level('0.01'), { level: level95, side: 'both' })).toBe(2);
  });

  test.each([0, -0.1, Number.NaN])('%d deviations are no difference', (difference) => {
    expect(() => returnsForPower(difference, power, { level: level95, side: 'both' })).toThrow(
      'returnsForPower: expected a difference above 0',
    );
  });

  test('the power that is usual is 80%', () => {
    // SciPy 1.17.1: brentq on nct.sf(t975, 59, d) + nct.cdf(-t975, 59, d) - 0.8, good to 1e-10.
    const found = detectableNoncentrality(claimPower, 59, { level: level95, side: 'both' });
    expect(relativeError(found, 2.8482253850697603)).toBeLessThan(1e-9);
  });
});

test('NIST/SEMATECH e-Handbook 7.2.2.2: one deviation, one-sided 5%, power 90%: 11', () => {
  expect(returnsForPower(1, level('0.9'), { level: level95, side: 'above' })).toBe(11);
});

type Cell = {
  readonly alpha_two_sided: number;
  readonly beta: number;
  readonly shift_in_sd: number;
  readonly formula: number;
};
const table = fixtureJson<{
  readonly cases: readonly { readonly name: string; readonly cells: readonly Cell[] }[];
}>('nist-handbook.json').cases.find(({ name }) => name === 'sample_size_table_two_sided');

// The handbook's table (7.2.2.2) is the normal formula. The t test needs more, by about z²/2, and never less.
test.each(table?.cells ?? [])('NIST sample sizes, $alpha_two_sided $beta $shift_in_sd', (cell) => {
  const test95 = { level: level((1 - cell.alpha_two_sided).toFixed(3)), side: 'both' } as const;
  const count = returnsForPower(cell.shift_in_sd, level((1 - cell.beta).toFixed(3)), test95);
  const shift = normalQuantile(cell.alpha_two_sided / 2) ** 2 / 2;
  expect(count).toBeGreaterThanOrEqual(cell.formula);
  // The next term of the expansion is of the order of z⁴/n and small counts feel it most: 2 returns.
  expect(count).toBeLessThan(cell.formula + shift + 3);
});

describe('need', () => {
  const dax = indexReturns('DAX', '60');
  const ask = (size: number, returns: ArrayLike<number> = dax) =>
    need({ returns, size, level: level95, power, periodsPerYear: 252 });

  test('DAX over 60 days, 20 bp', () => {
    const answer = accepted(ask(0.002));
    // s 1.3263%. SciPy 1.17.1: t.ppf(.975, n-1)*s/sqrt(n) <= 0.002 first at 172; power 0.8 (nct, both tails) first at 348.
    expect(answer.forHalfWidth.returns).toBe(172);
    expect(answer.forDetection.returns).toBe(348);
    expect(answer.dependenceFactor).toBe(1);
    expect(answer.detectionYears).toBe(348 / 252);
    expect(answer.halfWidthYears).toBe(172 / 252);
  });

  test('at the ends of the deviation’s interval', () => {
    const { deviationLower, deviationUpper, forDetection, forHalfWidth } = accepted(ask(0.002));
    const test95 = { level: level95, side: 'both' } as const;
    expect(forDetection.lower).toBe(returnsForPower(0.002 / deviationLower, power, test95));
    expect(forDetection.upper).toBe(returnsForPower(0.002 / deviationUpper, power, test95));
    expect(forHalfWidth.lower).toBeLessThan(forHalfWidth.returns);
    expect(forHalfWidth.upper).toBeGreaterThan(forHalfWidth.returns);
  });

  test('positive autocorrelation asks for more', () => {
    const runs = Float64Array.from({ length: 200 }, (_, day) => (day % 20 < 10 ? 1 : -1));
    const answer = accepted(ask(0.1, runs));
    expect(answer.dependenceFactor).toBeGreaterThan(2);
    const free = returnsForPower(0.1 / answer.sampleStandardDeviation, power, {
      level: level95,
      side: 'both',
    });
    expect(answer.forDetection.returns).toBe(Math.ceil(answer.dependenceFactor * free));
  });

  test('the dependence factor counts from 20 returns on', () => {
    const days = (count: number) => Float64Array.from({ length: count }, (_, day) => (day < 10 ? 1 : -1));
    expect(accepted(ask(0.1, days(19))).dependenceFactor).toBe(1);
    expect(accepted(ask(0.1, days(20))).dependenceFactor).toBeGreaterThan(2);
  });

  test('refusals', () => {
    expect(refusalCode(ask(0))).toBe('sizeOutside');
    expect(refusalCode(ask(Number.POSITIVE_INFINITY))).toBe('sizeOutside');
    expect(refusalMessage(ask(0))).toMatch(/^A size of 0 can never be told from zero\./);
    expect(refusalMessage(ask(0.01, [0.01]))).toMatch(/^A count of returns needed needs at least 2 returns/);
    expect(refusalCode(ask(-0.1))).toBe('sizeOutside');
    expect(refusalCode(ask(0.01, [0.01]))).toBe('tooFewReturns');
    expect(refusalCode(ask(0.01, [0.01, 0.01]))).toBe('priceDoesNotMove');
  });
});
