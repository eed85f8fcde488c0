import { describe, expect, test } from 'vitest';
import { thinned } from '../../../src/answers/pictures/buckets.ts';
import { needWidths } from '../../../src/answers/pictures/needWidths.ts';
import {
  pictureAsked,
  seriesNamed,
  tickerAsked,
  wholeFeed,
  worked,
} from '../../present/picture/demoPictures.ts';

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

const tailOf = (text: string) => {
  const data = pictureAsked(text);
  if (data.kind !== 'tail') throw new Error(data.kind);
  return data;
};

describe('what the picture of a tail shows', () => {
  const { returns, answer } = tailOf('tail KELP at 99% by student');

  test('every return lies in one bin, and bins touch', () => {
    expect(sum(returns.bins.map(({ count }) => count))).toBe(answer.returnCount);
    for (const [place, bin] of returns.bins.slice(1).entries())
      expect(bin.from).toBe(returns.bins[place]?.to);
  });

  test('losses ascend to the largest with the share 1/n, and the shares are whole n-ths', () => {
    const [largest] = returns.losses;
    expect(largest?.share).toBe(1 / answer.returnCount);
    for (const [place, { loss, share }] of returns.losses.entries()) {
      expect(share * answer.returnCount).toBeCloseTo(place + 1, 9); // one rounding of a division
      expect(loss).toBeLessThanOrEqual(returns.losses[place - 1]?.loss ?? loss);
    }
  });

  test('the fitted t meets its own VaR at one minus the level', () => {
    const [model] = answer.figures.models;
    if (model?.ok !== true) throw new Error('no figure');
    const after = returns.curve.findIndex(({ loss }) => loss > model.var);
    const [before, next] = [returns.curve[after - 1], returns.curve[after]];
    expect(before?.student).toBeGreaterThan(0.01);
    expect(next?.student).toBeLessThan(0.01);
  });

  test('a short position sees the returns turned round', () => {
    const short = tailOf('tail KELP on -2m USD by historical');
    const long = tailOf('tail KELP by historical');
    expect(short.returns.bins.map(({ count }) => count)).not.toEqual(
      long.returns.bins.map(({ count }) => count),
    );
    expect(short.returns.losses[0]?.loss).toBeCloseTo(Math.max(...long.returns.bins.map(({ to }) => to)), 2);
  });
});

test('quantile points ascend, and the fitted t expects a worse worst day than the bell curve', () => {
  const data = pictureAsked('shape KELP 2y');
  if (data.kind !== 'shape') throw new Error(data.kind);
  const observed = data.points.map((point) => point.observed);
  expect(observed).toEqual([...observed].sort((one, other) => one - other));
  expect(data.points[0]?.student).toBeLessThan(data.points[0]?.normal ?? 0);
  expect(data.points).toHaveLength(160);
});

describe('what the picture of a backtest shows', () => {
  const data = pictureAsked('backtest KELP by normal');
  if (data.kind !== 'backtest') throw new Error(data.kind);
  const { path, answer } = data;
  const [model] = answer.figures.models;
  if (model?.ok !== true) throw new Error('no figure');

  test('marks the days that the answer counts, and the count ends there', () => {
    const iso = (day: number): string => new Date(day * 86_400_000).toISOString().slice(0, 10);
    expect(path.exceedances.map(({ day }) => iso(day))).toEqual(model.exceedanceDates);
    expect(path.counts.at(-1)?.count).toBe(model.exceedances);
  });

  test('the band of 500 days at 99% is 1 to 10', () => {
    // scipy 1.17.1: scipy.stats.binom.ppf([.025, .975], 500, .01) = [1, 10]; counts of a binomial, exact
    expect(path.counts.at(-1)).toMatchObject({ lower: 1, upper: 10, expected: 5 });
  });

  test('the worst days are in the path although neighbours share its steps', () => {
    const worst = Math.min(...path.exceedances.map(({ value }) => value));
    expect(Math.min(...path.steps.map(({ low }) => low))).toBeLessThanOrEqual(worst);
    expect(path.steps.length).toBeLessThanOrEqual(300);
  });
});

test('the width falls through the one that is wanted at the count that is needed', () => {
  const { job, answers } = worked('need KELP 20bp at 95%');
  const [answer] = answers;
  const { question } = job.read;
  if (answer.kind !== 'need' || question.verb !== 'need') throw new Error(answer.kind);
  const { halfWidth, halfWidthReturns } = answer.figures;
  const widths = needWidths(answer.figures, question.level);
  const wide = widths.filter(({ returnCount }) => returnCount < halfWidthReturns - 1);
  const narrow = widths.filter(({ returnCount }) => returnCount > halfWidthReturns);
  expect(wide.length).toBeGreaterThan(3);
  expect(Math.min(...wide.map((each) => each.halfWidth))).toBeGreaterThan(halfWidth);
  expect(Math.max(...narrow.map((each) => each.halfWidth))).toBeLessThan(halfWidth);
});

describe('what the feed covers', () => {
  const torn = (() => {
    const { days, closes, ...rest } = seriesNamed('KELP');
    const kept = [...days.keys()].filter((row) => row < 200 || row > 230);
    return {
      ...rest,
      days: Int32Array.from(kept, (row) => days[row] ?? 0),
      closes: Float64Array.from(kept, (row) => closes[row] ?? 0),
    };
  })();

  test('a gap parts two runs and is named by the days around it', () => {
    const data = tickerAsked(torn);
    if (data.kind !== 'ticker') throw new Error(data.kind);
    expect(data.runs).toHaveLength(2);
    expect(data.gaps).toEqual([{ from: torn.days[199], to: torn.days[200] }]);
    expect(data.runs[1]?.[0]?.day).toBeGreaterThanOrEqual(torn.days[200] ?? 0);
  });

  test('every ticker of the feed has a line, in its order', () => {
    const data = wholeFeed();
    if (data.kind !== 'feed') throw new Error(data.kind);
    expect(data.rows.map(({ ticker }) => ticker)).toEqual([...data.rows.map(({ ticker }) => ticker)].sort());
    expect(data.rows.every(({ covered }) => covered.length > 0)).toBe(true);
    expect(data.more).toBe(0);
  });
});

test('neighbours are gathered into runs of nearly equal length that lose nobody', () => {
  const all = Array.from({ length: 10 }, (_, place) => place);
  const runs = thinned(all, 4, (some) => some);
  expect(runs.flat()).toEqual(all);
  expect(runs.map(({ length }) => length)).toEqual([2, 3, 2, 3]);
  expect(thinned([1, 2], 4, ([only]) => only)).toEqual([1, 2]);
});
