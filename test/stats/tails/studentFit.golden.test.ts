import { describe, expect, it } from 'vitest';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { fitStudent } from '../../../src/stats/tails/studentFit.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { fixtureJson, indexCloses } from '../readFixture.ts';

type ReferenceFit = {
  readonly location: number;
  readonly scale: number;
  readonly nu: number | 'infinity';
  readonly log_likelihood: number;
};

type ReferenceCase = {
  readonly ticker: string;
  readonly window: string;
  readonly n: number;
  readonly student_t_fit: ReferenceFit;
};

type OutsideFit = {
  readonly log_likelihood: number;
  readonly location: number;
  readonly scale: number;
  readonly inverse_nu: number;
  readonly log_likelihood_of_scipy_stats_t_fit: number | null;
};

type OutsideFits = {
  readonly simulated: readonly {
    readonly name: string;
    readonly returns: readonly number[];
    readonly fit: OutsideFit;
  }[];
  readonly indices: readonly {
    readonly ticker: string;
    readonly end: number;
    readonly window: number;
    readonly fit: OutsideFit;
  }[];
};

const reference = fixtureJson<{ readonly cases: readonly ReferenceCase[] }>('eu-indices/reference.json');
const fittable = reference.cases.filter((each) => each.student_t_fit !== undefined && each.n >= 20);

describe('Student fits of index windows, against mpmath 1.2.1 at 40 digits (eu-indices/reference.json)', () => {
  it('has cases to compare', () => {
    expect(fittable.length).toBe(8);
  });

  for (const { ticker, window, student_t_fit: expected } of fittable)
    it(`agrees on ${ticker} over ${window}`, () => {
      const fit = accepted(fitStudent(indexReturns(ticker, window)));
      // The reference carries 17 digits. Newton's last step leaves the rounding of the gradient times the inverse
      // curvature: 1e-10 covers the flat maximum of DAX over 60 days, where nu is known to 1e-11 only.
      expect(relativeError(fit.location, expected.location)).toBeLessThan(window === '60' ? 1e-8 : 1e-12);
      expect(relativeError(fit.scale, expected.scale)).toBeLessThan(1e-11);
      expect(relativeError(fit.logLikelihood, expected.log_likelihood)).toBeLessThan(1e-14 * 20);
      expect(fit.normalLimit).toBe(expected.nu === 'infinity');
      if (expected.nu === 'infinity') expect(fit.nu).toBe(Number.POSITIVE_INFINITY);
      else expect(relativeError(fit.nu, expected.nu)).toBeLessThan(1e-10);
    });
});

/** The likelihood may not be lower than what a general optimiser finds by more than this. */
const grantedLoss = 1e-7;

describe('Student fits against the best of many SciPy fits (student-fits/studentFits.json)', () => {
  const outside = fixtureJson<OutsideFits>('student-fits/studentFits.json');
  const compare = (returns: Float64Array, expected: OutsideFit) => {
    const fit = accepted(fitStudent(returns));
    expect(fit.logLikelihood).toBeGreaterThan(expected.log_likelihood - grantedLoss);
    const direct = expected.log_likelihood_of_scipy_stats_t_fit;
    if (direct !== null) expect(fit.logLikelihood).toBeGreaterThan(direct - grantedLoss);
    // Where both stand on one maximum the parameters agree as far as Nelder-Mead resolves a flat top: 1e-4 of a unit.
    if (Math.abs(fit.logLikelihood - expected.log_likelihood) < grantedLoss) {
      expect(Math.abs(1 / fit.nu - expected.inverse_nu)).toBeLessThan(1e-4);
      expect(relativeError(fit.scale, expected.scale)).toBeLessThan(1e-4);
      expect(Math.abs(fit.location - expected.location)).toBeLessThan(1e-4 * expected.scale);
    }
  };

  it('has cases to compare', () => {
    expect(outside.simulated.length).toBe(30);
    expect(outside.indices.length).toBe(28);
  });

  for (const { name, returns, fit } of outside.simulated)
    it(`is not beaten on simulated returns: ${name}`, () => compare(Float64Array.from(returns), fit));

  for (const { ticker, end, window, fit } of outside.indices)
    it(`is not beaten on ${window} returns of ${ticker} up to return ${end}`, () => {
      compare(simpleReturns(indexCloses(ticker)).slice(end - window, end), fit);
    });
});
