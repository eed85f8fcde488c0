import { describe, expect, test } from 'vitest';
import { sampleReturns } from '../../src/answers/sample.ts';
import { dayFromIso, isoFromDay } from '../../src/terms/day.ts';
import type { Window } from '../../src/terms/window.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';
import { seriesOf, wobbling } from './madeSeries.ts';

const series = seriesOf('KELP', wobbling(300));
const lastRatio = (series.closes[299] ?? 0) / (series.closes[298] ?? 1);
const day = (iso: string): number => dayFromIso(iso) ?? Number.NaN;

const ask = (window: Window, windowAsked = true, of = series) =>
  sampleReturns(of, { window, windowAsked, returnType: 'simple' });

describe('a window of returns', () => {
  test('60d is the last 60 returns, made from 61 closes', () => {
    const sample = accepted(ask({ kind: 'returns', count: 60 }));
    expect([sample.returns.length, sample.closes.length, sample.days.length]).toEqual([60, 61, 61]);
    expect(isoFromDay(sample.to)).toBe('2026-11-27');
    expect(sample.returns[59]).toBeCloseTo(lastRatio - 1, 15);
  });

  test('an asked window longer than the history is refused with what there is', () => {
    const refused = ask({ kind: 'returns', count: 300 });
    expect(refusalCode(refused)).toBe('windowTooLong');
    expect(refused.ok ? '' : refused.problem.message).toContain('299 returns');
  });

  test('a default window longer than the history takes it whole and says so', () => {
    const sample = accepted(ask({ kind: 'returns', count: 500 }, false));
    expect([sample.returns.length, sample.cutToHistory]).toEqual([299, true]);
  });

  test.each([0, 1])('a ticker with %d prices has no return', (count) => {
    expect(refusalCode(ask({ kind: 'all' }, false, seriesOf('KELP', wobbling(300).slice(0, count))))).toBe(
      'windowEmpty',
    );
  });
});

describe('a window by the calendar', () => {
  test('3m holds the returns dated after the last date minus three months', () => {
    const sample = accepted(ask({ kind: 'span', amount: 3, unit: 'month' }));
    expect(isoFromDay(sample.from)).toBe('2026-08-28');
    expect(isoFromDay(sample.days[0] ?? 0)).toBe('2026-08-27');
  });

  test('the day of the month is clamped to the end of a shorter month', () => {
    const ends = seriesOf('KELP', wobbling(300), '2026-03-31');
    const sample = accepted(ask({ kind: 'span', amount: 1, unit: 'month' }, true, ends));
    expect(isoFromDay(sample.from)).toBe('2026-03-02');
  });

  test('12w is 84 days', () => {
    const sample = accepted(ask({ kind: 'span', amount: 12, unit: 'week' }));
    expect(sample.from).toBeGreaterThan(day('2026-11-27') - 84);
    expect(sample.from).toBeLessThanOrEqual(day('2026-11-27') - 81);
  });

  test('since includes its day, and ISO intervals include both ends', () => {
    expect(isoFromDay(accepted(ask({ kind: 'since', day: day('2026-05-04') })).from)).toBe('2026-05-04');
    const between = accepted(ask({ kind: 'between', from: day('2026-05-04'), to: day('2026-05-08') }));
    expect([isoFromDay(between.from), isoFromDay(between.to), between.returns.length]).toEqual([
      '2026-05-04',
      '2026-05-08',
      5,
    ]);
  });

  test('ytd begins with the first return of the year of the last date', () => {
    expect(isoFromDay(accepted(ask({ kind: 'yearToDate' })).from)).toBe('2026-01-01');
  });

  test.each<[string, Window, string]>([
    ['a span that reaches back further', { kind: 'span', amount: 5, unit: 'year' }, 'windowTooLong'],
    ['a day before the history', { kind: 'since', day: day('2020-01-01') }, 'windowTooLong'],
    ['a day after the history', { kind: 'since', day: day('2027-01-01') }, 'windowEmpty'],
    [
      'an interval before the history',
      { kind: 'between', from: day('2019-01-01'), to: day('2019-02-01') },
      'windowEmpty',
    ],
    ['a weekend', { kind: 'between', from: day('2026-11-21'), to: day('2026-11-22') }, 'windowEmpty'],
    [
      'an interval that ends before it begins',
      { kind: 'between', from: day('2026-11-20'), to: day('2026-11-10') },
      'windowEmpty',
    ],
  ])('%s is refused', (_name, window, code) => {
    expect(refusalCode(ask(window))).toBe(code);
  });
});

test('log returns are the logarithms of price ratios', () => {
  const sample = accepted(
    sampleReturns(series, { window: { kind: 'returns', count: 2 }, windowAsked: true, returnType: 'log' }),
  );
  expect(sample.returns[1]).toBeCloseTo(Math.log(lastRatio), 15);
});
