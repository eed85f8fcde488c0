import jStat from 'jstat';
import { describe, expect, it } from 'vitest';
import { chiSquareQuantile, chiSquareUpperQuantile } from '../../../src/stats/distributions/chiSquare.ts';
import { normalDensity, normalQuantile, normalUpperTail } from '../../../src/stats/distributions/normal.ts';
import {
  studentTCdf,
  studentTDensity,
  studentTQuantile,
  studentTUpperTail,
} from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { gridRows } from './figures.ts';

// Source of every figure here: fixtures/quantiles.json, mpmath 1.2.1 at 60 digits. 1e-12 is what is promised of quantiles
// and tails; it is far above what rounding does to them and far below what a wrong term would do.
const promised = 1e-12;

describe('normal', () => {
  it('has its quantiles', () => {
    for (const { of, where } of gridRows('normal_quantiles')) {
      const quantile = -normalQuantile(of('upper_tail_probability'));
      expect(relativeError(quantile, of('quantile')), where).toBeLessThan(promised);
    }
  });

  it('has its upper tails', () => {
    for (const { of, where } of gridRows('normal_upper_tails')) {
      const error = relativeError(normalUpperTail(of('z')), of('upper_tail_probability'));
      expect(error, where).toBeLessThan(promised);
    }
  });

  it('gives VaR and expected shortfall', () => {
    // 1 − level as a double costs up to a digit at 0.999; 1e-12 leaves room for it
    for (const { of, where } of gridRows('normal_var_es')) {
      const z = normalQuantile(of('level'));
      expect(relativeError(z, of('var')), where).toBeLessThan(promised);
      expect(relativeError(normalDensity(z) / (1 - of('level')), of('es')), where).toBeLessThan(promised);
    }
  });
});

describe('Student t', () => {
  const quantiles = gridRows('student_t_quantiles');

  it('has its quantiles for 21 nu', () => {
    expect(quantiles).toHaveLength(294);
    for (const { of, where } of quantiles) {
      const quantile = -studentTQuantile(of('upper_tail_probability'), of('nu'));
      expect(relativeError(quantile, of('quantile')), where).toBeLessThan(promised);
    }
  });

  it('has its upper tails, down to what a double holds', () => {
    for (const { of, where } of gridRows('student_t_upper_tails')) {
      const tail = studentTUpperTail(of('t'), of('nu'));
      expect(relativeError(tail, of('upper_tail_probability')), where).toBeLessThan(promised);
      expect(studentTCdf(-of('t'), of('nu')), where).toBe(tail);
    }
  });

  it('gives VaR and expected shortfall of the unit scale', () => {
    // as for the normal
    for (const { of, where } of gridRows('student_t_var_es')) {
      const q = studentTQuantile(of('level'), of('nu'));
      expect(relativeError(q, of('var_t')), where).toBeLessThan(promised);
      const beyond = (of('nu') + q * q) / (of('nu') - 1);
      const shortfall = (studentTDensity(q, of('nu')) / (1 - of('level'))) * beyond;
      expect(relativeError(shortfall, of('es_t')), where).toBeLessThan(promised);
    }
  });

  it('needs more than jStat, by the figures in the doc block', () => {
    const errors = quantiles.map(({ of }) =>
      relativeError(-jStat.studentt.inv(of('upper_tail_probability'), of('nu')), of('quantile')),
    );
    expect(medianOf(errors)).toBeCloseTo(1.3e-10, 11);
    expect(Math.max(...errors)).toBeCloseTo(1.5e-3, 4);
  });
});

describe('chi-square', () => {
  const rows = gridRows('chi_square_quantiles');

  it('has its quantiles, asked for from either tail', () => {
    expect(rows).toHaveLength(99);
    for (const { of, where } of rows) {
      const p = of('lower_tail_probability');
      expect(relativeError(chiSquareQuantile(p, of('df')), of('quantile')), where).toBeLessThan(promised);
      expect(relativeError(chiSquareUpperQuantile(1 - p, of('df')), of('quantile')), where).toBeLessThan(
        promised,
      );
    }
  });

  it('needs more than jStat, by the figures in the doc block', () => {
    const errors = rows.map(({ of }) =>
      relativeError(jStat.chisquare.inv(of('lower_tail_probability'), of('df')), of('quantile')),
    );
    expect(medianOf(errors)).toBeCloseTo(8.8e-14, 15);
    expect(Math.max(...errors)).toBeCloseTo(1.3e-11, 12);
  });
});

const medianOf = (values: readonly number[]): number =>
  [...values].sort((a, b) => a - b)[values.length >> 1] ?? Number.NaN;
