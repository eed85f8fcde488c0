import { describe, expect, it } from 'vitest';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { studentBeyond } from '../../../src/stats/tails/studentBeyond.ts';
import { studentTail } from '../../../src/stats/tails/studentTail.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

type Ends = { readonly estimate: number; readonly lower: number; readonly upper: number };

type OutsideIntervals = {
  readonly intervals: readonly {
    readonly ticker: string;
    readonly window: number;
    readonly var_99: Ends;
    readonly es_99: Ends;
    readonly log_odds_of_a_loss_of_4_percent: Ends;
  }[];
};

const streams = testStreams(10);
const ask = (returns: Float64Array, confidence = '0.95') =>
  studentTail({ returns, tailLevel: level('0.99'), confidence: level(confidence), streams });

const logOdds = (p: number | null | undefined): number =>
  Math.log(p ?? Number.NaN) - Math.log1p(-(p ?? Number.NaN));

describe('Profile intervals against constrained searches by SciPy (student-fits/studentFits.json)', () => {
  const { intervals } = fixtureJson<OutsideIntervals>('student-fits/studentFits.json');
  // The search outside narrows an end to 1e-9 of the figure, on a constrained maximum good to 1e-11 in the logarithm.
  const close = 1e-8;

  it('has three windows, one of them near the normal limit', () => {
    expect(intervals.map(({ ticker, window }) => `${ticker} ${window}`)).toEqual([
      'DAX 250',
      'SMI 500',
      'FTSE 60',
    ]);
  });

  for (const { ticker, window, var_99, es_99, log_odds_of_a_loss_of_4_percent: odds } of intervals)
    it(`agree on ${window} returns of ${ticker}`, () => {
      const returns = indexReturns(ticker, String(window));
      const figures = accepted(ask(returns));
      expect(relativeError(figures.varInterval?.lower ?? Number.NaN, var_99.lower)).toBeLessThan(close);
      expect(relativeError(figures.varInterval?.upper ?? Number.NaN, var_99.upper)).toBeLessThan(close);
      expect(relativeError(figures.esInterval?.lower ?? Number.NaN, es_99.lower)).toBeLessThan(close);
      expect(relativeError(figures.esInterval?.upper ?? Number.NaN, es_99.upper)).toBeLessThan(close);
      const beyond = accepted(studentBeyond({ returns, threshold: 0.04, confidence: level95, streams }));
      expect(relativeError(logOdds(beyond.interval?.lower), odds.lower)).toBeLessThan(close);
      expect(relativeError(logOdds(beyond.interval?.upper), odds.upper)).toBeLessThan(close);
    });
});

describe('The interval of nu', () => {
  it('ends where the profile falls by half the chi-square quantile', () => {
    // SciPy 1.17.1: brentq on the profile in 1/nu of DAX over 250 returns, other parameters by Nelder-Mead.
    const { nuInterval } = accepted(ask(indexReturns('DAX', '250'))).parameters;
    expect(relativeError(nuInterval.lower ?? Number.NaN, 3.7301879647259106)).toBeLessThan(1e-8);
    expect(relativeError(nuInterval.upper ?? Number.NaN, 62.793188442900046)).toBeLessThan(1e-8);
  });

  it('reaches infinity where the normal limit lies inside, and says whether the variance may not be finite', () => {
    const few = accepted(ask(indexReturns('DAX', '60')));
    expect(few.parameters.nuInterval.upper).toBe(Number.POSITIVE_INFINITY);
    expect(few.parameters.nuInterval.lower).toBeGreaterThan(2);
    expect(few.notes).toEqual([]);
    // at 99.9% confidence the interval reaches below 2
    const surer = accepted(ask(indexReturns('DAX', '60'), '0.999'));
    expect(surer.parameters.nuInterval.lower).toBeLessThan(2);
    expect(surer.notes.map(({ code }) => code)).toContain('varianceMayNotBeFinite');
  });
});

describe('Tails so heavy that ES is in doubt', () => {
  const random = streams.stream(1);
  const returns = (count: number, nu: number) =>
    Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));

  it('have no ES at nu ≤ 1, and a VaR with its interval all the same', () => {
    const figures = accepted(ask(returns(300, 0.7)));
    expect(figures.parameters.nu).toBeLessThan(1);
    expect(figures).toMatchObject({ es: null, esInterval: null, esIntervalMethod: null });
    expect(figures.notes.map(({ code }) => code)).toContain('meanNotFinite');
    expect(figures.varInterval?.lower).toBeLessThan(figures.var);
    expect(figures.varInterval?.upper).toBeGreaterThan(figures.var);
  });

  it('have an ES without an upper end where the interval of nu reaches 1', () => {
    const figures = accepted(ask(returns(60, 1.4)));
    expect(figures.parameters.nu).toBeGreaterThan(1);
    expect(figures.parameters.nuInterval.lower).toBeLessThan(1);
    expect(figures.esInterval?.lower).toBeLessThan(figures.es ?? Number.NaN);
    expect(figures.esInterval?.upper).toBeNull();
    expect(figures.notes.map(({ code }) => code)).toContain('upperEndUnbounded');
  });

  it('say that nu is held on its bound', () => {
    const figures = accepted(ask(returns(400, 0.25)));
    expect(figures.parameters.nu).toBe(0.5);
    expect(figures.parameters.nuInterval.lower).toBe(0.5);
    expect(figures.notes.map(({ code }) => code)).toContain('parameterOnBound');
  });
});

describe('A Student tail', () => {
  it('is refused as its fit is', () => {
    expect(refusalCode(ask(new Float64Array(19).map((_, index) => index)))).toBe('tooFewReturns');
    expect(refusalCode(ask(new Float64Array(60)))).toBe('priceDoesNotMove');
  });

  it('of the normal limit has the normal figures with √m2, and intervals that reach further up than down', () => {
    const figures = accepted(ask(indexReturns('DAX', '20')));
    expect(figures.parameters.normalLimit).toBe(true);
    expect(figures.notes.map(({ code }) => code)).toContain('normalLimit');
    const { lower, upper } = figures.varInterval ?? { lower: null, upper: null };
    expect((upper ?? Number.NaN) - figures.var).toBeGreaterThan(figures.var - (lower ?? Number.NaN));
  });

  it('finds a lower end that is further away than the scale is long', () => {
    const returns = Float64Array.from({ length: 20 }, (_, index) => -(index ** 2) / 10_000);
    const { varInterval, notes } = accepted(
      studentTail({ returns, tailLevel: level('0.8'), confidence: level('0.999'), streams }),
    );
    expect(varInterval?.lower).not.toBeNull();
    expect(notes.map(({ code }) => code)).not.toContain('profileNotConverged');
  });

  it('looks at the other tail where the returns are negated', () => {
    const returns = indexReturns('DAX', '250');
    const { location, scale } = accepted(ask(returns)).parameters;
    const [long, short] = [accepted(ask(returns)), accepted(ask(returns.map((value) => -value)))];
    expect(short.var - long.var).toBeCloseTo(2 * location, 9);
    expect(short.parameters.scale).toBeCloseTo(scale, 12);
  });

  it('comes out the same from the fit of the day before', () => {
    const returns = indexReturns('DAX', '250');
    const input = { returns, tailLevel: level('0.99'), confidence: level95, streams };
    const warm = accepted(studentTail(input, { location: 0, scale: 0.012, nu: 7 }));
    const cold = accepted(studentTail(input));
    expect(relativeError(warm.var, cold.var)).toBeLessThan(1e-11);
    expect(
      relativeError(warm.esInterval?.upper ?? Number.NaN, cold.esInterval?.upper ?? Number.NaN),
    ).toBeLessThan(1e-9);
  });
});
