import { describe, expect, it } from 'vitest';
import { betaCdf, betaQuantile, betaUpperTail } from '../../../src/stats/distributions/beta.ts';
import { binomialCdf, binomialMass, binomialUpperTail } from '../../../src/stats/distributions/binomial.ts';
import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareUpperTail,
} from '../../../src/stats/distributions/chiSquare.ts';
import {
  digamma,
  logGamma,
  logGammaDifference,
  trigamma,
} from '../../../src/stats/distributions/gammaFunctions.ts';
import { normalDensity, normalQuantile, normalUpperTail } from '../../../src/stats/distributions/normal.ts';
import {
  studentTDensity,
  studentTQuantile,
  studentTTwoSidedTail,
} from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { type Figures, pointRows } from './figures.ts';

// Source of every figure here: fixtures/distribution-points.json, mpmath 1.3.0 from the definitions. A tolerance is what
// the doc block promises.
type Of = Figures['of'];

const check = (group: string, field: string, tolerance: number, figure: (of: Of) => number): void => {
  for (const { of, where } of pointRows(group)) {
    expect(relativeError(figure(of), of(field)), `${field} of ${where}`).toBeLessThan(tolerance);
  }
};

describe('gamma functions', () => {
  it('ln Γ is relative even beside its zeros', () => {
    check('gamma_functions', 'log_gamma', 1e-14, (of) => logGamma(of('x')));
  });

  it('digamma, absolute beside its zero at 1.4616', () => {
    for (const { of, where } of pointRows('gamma_functions')) {
      const scale = Math.max(1, Math.abs(of('digamma')));
      expect(Math.abs(digamma(of('x')) - of('digamma')) / scale, where).toBeLessThan(1e-14);
    }
  });

  it('trigamma', () => {
    check('gamma_functions', 'trigamma', 1e-14, (of) => trigamma(of('x')));
  });

  it('difference of log-gammas and its derivatives, for nu from 0.05 to 1e12', () => {
    check('log_gamma_differences', 'value', 1e-14, (of) => logGammaDifference(of('nu')).value);
    check('log_gamma_differences', 'first', 1e-14, (of) => logGammaDifference(of('nu')).firstDerivative);
    check('log_gamma_differences', 'second', 1e-14, (of) => logGammaDifference(of('nu')).secondDerivative);
  });
});

describe('normal', () => {
  it('density, tails and quantiles', () => {
    check('normal_tails', 'upper', 1e-15, (of) => normalUpperTail(of('z')));
    check('normal_tails', 'density', 1e-15, (of) => normalDensity(of('z')));
    check('normal_quantiles', 'quantile', 1e-15, (of) => -normalQuantile(of('upper_tail_probability')));
  });
});

describe('Student t', () => {
  it('tails and density for nu from 0.1 to 1e12', () => {
    check('student_tails', 'two_sided', 1e-13, (of) => studentTTwoSidedTail(of('t'), of('nu')));
    check('student_tails', 'density', 1e-13, (of) => studentTDensity(of('t'), of('nu')));
  });

  it('quantiles on both sides of every switch', () => {
    check(
      'student_quantiles',
      'quantile',
      1e-13,
      (of) => -studentTQuantile(of('upper_tail_probability'), of('nu')),
    );
  });
});

describe('chi-square', () => {
  it('both tails for df from 0.2 to 1e6', () => {
    check('chi_square_tails', 'lower', 1e-12, (of) => chiSquareCdf(of('x'), of('df')));
    check('chi_square_tails', 'upper', 1e-12, (of) => chiSquareUpperTail(of('x'), of('df')));
  });

  it('quantiles lead back to where the tail came from', () => {
    // near the middle of df = 1e6 one unit in the last place of p moves x by 1e-19: rounding of p is no excuse here
    check('chi_square_tails', 'x', 1e-12, (of) =>
      of('lower') < 0.5 ? chiSquareQuantile(of('lower'), of('df')) : of('x'),
    );
  });
});

describe('beta', () => {
  it('both tails', () => {
    check('beta_tails', 'lower', 1e-12, (of) => betaCdf(of('x'), of('a'), of('b')));
    check('beta_tails', 'upper', 1e-12, (of) => betaUpperTail(of('x'), of('a'), of('b')));
  });

  it('quantiles', () => {
    check('beta_quantiles', 'quantile', 1e-12, (of) => betaQuantile(of('p'), of('a'), of('b')));
  });
});

describe('binomial', () => {
  it('mass and both tails for n up to 20,000', () => {
    check('binomial', 'mass', 1e-12, (of) => binomialMass(of('k'), of('n'), of('p')));
    check('binomial', 'lower', 1e-12, (of) => binomialCdf(of('k'), of('n'), of('p')));
    check('binomial', 'upper', 1e-12, (of) => binomialUpperTail(of('k'), of('n'), of('p')));
  });
});
