import { describe, expect, it } from 'vitest';
import { betaCdf, betaQuantile, betaUpperTail } from '../../../src/stats/distributions/beta.ts';
import { binomialCdf, binomialMass, binomialUpperTail } from '../../../src/stats/distributions/binomial.ts';
import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareUpperQuantile,
  chiSquareUpperTail,
} from '../../../src/stats/distributions/chiSquare.ts';
import {
  digamma,
  logGamma,
  logGammaDifference,
  trigamma,
} from '../../../src/stats/distributions/gammaFunctions.ts';
import {
  noncentralityAt,
  noncentralTCdf,
  noncentralTQuantile,
  noncentralTUpperTail,
} from '../../../src/stats/distributions/noncentralT.ts';
import {
  normalCdf,
  normalDensity,
  normalQuantile,
  normalUpperTail,
} from '../../../src/stats/distributions/normal.ts';
import {
  studentTCdf,
  studentTDensity,
  studentTQuantile,
  studentTTwoSidedTail,
  studentTUpperTail,
} from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';

const { NaN: notANumber, POSITIVE_INFINITY: infinity } = Number;

describe('at the ends of the domain', () => {
  it('normal', () => {
    expect([normalCdf(-infinity), normalCdf(infinity), normalUpperTail(infinity)]).toEqual([0, 1, 0]);
    expect([normalDensity(infinity), normalDensity(39)]).toEqual([0, 0]);
    expect(normalQuantile(0.5)).toBe(0);
    expect(normalCdf(0)).toBe(0.5);
  });

  it('Student t', () => {
    expect([studentTTwoSidedTail(0, 3), studentTCdf(0, 0.3), studentTUpperTail(0, 70)]).toEqual([
      1, 0.5, 0.5,
    ]);
    for (const nu of [0.1, 1, 7, 31, 500]) expect(studentTTwoSidedTail(1e-200, nu)).toBeLessThanOrEqual(1);
    expect([studentTCdf(infinity, 3), studentTCdf(-infinity, 3), studentTDensity(infinity, 3)]).toEqual([
      1, 0, 0,
    ]);
    expect(studentTQuantile(0.5, 3)).toBe(0);
    expect(studentTQuantile(0.975, infinity)).toBe(normalQuantile(0.975));
    expect(studentTUpperTail(1.7, infinity)).toBe(normalUpperTail(1.7));
    expect(studentTDensity(1.7, infinity)).toBe(normalDensity(1.7));
    // nu = 0.01 and p = 1e-10: t is about 1e1000
    expect(studentTQuantile(1e-10, 0.01)).toBe(-infinity);
    expect(studentTTwoSidedTail(1e200, 1)).toBeCloseTo(0, 15);
    expect(studentTTwoSidedTail(1e200, 1)).toBeGreaterThan(0);
  });

  it('chi-square', () => {
    expect([chiSquareCdf(0, 3), chiSquareCdf(-1, 3), chiSquareCdf(infinity, 3)]).toEqual([0, 0, 1]);
    expect([chiSquareUpperTail(0, 3), chiSquareUpperTail(infinity, 3)]).toEqual([1, 0]);
  });

  it('chi-square beyond a tail of almost one is the lower tail that is left', () => {
    // 1 − 2^-40 is exact; the lower tail of 2^-40 keeps all digits, its complement would keep five of them.
    for (const df of [1, 9, 200])
      expect(
        relativeError(chiSquareUpperQuantile(1 - 2 ** -40, df), chiSquareQuantile(2 ** -40, df)),
      ).toBeLessThan(1e-12);
  });

  it('beta', () => {
    expect([betaCdf(0, 2, 3), betaCdf(1, 2, 3), betaUpperTail(0, 2, 3), betaUpperTail(1, 2, 3)]).toEqual([
      0, 1, 1, 0,
    ]);
    expect([betaQuantile(0, 2, 3), betaQuantile(1, 2, 3)]).toEqual([0, 1]);
  });

  it('binomial', () => {
    expect([
      binomialMass(0, 5, 0),
      binomialMass(1, 5, 0),
      binomialMass(5, 5, 1),
      binomialMass(4, 5, 1),
    ]).toEqual([1, 0, 1, 0]);
    expect([binomialMass(-1, 5, 0.5), binomialMass(6, 5, 0.5), binomialMass(0, 0, 0.5)]).toEqual([0, 0, 1]);
    expect([
      binomialCdf(-1, 5, 0.5),
      binomialCdf(5, 5, 0.5),
      binomialCdf(2, 5, 0),
      binomialCdf(2, 5, 1),
    ]).toEqual([0, 1, 1, 0]);
    expect([binomialUpperTail(0, 5, 0.5), binomialUpperTail(6, 5, 0.5)]).toEqual([1, 0]);
    expect([binomialUpperTail(2, 5, 0), binomialUpperTail(2, 5, 1)]).toEqual([0, 1]);
  });

  it('noncentral t', () => {
    expect(noncentralTCdf(2, infinity, 1)).toBe(normalCdf(1));
    expect(noncentralTCdf(0, 7, 1.5)).toBe(normalCdf(-1.5));
    expect(noncentralTCdf(1.2, 7, 0)).toBe(studentTCdf(1.2, 7));
    expect(noncentralTUpperTail(0, 7, 1.5)).toBe(normalCdf(1.5));
    // a tail far below the smallest double
    expect(noncentralTCdf(-5, 5000, 100)).toBe(0);
  });

  it('gamma functions', () => {
    expect([logGamma(1), logGamma(2), logGamma(infinity)]).toEqual([0, 0, infinity]);
  });
});

describe('outside the domain every function throws and names itself', () => {
  it.each([
    ['normalDensity', () => normalDensity(notANumber)],
    ['normalCdf', () => normalCdf(notANumber)],
    ['normalUpperTail', () => normalUpperTail(notANumber)],
    ['normalQuantile', () => normalQuantile(0)],
    ['normalQuantile', () => normalQuantile(1)],
    ['normalQuantile', () => normalQuantile(notANumber)],
    ['studentTDensity', () => studentTDensity(1, 0)],
    ['studentTTwoSidedTail', () => studentTTwoSidedTail(notANumber, 3)],
    ['studentTTwoSidedTail', () => studentTCdf(1, notANumber)],
    ['studentTQuantile', () => studentTQuantile(1, 3)],
    ['studentTQuantile', () => studentTQuantile(0.5, -1)],
    ['chiSquareCdf', () => chiSquareCdf(1, 0)],
    ['chiSquareUpperTail', () => chiSquareUpperTail(notANumber, 1)],
    ['chiSquareQuantile', () => chiSquareQuantile(0, 1)],
    ['chiSquareUpperQuantile', () => chiSquareUpperQuantile(1, 1)],
    ['chiSquareQuantile', () => chiSquareQuantile(1, 1)],
    ['chiSquareUpperQuantile', () => chiSquareUpperQuantile(0, 1)],
    ['studentTQuantile', () => studentTQuantile(0, 3)],
    ['noncentralTQuantile', () => noncentralTQuantile(0, 3, 1)],
    ['noncentralityAt', () => noncentralityAt(1, 1, 3)],
    ['noncentralTCdf', () => noncentralTCdf(1, 3, infinity)],
    ['betaCdf', () => betaCdf(-0.1, 1, 1)],
    ['betaUpperTail', () => betaUpperTail(0.5, 1, 0)],
    ['betaUpperTail', () => betaUpperTail(0.5, 1, infinity)],
    ['binomialMass', () => binomialMass(1, -1, 0.5)],
    ['binomialCdf', () => binomialCdf(1, 2, -0.1)],
    ['chiSquareCdf', () => chiSquareCdf(1, infinity)],
    ['chiSquareQuantile', () => chiSquareQuantile(0.5, infinity)],
    ['betaCdf', () => betaCdf(1.1, 1, 1)],
    ['betaUpperTail', () => betaUpperTail(0.5, 0, 1)],
    ['betaQuantile', () => betaQuantile(-0.1, 1, 1)],
    ['binomialMass', () => binomialMass(1, 2.5, 0.5)],
    ['binomialCdf', () => binomialCdf(0.5, 2, 0.5)],
    ['binomialUpperTail', () => binomialUpperTail(1, 2, 1.5)],
    ['noncentralTCdf', () => noncentralTCdf(1, 0, 1)],
    ['noncentralTUpperTail', () => noncentralTUpperTail(infinity, 3, 1)],
    ['noncentralTQuantile', () => noncentralTQuantile(1, 3, 1)],
    ['noncentralityAt', () => noncentralityAt(0, 1, 3)],
    ['logGamma', () => logGamma(0)],
    ['digamma', () => digamma(-1)],
    ['trigamma', () => trigamma(notANumber)],
    ['logGammaDifference', () => logGammaDifference(infinity)],
  ] as const)('%s', (name, call) => {
    expect(call).toThrow(new RegExp(`^${name}: `));
    expect(call).toThrow(RangeError);
  });
});
