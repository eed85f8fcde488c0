import { describe, expect, it } from 'vitest';
import { historicalBeyond } from '../../../src/stats/tails/historicalBeyond.ts';
import { normalBeyond } from '../../../src/stats/tails/normalBeyond.ts';
import { studentBeyond } from '../../../src/stats/tails/studentBeyond.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const question = (returns: Float64Array, threshold: number) => ({
  returns,
  threshold,
  confidence: level95,
  streams: testStreams(4),
});

const dax = (window: string, threshold: number) => question(indexReturns('DAX', window), threshold);

describe('The chance of a loss of at least 3% on DAX', () => {
  // SciPy 1.17.1: hits over n with scipy.stats.beta.ppf for the ends; norm.sf at (0.03 + mean)/s with the ends at the
  // noncentralities where nct.cdf(√n·(0.03 + mean)/s) is 0.025 and 0.975 (brentq); t.sf at the fitted parameters.
  const known = [
    {
      window: '250',
      historical: [6 / 250, 0.008857361277113632, 0.05150326110530787],
      normal: [0.016401299689738632, 0.009176481357486057, 0.02812397272751785],
      student: 0.019115131251405983,
    },
    {
      window: 'all',
      historical: [11 / 1859, 0.002957415406349055, 0.010562714879144279],
      normal: [0.0014103387293114892, 0.0009914605330799023, 0.001986442150583556],
      student: 0.0068030051522361065,
    },
  ] as const;

  for (const { window, historical, normal, student } of known) {
    it(`historical, over ${window}`, () => {
      const figures = accepted(historicalBeyond(dax(window, 0.03)));
      expect(figures.probability).toBe(historical[0]);
      expect(relativeError(figures.interval?.lower ?? Number.NaN, historical[1])).toBeLessThan(1e-12);
      expect(relativeError(figures.interval?.upper ?? Number.NaN, historical[2])).toBeLessThan(1e-12);
      expect(figures.intervalMethod).toBe('clopperPearson');
      expect(figures.meanReturnSessions).toBe(1 / historical[0]);
    });

    it(`normal, over ${window}`, () => {
      const figures = accepted(normalBeyond(dax(window, 0.03)));
      expect(relativeError(figures.probability, normal[0])).toBeLessThan(1e-12);
      // SciPy's noncentral t and the search in it leave about ten digits
      expect(relativeError(figures.interval?.lower ?? Number.NaN, normal[1])).toBeLessThan(1e-9);
      expect(relativeError(figures.interval?.upper ?? Number.NaN, normal[2])).toBeLessThan(1e-9);
    });

    it(`student, over ${window}`, () => {
      const figures = accepted(studentBeyond(dax(window, 0.03)));
      // the fit is good to 1e-12 and its tail changes with nu at about the same rate
      expect(relativeError(figures.probability, student)).toBeLessThan(1e-11);
      expect(figures.interval?.lower).toBeLessThan(student);
      expect(figures.interval?.upper).toBeGreaterThan(student);
      expect(figures.intervalMethod).toBe('profileLikelihood');
    });
  }
});

describe('The chance of a loss at the edges', () => {
  it('is 0 to 3.62% where 100 days saw none', () => {
    const returns = Float64Array.from({ length: 100 }, (_, index) => (index % 2 === 0 ? 0.01 : -0.01));
    const figures = accepted(historicalBeyond(question(returns, 0.04)));
    expect(figures.probability).toBe(0);
    expect(figures.meanReturnSessions).toBeNull();
    expect(figures.interval?.lower).toBe(0);
    // 1 − 0.025^(1/100)
    expect(figures.interval?.upper).toBeCloseTo(1 - 0.025 ** 0.01, 14);
    expect(figures.notes.some(({ code }) => code === 'exactInterval')).toBe(true);
  });

  it('counts a loss equal to the threshold, and ends at 1 where every day was one', () => {
    const returns = Float64Array.of(-0.25, -0.25, -0.5, 0.25);
    expect(accepted(historicalBeyond(question(returns, 0.25))).probability).toBe(0.75);
    expect(accepted(historicalBeyond(question(returns, -0.25))).interval?.upper).toBe(1);
  });

  it('has ends and no mean return time where the bell curve leaves the doubles', () => {
    const figures = accepted(normalBeyond(dax('all', 0.9)));
    expect(figures.probability).toBe(0);
    expect(figures.meanReturnSessions).toBeNull();
    expect(figures.interval).toEqual({ lower: 0, upper: 0 });
  });

  it('is found for losses so far out that only the ends of nu matter, and close to the middle', () => {
    for (const window of ['60', '250', 'all'])
      for (const threshold of [0, 0.001, 0.01, 0.1, 0.5, 1]) {
        const { probability, interval, notes } = accepted(studentBeyond(dax(window, threshold)));
        expect(notes).toEqual([]);
        expect(interval?.lower).toBeLessThanOrEqual(probability);
        expect(interval?.upper).toBeGreaterThanOrEqual(probability);
        expect(interval?.upper).toBeLessThan(0.7);
      }
  });

  it('falls as the loss grows, and so do both ends', () => {
    const models = [historicalBeyond, normalBeyond, studentBeyond] as const;
    for (const model of models) {
      const [near, far] = [0.01, 0.02].map((threshold) => accepted(model(dax('250', threshold))));
      expect(far?.probability).toBeLessThan(near?.probability ?? Number.NaN);
      expect(far?.interval?.lower).toBeLessThan(near?.interval?.lower ?? Number.NaN);
      expect(far?.interval?.upper).toBeLessThan(near?.interval?.upper ?? Number.NaN);
    }
  });

  it('is refused as the tail of the same model is', () => {
    const few = question(
      new Float64Array(19).map((_, index) => index / 1000),
      0.04,
    );
    const still = question(new Float64Array(60), 0.04);
    const zeros = question(
      Float64Array.from({ length: 60 }, (_, index) => (index < 20 ? 0 : index / 1000)),
      0.04,
    );
    expect(refusalCode(normalBeyond(few))).toBe('tooFewReturns');
    expect(refusalCode(studentBeyond(few))).toBe('tooFewReturns');
    expect(refusalCode(historicalBeyond(few))).toBe('not refused');
    for (const model of [historicalBeyond, normalBeyond, studentBeyond])
      expect(refusalCode(model(still))).toBe('priceDoesNotMove');
    expect(refusalCode(studentBeyond(zeros))).toBe('likelihoodUnbounded');
  });
});
