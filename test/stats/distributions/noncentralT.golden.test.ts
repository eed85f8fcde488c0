import { describe, expect, it } from 'vitest';
import {
  noncentralityAt,
  noncentralTCdf,
  noncentralTQuantile,
  noncentralTUpperTail,
} from '../../../src/stats/distributions/noncentralT.ts';
import { studentTQuantile } from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { pointRows, powerRows } from './figures.ts';

describe('noncentral t against mpmath', () => {
  // fixtures/distribution-points.json, mpmath 1.3.0: nu from 0.7 to 5000, |delta| up to 100
  it('has both tails', () => {
    // 1e-12: rounding of the exponent, up to 700 in size, is 1e-13
    for (const { of, where } of pointRows('noncentral_t')) {
      const [t, nu, delta] = [of('t'), of('nu'), of('delta')];
      expect(relativeError(noncentralTCdf(t, nu, delta), of('lower')), where).toBeLessThan(1e-12);
      expect(relativeError(noncentralTUpperTail(t, nu, delta), of('upper')), where).toBeLessThan(1e-12);
      expect(noncentralTCdf(-t, nu, -delta), where).toBe(noncentralTUpperTail(t, nu, delta));
    }
  });

  it('finds the delta and the t that the tail came from', () => {
    // only where the lower tail is a double that still tells neighbouring deltas apart to 1e-12
    for (const { of, where } of pointRows('noncentral_t')) {
      const p = of('lower');
      if (p < 1e-300 || p > 0.9) continue;
      expect(relativeError(noncentralityAt(p, of('t'), of('nu')), of('delta')), where).toBeLessThan(1e-12);
      expect(relativeError(noncentralTQuantile(p, of('nu'), of('delta')), of('t')), where).toBeLessThan(
        1e-12,
      );
    }
  });
});

describe('noncentral t where delta is far from t', () => {
  it.each([
    // SciPy 1.17.1: scipy.stats.nct.cdf(t, nu, delta), good to about 12 digits there
    [1, 1, 40, 5.3958656116078254e-176],
    [1e-5, 3, 30, 4.908071844537455e-198],
    [30, 1e6, 31, 0.15870787031042452],
    [3, 0.05, 2, 0.1198692311485644],
  ])('t %d, nu %d, delta %d', (t, nu, delta, expected) => {
    expect(relativeError(noncentralTCdf(t, nu, delta), expected)).toBeLessThan(1e-11);
  });

  it('reaches far quantiles', () => {
    // nu = 1: the tails are those of a Cauchy number, t falls as 1/p; back through the tail itself, which is checked above
    for (const p of [1e-12, 1e-3, 0.999]) {
      const t = noncentralTQuantile(p, 1, 0.5);
      expect(relativeError(noncentralTCdf(t, 1, 0.5), p)).toBeLessThan(1e-12);
    }
  });

  it('never leaves [0, 1]', () => {
    expect(noncentralTCdf(1e10, 2, 1)).toBeLessThanOrEqual(1);
    expect(noncentralTUpperTail(1, 1, 1000)).toBeLessThanOrEqual(1);
    expect(noncentralTCdf(1, 1, 1000)).toBe(0);
  });
});

// fixtures/power-mean.json, mpmath 1.2.1, printed to 15 digits
describe('power of the t test', () => {
  const oneSidedPower = (n: number, effect: number, alpha: number): number =>
    noncentralTUpperTail(-studentTQuantile(alpha, n - 1), n - 1, effect * Math.sqrt(n));
  const twoSidedPower = (n: number, effect: number, alpha: number): number =>
    oneSidedPower(n, effect, alpha / 2) +
    noncentralTCdf(studentTQuantile(alpha / 2, n - 1), n - 1, effect * Math.sqrt(n));

  it('two-sided, both tails counted', () => {
    for (const { of, where } of powerRows('power_one_sample_t', 'two.sided')) {
      const power = twoSidedPower(of('n'), of('effect_in_sd'), of('alpha'));
      expect(relativeError(power, of('power')), where).toBeLessThan(1e-13);
    }
  });

  it('at the broken size that gives exactly the power, both ways of testing', () => {
    // a unit in the 15th digit of the size moves the power by less than that
    for (const { of, where } of powerRows('sample_size_one_sample_t', 'two.sided')) {
      const power = twoSidedPower(of('n_exact_noncentral_t'), of('effect_in_sd'), of('alpha'));
      expect(relativeError(power, of('power')), where).toBeLessThan(1e-13);
    }
    for (const { of, where } of powerRows('sample_size_one_sample_t', 'one.sided')) {
      const power = oneSidedPower(of('n_exact_noncentral_t'), of('effect_in_sd'), of('alpha'));
      expect(relativeError(power, of('power')), where).toBeLessThan(1e-13);
    }
  });
});
