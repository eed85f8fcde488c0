import { describe, expect, test } from 'vitest';
import { type BacktestQuestion, backtest } from '../../../src/stats/backtests/backtest.ts';
import type { ModelVerdict } from '../../../src/stats/backtests/judgedModel.ts';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const dax = indexReturns('DAX', 'all');
const fiveModels = ['historical', 'normal', 'student', 'filtered', 'peaks'] as const;

const questionOf = (more: Partial<BacktestQuestion> = {}): BacktestQuestion => ({
  returns: dax,
  firstDay: dax.length - 500,
  dayCount: 500,
  estimationReturns: 250,
  tailLevel: level('0.99'),
  models: fiveModels,
  streams: testStreams(11),
  replicates: 999,
  ...more,
});

const run = (more: Partial<BacktestQuestion> = {}) => {
  const outcome = backtest(questionOf(more));
  if (outcome === null) throw new Error('ended by its listener');
  return outcome;
};

const verdicts = (more: Partial<BacktestQuestion> = {}): ModelVerdict[] =>
  accepted(run(more)).models.flatMap((model) => (model.ok ? [model] : []));

describe('DAX, last 500 days at 99%', () => {
  const judged = verdicts();

  test('every model that is not refused is judged on the days it figured', () => {
    for (const { forecasts, refusedDays, expected, exceedanceDays, exceedances } of judged) {
      expect(forecasts.days.length + refusedDays).toBe(500);
      expect(expected).toBeCloseTo(forecasts.days.length / 100, 12);
      expect(exceedanceDays).toHaveLength(exceedances);
      for (const day of exceedanceDays) {
        const place = forecasts.days.indexOf(day);
        expect(-(dax[day] ?? 0)).toBeGreaterThan(forecasts.valuesAtRisk[place] ?? Infinity);
      }
    }
  });

  test('the parts of the verdict belong together', () => {
    for (const { coverage, independence, conditional, shortfallP, shortfallZ2, binomialP } of judged) {
      expect(conditional.likelihoodRatio).toBe(coverage.likelihoodRatio + independence.likelihoodRatio);
      expect(shortfallZ2).not.toBeNull();
      expect(shortfallP).toBeGreaterThanOrEqual(1 / 1000);
      expect(binomialP).toBeGreaterThan(0);
    }
  });

  test('ranked: one model without a p, the one with the lowest joint loss', () => {
    // 5 exceedances are expected: too few for any p.
    expect(judged.map(({ standing }) => standing?.dieboldMarianoP)).toEqual(judged.map(() => null));
    const longer = verdicts({ firstDay: 500, dayCount: 1359, replicates: 99, models: ['normal', 'student'] });
    const [normal, student] = longer;
    expect(student?.standing?.meanJointLoss).toBeLessThan(normal?.standing?.meanJointLoss ?? -9);
    expect(student?.standing?.dieboldMarianoP).toBeNull();
    expect(normal?.standing?.dieboldMarianoP).toBeGreaterThan(0);
  });

  test('the same question gives the same bits', () => {
    expect(run({ models: ['student', 'filtered'], replicates: 99 })).toEqual(
      run({ models: ['student', 'filtered'], replicates: 99 }),
    );
  });

  test('a model is judged alike whoever stands beside it', () => {
    const [alone] = verdicts({ models: ['normal'] });
    const beside = judged.find(({ model }) => model === 'normal');
    expect({ ...alone, standing: null }).toEqual({ ...beside, standing: null });
  });

  test('returns are not changed', () => {
    const copy = dax.slice();
    run({ replicates: 9 });
    expect(dax).toEqual(copy);
  });
});

describe('days without a figure', () => {
  const random = testStreams(21).stream(0);
  const returns = Float64Array.from({ length: 600 }, () => nextNormal(random) / 100);

  /** A price that stands still long enough to empty the 30-day windows of some days. */
  const withStillness = (count: number) => {
    const changed = returns.slice();
    changed.fill(0, 200, 200 + 30 + count - 1);
    return changed;
  };
  const stillQuestion = (count: number) => ({
    returns: withStillness(count),
    firstDay: 100,
    dayCount: 500,
    estimationReturns: 30,
    tailLevel: level('0.9'),
    models: ['historical', 'normal'] as const,
    replicates: 99,
  });

  test('up to a tenth of the days is left out, and counted', () => {
    for (const verdict of verdicts(stillQuestion(50))) {
      expect(verdict.refusedDays).toBe(50);
      expect(verdict.firstRefusal?.code).toBe('priceDoesNotMove');
      expect(verdict.forecasts.days).toHaveLength(450);
      expect(verdict.forecasts.days.indexOf(230)).toBe(-1);
      expect(verdict.standing?.meanQuantileLoss).toBeGreaterThan(0);
    }
    expect(accepted(run(stillQuestion(50))).commonDays).toBe(450);
  });

  test('more is a refusal in the words of the first', () => {
    const { models } = accepted(run(stillQuestion(51)));
    for (const model of models) {
      expect(model.ok ? 'judged' : model.problem.code).toBe('priceDoesNotMove');
      expect(model.ok ? '' : model.problem.message).toContain('51 of 500 days');
    }
  });

  test('a refused model takes nothing from the others', () => {
    const outcome = accepted(run({ estimationReturns: 60, replicates: 99 }));
    // 60 returns are fewer than the 100 of historical and filtered at 99%, and than the 250 of peaks.
    expect(outcome.models.map((model) => model.ok)).toEqual([false, true, true, false, false]);
    expect(outcome.commonDays).toBe(500);
  });
});

describe('refusals', () => {
  test.each([
    [{ tailLevel: level('0.5') }, 'levelOutside'],
    [{ dayCount: 1 }, 'tooFewReturns'],
    [{ dayCount: 0 }, 'tooFewReturns'],
    [{ firstDay: 249 }, 'tooFewReturns'],
  ] as const)('%j', (more, code) => expect(refusalCode(run(more))).toBe(code));

  test.each([
    [{ tailLevel: level('0.5') }, 'A backtest at 50% judges no tail.'],
    [{ dayCount: 1 }, 'A backtest needs at least 2 days to judge, and there is 1.'],
    [{ dayCount: 0 }, 'A backtest needs at least 2 days to judge, and there are none.'],
    [
      { firstDay: 249 },
      'The first day judged needs 250 returns before it, and there are 249. Ask for 1 days fewer, or for a shorter',
    ],
  ] as const)('%j is refused in words', (more, words) => expect(refusalMessage(run(more))).toContain(words));

  test('what is needed is said in numbers as well', () => {
    const needs = (more: Partial<BacktestQuestion>) => {
      const outcome = run(more);
      return outcome.ok ? null : outcome.problem.needs;
    };
    expect([needs({ dayCount: 1 }), needs({ firstDay: 249 })]).toEqual([2, 250]);
  });

  test('two days are enough, and as many returns before the first as the window holds', () => {
    const least = { firstDay: 250, dayCount: 2, models: ['normal'] as const, replicates: 9 };
    const [normal] = verdicts(least);
    expect([...(normal?.forecasts.days ?? [])]).toEqual([250, 251]);
    expect(run({ ...least, firstDay: dax.length - 2 }).ok).toBe(true);
  });

  test('days beyond the returns are a bug of the caller', () => {
    expect(() => run({ dayCount: 501 })).toThrow(
      `backtest: days up to ${dax.length + 1} of ${dax.length} returns`,
    );
  });
});

describe('listener', () => {
  test('progress runs from 0 to all days', () => {
    const heard: number[] = [];
    run({ models: ['normal'], listener: { progress: (done) => heard.push(done) }, replicates: 9 });
    expect(heard[0]).toBe(0);
    expect(heard.at(-1)).toBe(500);
    expect(heard).toEqual([...heard].sort((a, b) => a - b));
  });

  test('cancelled ends the walk without an answer, whenever it is said', () => {
    let looks = 0;
    const after = (count: number) => () => {
      looks += 1;
      return looks > count;
    };
    expect(backtest(questionOf({ models: ['normal'], listener: { cancelled: () => true } }))).toBeNull();
    expect(backtest(questionOf({ models: ['normal'], listener: { cancelled: after(20) } }))).toBeNull();
  });
});

test('exceedance is strict: a loss equal to VaR is none', () => {
  // Ascending losses 1 … 20 at 95%: VaR is the 19th, 0.19, and the day judged loses exactly that, then more.
  const returns = Float64Array.from([
    ...Array.from({ length: 20 }, (_, day) => -(day + 1) / 100),
    -0.19,
    -0.21,
  ]);
  const [historical] = verdicts({
    returns,
    firstDay: 20,
    dayCount: 2,
    estimationReturns: 20,
    tailLevel: level('0.95'),
    models: ['historical'],
    replicates: 9,
  });
  expect(relativeError(historical?.forecasts.valuesAtRisk[0] ?? 0, 0.19)).toBe(0);
  expect(historical?.exceedanceDays).toEqual([21]);
});
