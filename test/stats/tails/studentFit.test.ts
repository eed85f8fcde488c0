import { describe, expect, it } from 'vitest';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { fitStudent } from '../../../src/stats/tails/studentFit.ts';
import type { Result } from '../../../src/terms/result.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { indexReturns } from '../indexWindows.ts';
import { testStreams } from '../testStreams.ts';

const random = testStreams(7).stream(0);
const studentReturns = (count: number, nu: number): Float64Array =>
  Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));

const needsOf = (result: Result<unknown>) => (result.ok ? null : result.problem.needs);

/** `zeros` returns of 0 among normal ones. */
const withZeros = (zeros: number, count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, index) => (index < zeros ? 0 : 0.01 * nextNormal(random)));

describe('Refusals of a Student fit', () => {
  it('asks for 20 returns', () => {
    expect(refusalCode(fitStudent(studentReturns(19, 4)))).toBe('tooFewReturns');
    expect(needsOf(fitStudent(studentReturns(19, 4)))).toBe(20);
    expect(refusalCode(fitStudent(studentReturns(20, 4)))).toBe('not refused');
  });

  it('asks for a price that moves', () => {
    expect(refusalCode(fitStudent(new Float64Array(60)))).toBe('priceDoesNotMove');
  });

  it('refuses a likelihood without a highest point: a third of the returns are equal', () => {
    expect(refusalCode(fitStudent(withZeros(20, 60)))).toBe('likelihoodUnbounded');
    expect(refusalCode(fitStudent(withZeros(19, 60)))).toBe('not refused');
  });
});

describe('Where the fit lies', () => {
  it('is the normal distribution where tails are thinner than the bell curve', () => {
    const returns = Float64Array.from({ length: 60 }, (_, index) => (index % 20) / 1000);
    const fit = accepted(fitStudent(returns));
    expect(fit).toMatchObject({ nu: Number.POSITIVE_INFINITY, normalLimit: true, nuOnBound: false });
    // mean and √m2 of 0..19 in thousandths: 9.5 and √((20² − 1)/12)
    expect(fit.location).toBeCloseTo(0.0095, 14);
    expect(fit.scale).toBeCloseTo(Math.sqrt(399 / 12) / 1000, 14);
    expect(fit.logLikelihood).toBe(fit.normalLogLikelihood);
  });

  it('is held on nu = 0.5 where the tails are heavier still', () => {
    const fit = accepted(fitStudent(studentReturns(400, 0.25)));
    expect(fit.nu).toBe(0.5);
    expect(fit.nuOnBound).toBe(true);
  });

  it('takes the higher of two maxima, also where it is not the one near the normal limit', () => {
    // 30% zero returns among normal ones: one maximum near the bell curve, another on the spike at zero.
    const near = accepted(fitStudent(withZeros(9, 60)));
    expect(near.nu).toBeGreaterThan(1);
    // just under a third: the spike wins
    const spike = accepted(fitStudent(withZeros(83, 250)));
    expect(spike.nuOnBound).toBe(true);
    expect(Math.abs(spike.location)).toBeLessThan(1e-4);
  });

  it('takes the normal limit where an interior maximum is lower, and the interior one where it is higher', () => {
    // Two clusters, g2 far below 0: the normal limit is a maximum by itself, and not the highest one.
    const clusters = Float64Array.from({ length: 60 }, (_, index) =>
      index % 5 < 2 ? -0.01 + 1e-5 * (index % 7) : 0.01 + 3e-5 * (index % 11),
    );
    const fit = accepted(fitStudent(clusters));
    expect(fit.normalLimit).toBe(false);
    expect(fit.logLikelihood).toBeGreaterThan(fit.normalLogLikelihood + 5);
  });
});

describe('A fit that starts from one nearby', () => {
  it('ends on the same maximum to the stopping rule', () => {
    const returns = indexReturns('DAX', '250');
    const cold = accepted(fitStudent(returns));
    const warm = accepted(fitStudent(returns, { location: 0, scale: 0.01, nu: 5 }));
    // both stop within 1e-8 standard errors, and Newton's last step squares that
    expect(Math.abs(warm.nu / cold.nu - 1)).toBeLessThan(1e-11);
    expect(Math.abs(warm.scale / cold.scale - 1)).toBeLessThan(1e-12);
  });

  it('reaches the normal limit from inside, and leaves it', () => {
    const flat = Float64Array.from({ length: 60 }, (_, index) => (index % 20) / 1000);
    expect(accepted(fitStudent(flat, { location: 0, scale: 0.01, nu: 5 })).normalLimit).toBe(true);
    const near = { location: 0, scale: 0.01, nu: Number.POSITIVE_INFINITY };
    expect(accepted(fitStudent(indexReturns('DAX', '250'), near)).nu).toBeCloseTo(8.085119600230746, 9);
  });

  it('leaves its input as it was', () => {
    const returns = studentReturns(100, 4);
    const before = returns.slice();
    fitStudent(returns);
    expect(returns).toEqual(before);
  });
});

describe('A start near a lower maximum', () => {
  it('does not keep the fit there', () => {
    // just under a third zero returns: the spike at zero is the highest maximum, another lies near nu = 2.
    const returns = withZeros(83, 250);
    const cold = accepted(fitStudent(returns));
    const warm = accepted(fitStudent(returns, { location: 0, scale: 0.006, nu: 2.4 }));
    expect(cold.nuOnBound).toBe(true);
    expect(warm.nuOnBound).toBe(true);
    expect(Math.abs(warm.logLikelihood - cold.logLikelihood)).toBeLessThan(1e-9);
  });
});
