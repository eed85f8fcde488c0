import { describe, expect, test } from 'vitest';
import { detectableNoncentrality, meanTestPower } from '../../../src/stats/samples/power.ts';
import { returnsForPower } from '../../../src/stats/samples/returnsForPower.ts';
import { type Level, levelFromFraction } from '../../../src/terms/level.ts';
import type { Side } from '../../../src/terms/side.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { fixtureJson } from '../readFixture.ts';

type Size = {
  readonly alternative: 'two.sided' | 'one.sided';
  readonly alpha: number;
  readonly power: number;
  readonly effect_in_sd: number;
  readonly n_exact_noncentral_t: number;
  readonly n_rounded_up: number;
};
type Power = {
  readonly alternative: 'two.sided' | 'one.sided';
  readonly n: number;
  readonly effect_in_sd: number;
  readonly alpha: number;
  readonly power: number;
};
type Fixture = { readonly cases: readonly [{ readonly values: Size[] }, { readonly values: Power[] }] };

const [sizes, powers] = fixtureJson<Fixture>('power-mean.json').cases;

const levelOf = (fraction: number): Level => {
  const level = levelFromFraction(fraction.toFixed(4));
  if (level === null) throw new Error(`no level ${fraction}`);
  return level;
};
const sideOf = (alternative: string): Side => (alternative === 'two.sided' ? 'both' : 'above');

// mpmath 1.2.1 at 25 digits, printed to 15; R 4.2.2 agrees to 4e-11.
describe('power of the t test', () => {
  test.each(powers.values)('$alternative n $n effect $effect_in_sd alpha $alpha', (value) => {
    const test = { level: levelOf(1 - value.alpha), side: sideOf(value.alternative) };
    const power = meanTestPower(value.effect_in_sd * Math.sqrt(value.n), value.n - 1, test);
    // 15 digits are printed; the noncentral t is promised to 1e-12.
    expect(relativeError(power, value.power)).toBeLessThan(1e-12);
  });
});

describe('returns for a power', () => {
  test.each(sizes.values)('$alternative alpha $alpha power $power effect $effect_in_sd', (value) => {
    const test = { level: levelOf(1 - value.alpha), side: sideOf(value.alternative) };
    const power = levelOf(value.power);
    expect(returnsForPower(value.effect_in_sd, power, test)).toBe(value.n_rounded_up);
    // At the real-valued n the noncentrality is exactly the detectable one.
    const exact = value.n_exact_noncentral_t;
    const noncentrality = detectableNoncentrality(power, exact - 1, test);
    expect(relativeError(noncentrality, value.effect_in_sd * Math.sqrt(exact))).toBeLessThan(1e-12);
  });
});

describe('edges', () => {
  const test95 = { level: levelOf(0.95), side: 'both' } as const;

  test('a power that chance alone gives needs no difference and no more than 2 returns', () => {
    expect(detectableNoncentrality(levelOf(0.04), 20, test95)).toBe(0);
    expect(returnsForPower(0.1, levelOf(0.04), test95)).toBe(2);
  });

  test('no difference can be told by any count: a bug of the caller', () => {
    expect(() => returnsForPower(0, levelOf(0.8), test95)).toThrow(RangeError);
  });

  test('the formula above a million returns continues the search below it', () => {
    // At 2.8/1000 the search gives 1,001,173 or so; the formula's first omitted term is of the order of 1/n.
    const searched = returnsForPower(0.0028026, levelOf(0.8), test95);
    const formula = returnsForPower(0.0028014, levelOf(0.8), test95);
    expect(searched).toBeLessThan(1e6);
    expect(formula).toBeGreaterThan(1e6);
    expect(formula / searched).toBeCloseTo((0.0028026 / 0.0028014) ** 2, 5);
  });
});
