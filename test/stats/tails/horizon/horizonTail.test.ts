import { describe, expect, test } from 'vitest';
import { normalDensity, normalQuantile } from '../../../../src/stats/distributions/normal.ts';
import { nextStudentT } from '../../../../src/stats/random/studentDraw.ts';
import { filteredTail } from '../../../../src/stats/tails/filtered/filteredTail.ts';
import { historicalTail } from '../../../../src/stats/tails/historicalTail.ts';
import {
  type HorizonFigures,
  type HorizonInput,
  horizonTail,
  type OneDayFigures,
} from '../../../../src/stats/tails/horizon/horizonTail.ts';
import { normalTail } from '../../../../src/stats/tails/normalTail.ts';
import { peaksTail } from '../../../../src/stats/tails/peaks/peaksTail.ts';
import { studentTail } from '../../../../src/stats/tails/studentTail.ts';
import type { TailInput } from '../../../../src/stats/tails/tailFigures.ts';
import type { Result } from '../../../../src/terms/result.ts';
import { accepted, refusalCode } from '../../../laws/outcomes.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';
import { simulateGarchReturns } from '../../volatility/simulateReturns.ts';

const returns = simulateGarchReturns(600, { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 }, 5, 61);
const oneDay: TailInput = {
  returns,
  tailLevel: level('0.99'),
  confidence: level95,
  streams: testStreams(61),
  replicates: 39,
};
/** No draws of parameters: a confidence of 99.9% is beyond 200 of them. */
const withoutInterval = { ...oneDay, confidence: level('0.999') };

const models: Readonly<Record<string, (input: TailInput) => Result<OneDayFigures>>> = {
  historical: historicalTail,
  normal: normalTail,
  student: studentTail,
  filtered: filteredTail,
  peaks: peaksTail,
};

const over = (days: number, figures: OneDayFigures, more: Partial<HorizonInput> = {}): HorizonFigures =>
  accepted(
    horizonTail(figures, {
      ...withoutInterval,
      horizonDays: days,
      returnType: 'log',
      position: 'long',
      ...more,
    }),
  );

describe.each(Object.entries(models))('paths of the %s model', (_, tailOf) => {
  const figures = accepted(tailOf(oneDay));

  test('over one day give the one-day figures, within the error of the simulation', () => {
    const simulated = over(1, figures);
    // Four standard errors; the seed is fixed.
    expect(Math.abs(simulated.var - figures.var)).toBeLessThan(4 * simulated.monteCarloError.var);
    expect(Math.abs((simulated.es ?? 0) - (figures.es ?? 0))).toBeLessThan(
      4 * (simulated.monteCarloError.es ?? 0),
    );
    expect(relativeError(simulated.shortcutVar, figures.var)).toBeLessThan(1e-14);
    expect([simulated.model, simulated.target]).toEqual([figures.model, figures.target]);
  });

  test('over ten days lose more, and ES is beyond VaR', () => {
    const simulated = over(10, figures);
    expect(simulated.var).toBeGreaterThan(2 * figures.var);
    expect(simulated.var).toBeLessThan(5 * figures.var);
    expect(simulated.es).toBeGreaterThan(simulated.var);
    expect(simulated.monteCarloError.var).toBeLessThan(0.05 * simulated.var);
  });

  test('have an interval around the figures from 200 draws', () => {
    const { varInterval, esInterval, intervalMethod, ...simulated } = over(2, figures, {
      confidence: level95,
    });
    expect(varInterval?.lower).toBeLessThan(simulated.var);
    expect(varInterval?.upper).toBeGreaterThan(simulated.var);
    expect(esInterval?.lower).toBeLessThan(simulated.es ?? 0);
    expect(esInterval?.upper).toBeGreaterThan(simulated.es ?? 0);
    expect(intervalMethod).toBe('parameterDraws');
    expect(simulated.notes).toEqual([]);
  });
});

describe('sums of days', () => {
  test('ten normal days are normal', () => {
    const figures = accepted(normalTail(oneDay));
    const { mean, sampleStandardDeviation } = figures.parameters;
    const simulated = over(10, figures);
    const deviation = Math.sqrt(10) * sampleStandardDeviation;
    const score = normalQuantile(0.99);
    const expectedVar = deviation * score - 10 * mean;
    const expectedEs = (deviation * normalDensity(score)) / 0.01 - 10 * mean;
    expect(Math.abs(simulated.var - expectedVar)).toBeLessThan(4 * simulated.monteCarloError.var);
    expect(Math.abs((simulated.es ?? 0) - expectedEs)).toBeLessThan(4 * (simulated.monteCarloError.es ?? 0));
    // For normal days the shortcut is the truth.
    expect(relativeError(simulated.shortcutVar, expectedVar)).toBeLessThan(1e-12);
  });

  test('two days of the history are all pairs of its days', () => {
    const few = returns.slice(0, 120);
    const pairs = Float64Array.from(few, () => 0);
    const sums = Float64Array.from({ length: 120 * 120 }, (_, index) => {
      const first = few[Math.floor(index / pairs.length)] as number;
      return -first - (few[index % pairs.length] as number);
    }).sort();
    const figures = accepted(historicalTail({ ...oneDay, returns: few }));
    const simulated = over(2, figures, { returns: few });
    // k = ⌈14,400·0.99⌉ = 14,256.
    expect(Math.abs(simulated.var - (sums[14_255] as number))).toBeLessThan(
      4 * simulated.monteCarloError.var,
    );
  });
});

describe('the kind of return and the side of the position', () => {
  const figures = accepted(historicalTail(oneDay));

  test('log losses become money by the exponential, simple ones are money', () => {
    const log = over(10, figures);
    expect(relativeError(log.moneyFraction.var, 1 - Math.exp(-log.var))).toBeLessThan(1e-12);
    expect(log.moneyFraction.es).toBeLessThan(1 - Math.exp(-(log.es ?? 0)) + 1e-15);
    const simple = over(10, figures, { returnType: 'simple' });
    expect(simple.moneyFraction).toEqual({ var: simple.var, es: simple.es });
    const short = over(10, figures, { position: 'short' });
    expect(relativeError(short.moneyFraction.var, Math.exp(short.var) - 1)).toBeLessThan(1e-12);
  });

  test('a long position loses at most what it is worth, a short one more', () => {
    const random = testStreams(62).stream(1);
    const wild = Float64Array.from({ length: 300 }, () => 0.3 * nextStudentT(random, 1.5));
    const wildDay = accepted(historicalTail({ ...oneDay, returns: wild }));
    const long = over(20, wildDay, { returns: wild, returnType: 'simple' });
    expect(long.es).toBeLessThanOrEqual(1);
    expect(long.var).toBeGreaterThan(0.99);
    expect(over(20, wildDay, { returns: wild, returnType: 'simple', position: 'short' }).var).toBeGreaterThan(
      1,
    );
  });

  test('ES is null where a day’s loss has no mean, unless compounding bounds it', () => {
    const random = testStreams(63).stream(2);
    const heavy = Float64Array.from({ length: 400 }, () => 0.01 * nextStudentT(random, 0.8));
    const student = accepted(studentTail({ ...oneDay, returns: heavy }));
    expect(student.parameters.nu).toBeLessThan(1);
    const log = over(2, student, { returns: heavy });
    expect([log.es, log.monteCarloError.es, log.moneyFraction.es]).toEqual([null, null, null]);
    expect(log.notes.map(({ code }) => code)).toContain('meanNotFinite');
    expect(Number.isFinite(log.var)).toBe(true);
    // One span in a hundred loses everything: that is the mean of them.
    expect(over(2, student, { returns: heavy, returnType: 'simple' }).es).toBe(1);
  });
});

describe('a simulated horizon', () => {
  const figures = accepted(historicalTail(oneDay));

  test('is the same for the same streams and differs for others', () => {
    const first = over(5, figures, { confidence: level95 });
    expect(over(5, figures, { confidence: level95 })).toEqual(first);
    expect(over(5, figures, { streams: testStreams(64) }).var).not.toBe(first.var);
  });

  test('has no interval beyond 60 days or beyond what 200 draws can tell', () => {
    const long = over(61, figures, { confidence: level95 });
    expect([long.varInterval, long.esInterval, long.intervalMethod]).toEqual([null, null, null]);
    expect(long.notes.map(({ code }) => code)).toEqual(['horizonTooLong']);
    expect(over(5, figures).notes.map(({ code }) => code)).toEqual(['levelBeyondResamples']);
  });

  test.each([0, -1, 2.5, 251, Number.NaN])('of %s days is refused', (horizonDays) => {
    const input = { ...oneDay, horizonDays, returnType: 'log', position: 'long' } as const;
    expect(refusalCode(horizonTail(figures, input))).toBe('sizeOutside');
  });

  test('of one normal day has the exact interval, within the noise of 200 draws', () => {
    const normal = accepted(normalTail(oneDay));
    const drawn = over(1, normal, { confidence: level95 }).varInterval;
    const width = (normal.varInterval?.upper ?? 0) - (normal.varInterval?.lower ?? 0);
    // An end from 200 draws has a standard error of about a twelfth of the width, twice that is a sixth; the shift adds little.
    expect(Math.abs((drawn?.lower ?? 0) - (normal.varInterval?.lower ?? 0))).toBeLessThan(width / 4);
    expect(Math.abs((drawn?.upper ?? 0) - (normal.varInterval?.upper ?? 0))).toBeLessThan(width / 4);
  });
});
