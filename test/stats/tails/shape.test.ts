import { describe, expect, it } from 'vitest';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { normalShapeProbabilities } from '../../../src/stats/tails/internal/normalShape.ts';
import { studentDistanceProbability } from '../../../src/stats/tails/internal/studentDistance.ts';
import { shape } from '../../../src/stats/tails/shape.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(6);
const ask = (returns: Float64Array) => shape({ returns, confidence: level95, streams });

describe('The shape of DAX over its last 250 returns', () => {
  const figures = accepted(ask(indexReturns('DAX', '250')));
  const student = accepted(figures.student);

  it('agrees with SciPy where a figure has a formula', () => {
    // SciPy 1.17.1 at the fitted parameters: t.logpdf and norm.logpdf summed, chi2.sf, t.cdf over norm.cdf.
    expect(relativeError(student.likelihoodRatio, 5.4411584110025615)).toBeLessThan(1e-11);
    expect(relativeError(student.likelihoodRatioP, 0.009833810739157104)).toBeLessThan(1e-11);
    expect(student.tailMultiples.map(({ deviations }) => deviations)).toEqual([3, 4, 5]);
    for (const [index, multiple] of [3.0826077053888046, 26.293993706823343, 703.6682370095829].entries())
      expect(relativeError(student.tailMultiples[index]?.multiple ?? Number.NaN, multiple)).toBeLessThan(
        1e-11,
      );
    expect(figures.andersonDarlingNormal).toBeCloseTo(0.788798864554991, 10);
    expect(student.andersonDarling).toBeCloseTo(0.3361709878382442, 10);
  });

  it('has p-values of whole replicates over 1,000', () => {
    for (const p of [
      figures.andersonDarlingNormalP,
      student.andersonDarlingP,
      figures.jarqueBeraSimulatedP,
    ]) {
      expect(p).toBeGreaterThanOrEqual(0.001);
      expect(Math.abs(1000 * (p ?? Number.NaN) - Math.round(1000 * (p ?? Number.NaN)))).toBeLessThan(1e-9);
    }
    expect(student.notes).toEqual([]);
  });

  it('is the same for the same streams', () => {
    expect(accepted(ask(indexReturns('DAX', '250')))).toEqual(figures);
  });
});

describe('The shape at its edges', () => {
  it('asks for 20 returns that differ', () => {
    const few = Float64Array.from({ length: 19 }, (_, index) => index / 1000);
    expect(refusalCode(ask(few))).toBe('tooFewReturns');
    expect(refusalCode(ask(new Float64Array(60)))).toBe('priceDoesNotMove');
  });

  it('says 1 where the normal distribution is the best Student fit', () => {
    const flat = Float64Array.from({ length: 60 }, (_, index) => (index % 20) / 1000);
    const student = accepted(accepted(ask(flat)).student);
    expect(student).toMatchObject({ likelihoodRatio: 0, likelihoodRatioP: 1 });
    expect(student.nuInterval.upper).toBe(Number.POSITIVE_INFINITY);
    expect(student.notes.map(({ code }) => code)).toContain('normalLimit');
    // below the bell curve's own multiple of 1, for the fitted scale is √m2 and s is a little larger
    expect(student.tailMultiples[0]?.multiple).toBeLessThan(1);
    expect(student.tailMultiples[0]?.multiple).toBeGreaterThan(0.9);
  });

  it('still tells of the bell curve where the Student fit is refused', () => {
    const zeros = Float64Array.from({ length: 60 }, (_, index) => (index < 20 ? 0 : (index - 40) / 1000));
    const figures = accepted(ask(zeros));
    expect(refusalCode(figures.student)).toBe('likelihoodUnbounded');
    expect(figures.andersonDarlingNormalP).toBeGreaterThan(0);
  });

  it('leaves the simulated Jarque-Bera p to samples below 500', () => {
    expect(accepted(ask(indexReturns('DAX', 'all').slice(-499))).jarqueBeraSimulatedP).not.toBeNull();
    expect(accepted(ask(indexReturns('DAX', 'all').slice(-500))).jarqueBeraSimulatedP).toBeNull();
  });
});

describe('Simulated p-values', () => {
  it('reach the published 5% point of Anderson-Darling with both parameters fitted', () => {
    // D'Agostino & Stephens 1986, Goodness-of-Fit Techniques, table 4.7: 0.752 for A²·(1 + 0.75/n + 2.25/n²); printed also
    // in the NIST handbook, section 1.3.5.14. A p of 0.05 from 999 samples has a standard error of 0.007; three granted.
    const count = 100;
    const critical = 0.752 / (1 + 0.75 / count + 2.25 / count ** 2);
    const { andersonDarling } = normalShapeProbabilities(
      { andersonDarling: critical, jarqueBera: 0 },
      count,
      streams,
    );
    expect(Math.abs(andersonDarling - 0.05)).toBeLessThan(0.021);
  });

  it('count every sample where nothing was seen, and none where all was', () => {
    const none = normalShapeProbabilities({ andersonDarling: 0, jarqueBera: 0 }, 30, streams);
    expect(none).toEqual({ andersonDarling: 1, jarqueBera: 1 });
    const all = normalShapeProbabilities({ andersonDarling: 1e9, jarqueBera: 1e9 }, 30, streams);
    expect(all).toEqual({ andersonDarling: 0.001, jarqueBera: 0.001 });
    expect(studentDistanceProbability(0, 30, 4, streams)).toEqual({ p: 1, leftOut: 0 });
    expect(studentDistanceProbability(1e9, 30, 4, streams)).toEqual({ p: 0.001, leftOut: 0 });
  });

  it('tell a fat tail from the bell curve and from its own kind', () => {
    const random = streams.stream(2 ** 30);
    const fat = accepted(ask(Float64Array.from({ length: 400 }, () => nextStudentT(random, 3))));
    expect(fat.andersonDarlingNormalP).toBe(0.001);
    expect(fat.jarqueBeraSimulatedP).toBe(0.001);
    expect(accepted(fat.student).andersonDarlingP).toBeGreaterThan(0.02);
    expect(accepted(fat.student).likelihoodRatioP).toBeLessThan(1e-6);
    const thin = accepted(ask(Float64Array.from({ length: 400 }, () => nextNormal(random))));
    expect(thin.andersonDarlingNormalP).toBeGreaterThan(0.02);
    // two clusters are no Student distribution
    const clusters = Float64Array.from(
      { length: 200 },
      () => nextNormal(random) + (random.nextUint32() % 2 ? 3 : -3),
    );
    expect(accepted(accepted(ask(clusters)).student).andersonDarlingP).toBe(0.001);
  });
});
