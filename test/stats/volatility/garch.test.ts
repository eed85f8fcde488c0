import { describe, expect, test } from 'vitest';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { fitGarch, type GarchFit, processOf, startRefits } from '../../../src/stats/volatility/garch.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexCloses } from '../readFixture.ts';
import { simulateGarchReturns } from './simulateReturns.ts';

const clustered = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;
const constant = { mu: 0.0005, omega: 1e-4, alpha: 0, beta: 0 } as const;

const fitted = (returns: Float64Array): GarchFit => {
  const fit = fitGarch(returns);
  if (!fit.ok) throw new Error(fit.problem.message);
  return fit.value;
};

/** Samples of a constant variance in which the fit found no clustering; a refused one is left out. */
const plainFits = () =>
  Array.from({ length: 12 }, (_, replicate) =>
    simulateGarchReturns(600, constant, 5, 200 + replicate),
  ).flatMap((returns) => {
    const fit = fitGarch(returns);
    return fit.ok && !fit.value.clustering ? [{ returns, fit: fit.value }] : [];
  });

const codeOf = (returns: Float64Array): string | null => {
  const fit = fitGarch(returns);
  return fit.ok ? null : fit.problem.code;
};

describe('a GARCH fit', () => {
  test('finds the process that made the returns, within four standard errors', () => {
    const fit = fitted(simulateGarchReturns(5000, clustered, 5, 1));
    const { standardErrors } = fit;
    expect(Math.abs(fit.mu - clustered.mu)).toBeLessThan(4 * standardErrors.mu);
    expect(Math.abs(fit.omega - clustered.omega)).toBeLessThan(4 * standardErrors.omega);
    expect(Math.abs(fit.alpha - clustered.alpha)).toBeLessThan(4 * (standardErrors.alpha ?? 0));
    expect(Math.abs((fit.beta ?? 0) - clustered.beta)).toBeLessThan(4 * (standardErrors.beta ?? 0));
    expect(Math.abs(1 / fit.nu - 1 / 5)).toBeLessThan(4 * (standardErrors.inverseNu ?? 0));
  });

  test('goes to the normal limit for normal innovations whose residuals are not fat-tailed', () => {
    const limits = Array.from({ length: 12 }, (_, replicate) =>
      fitted(simulateGarchReturns(600, clustered, Number.POSITIVE_INFINITY, 100 + replicate)),
    ).filter(({ normalLimit }) => normalLimit);
    // The limit is the maximum in about half of such samples (Self & Liang 1987).
    expect(limits.length).toBeGreaterThan(2);
    for (const fit of limits) {
      expect(fit.nu).toBe(Number.POSITIVE_INFINITY);
      expect(fit.standardErrors.inverseNu).toBeNull();
    }
  });

  test('finds no clustering where there is none, in a good share of samples, and has a constant variance then', () => {
    const plain = plainFits();
    expect(plain.length).toBeGreaterThan(2);
    for (const { fit } of plain) {
      expect(fit.alpha).toBe(0);
      expect(fit.beta).toBeNull();
      expect(fit.standardErrors.alpha).toBeNull();
      expect(relativeError(fit.omega, constant.omega)).toBeLessThan(0.5);
    }
  });

  test('from a fit nearby is the same fit', () => {
    const returns = simpleReturns(indexCloses('DAX'));
    const near = fitted(returns.slice(0, -20));
    const warm = fitGarch(returns, { near });
    const cold = fitted(returns);
    expect(warm.ok).toBe(true);
    if (!warm.ok) return;
    // Both stop within 1e-8 standard errors of the maximum.
    expect(Math.abs(warm.value.alpha - cold.alpha)).toBeLessThan(2e-8 * (cold.standardErrors.alpha ?? 0));
    expect(Math.abs((warm.value.beta ?? 0) - (cold.beta ?? 0))).toBeLessThan(
      2e-8 * (cold.standardErrors.beta ?? 0),
    );
  });

  test('leaves the returns as they were', () => {
    const returns = simulateGarchReturns(1000, clustered, 5, 3);
    const before = returns.slice();
    fitted(returns);
    expect(returns).toEqual(before);
  });
});

describe('a refit to resampled returns', () => {
  test('of a constant variance stays one', () => {
    const [plain] = plainFits();
    if (plain === undefined) throw new Error('none of the samples is without clustering');
    const again = startRefits(plain.returns.length, plain.fit)(plain.returns);
    expect(again).toMatchObject({ alpha: 0, beta: 0 });
    // Both climbs stop at 1e-8 standard errors, and that of omega is a tenth of it.
    expect(relativeError(again?.omega ?? Number.NaN, plain.fit.omega)).toBeLessThan(1e-8);
  });

  test('is none where the whole search is refused', () => {
    const refit = startRefits(1000, fitted(simulateGarchReturns(1000, clustered, 5, 3)));
    // Alpha and beta add up to 0.9995, which a thousand returns often take for more.
    const nearlyIntegrated = { mu: 0, omega: 1e-7, alpha: 0.3, beta: 0.6995 };
    const returns = simulateGarchReturns(1000, nearlyIntegrated, 5, 2);
    expect(codeOf(returns)).toBe('varianceNotStationary');
    expect(refit(returns)).toBeNull();
  });

  test('ends within a thousandth of a standard error of the whole search, one after another', () => {
    const fit = fitted(simulateGarchReturns(1000, clustered, 5, 3));
    const refit = startRefits(1000, fit);
    for (const path of [3, 11, 12, 3]) {
      const returns = simulateGarchReturns(1000, clustered, 5, path);
      const whole = fitted(returns);
      const again = refit(returns);
      const error = (name: 'mu' | 'omega' | 'alpha' | 'beta') =>
        Math.abs((again?.[name] ?? Number.NaN) - processOf(whole)[name]) /
        (whole.standardErrors[name] ?? Number.NaN);
      for (const name of ['mu', 'omega', 'alpha', 'beta'] as const) expect(error(name)).toBeLessThan(1e-3);
    }
  });
});

describe('a GARCH fit is refused', () => {
  test('below 490 returns, naming 490', () => {
    const fit = fitGarch(simulateGarchReturns(489, clustered, 5, 4));
    expect(fit.ok ? null : [fit.problem.code, fit.problem.needs]).toEqual(['tooFewReturns', 490]);
  });

  test('for a price that stands still', () => {
    expect(codeOf(new Float64Array(600))).toBe('priceDoesNotMove');
  });

  test('where two thirds of the returns are equal', () => {
    const returns = simulateGarchReturns(600, clustered, 5, 5).map((value, day) =>
      day % 3 === 0 ? value : 0,
    );
    expect(codeOf(returns)).toBe('likelihoodUnbounded');
  });

  test('where long runs repeat one return, though it fills less than two thirds', () => {
    const returns = simulateGarchReturns(600, clustered, 5, 6).map((value, day) =>
      day % 100 < 50 ? 0 : value,
    );
    expect(codeOf(returns)).toBe('likelihoodUnbounded');
  });

  test('but not for scattered zeros', () => {
    const returns = simulateGarchReturns(600, clustered, 5, 6).map((value, day) => (day % 5 < 2 ? 0 : value));
    expect(codeOf(returns)).not.toBe('likelihoodUnbounded');
  });

  test('where volatility only ever grows', () => {
    const returns = simulateGarchReturns(600, constant, 8, 7).map(
      (value, day) => value * Math.exp(day / 100),
    );
    expect(codeOf(returns)).toBe('varianceNotStationary');
  });

  test('where the variance of a day is infinite', () => {
    const returns = Float64Array.from({ length: 600 }, (_, day) =>
      Math.tan(2.8 * Math.sin(day * day * 0.7 + day)),
    );
    expect(codeOf(returns)).toBe('varianceNotStationary');
  });
});
