import { expect, test } from 'vitest';
import { checkDays } from '../../../src/feed/internal/check/days.ts';
import { makeFlagger } from '../../../src/feed/internal/check/flagger.ts';
import { checkSessions, longestGapDays } from '../../../src/feed/internal/check/gaps.ts';
import { checkJumps } from '../../../src/feed/internal/check/jumps.ts';
import { twinsOf } from '../../../src/feed/internal/check/names.ts';
import { checkUnchanged } from '../../../src/feed/internal/check/unchanged.ts';
import { makeFindings } from '../../../src/feed/internal/findings.ts';
import { sessionsOf } from '../../../src/feed/sessions.ts';
import { dayFromIso } from '../../../src/terms/day.ts';

const seriesOf = (closes: readonly number[], days?: readonly number[]) => ({
  ticker: 'KELP',
  days: Int32Array.from(days ?? closes.map((_, at) => 20_458 + at)),
  closes: Float64Array.from(closes),
});

type Series = ReturnType<typeof seriesOf>;
type Check = (series: Series, flagger: ReturnType<typeof makeFlagger>) => void;

const flagsOf = (check: Check, series: Series) => {
  const flagger = makeFlagger('KELP', makeFindings());
  check(series, flagger);
  return flagger.flags();
};

const said = (check: Check, closes: readonly number[]) =>
  flagsOf(check, seriesOf(closes)).map(({ code, day }) => `${code} ${(day ?? 0) - 20_458}`);

/** Forty closes that move by 0.4% a day, so that eight robust deviations are about 4.7%. */
const calm = Array.from({ length: 40 }, (_, at) => 100 * (at % 2 === 0 ? 1 : 1.004));
const from = (at: number, ratio: number) => calm.map((close, row) => (row < at ? close : close * ratio));
const on = (at: number, ratio: number, length = 1) =>
  calm.map((close, row) => (row >= at && row < at + length ? close * ratio : close));

test('nine equal closes are no sign of a stuck price, ten are, and each stretch is told by its last day', () => {
  const stuck = (count: number) => [1, 2, ...Array.from({ length: count }, () => 3), 4];
  expect(said(checkUnchanged, stuck(9))).toEqual([]);
  expect(said(checkUnchanged, stuck(10))).toEqual(['unchanged 11']);
  expect(said(checkUnchanged, [...stuck(10), ...stuck(12)])).toEqual(['unchanged 11', 'unchanged 26']);
  expect(
    said(
      checkUnchanged,
      Array.from({ length: 10 }, () => 3),
    ),
  ).toEqual(['unchanged 9']);
  expect(said(checkUnchanged, [])).toEqual([]);
});

test.each<[string, readonly number[], readonly string[]]>([
  ['a calm price', calm, []],
  ['five for four', from(20, 4 / 5), ['splitLike 20']],
  ['three for two, the other way round', from(20, 3 / 2), ['splitLike 20']],
  ['two for one within three percent', from(20, 0.5 * 1.025), ['splitLike 20']],
  ['halfway between two splits', from(20, 0.55), []],
  ['less than half and like no split', from(20, 0.45), ['largeJump 20']],
  ['a fall of fifteen percent', from(20, 0.85), []],
  ['ten for one that stays', from(20, 1 / 10), ['splitLike 20']],
  ['a tenth for one day', on(20, 1 / 10), ['decimalSlip 20', 'decimalSlip 21']],
  ['a tenth for five days', on(20, 1 / 10, 5), ['decimalSlip 20', 'decimalSlip 25']],
  ['a tenth for six days is taken for two splits', on(20, 1 / 10, 6), ['splitLike 20', 'splitLike 26']],
  ['a hundredth that stays', from(20, 1 / 100), ['decimalSlip 20']],
  ['a thousand times', from(20, 1000), ['decimalSlip 20']],
  ['a jump into the last row', from(39, 2), ['splitLike 39']],
  ['a price beyond all bounds', on(20, 1e300), ['largeJump 20', 'largeJump 21']],
  ['two prices alone', [1, 2], ['splitLike 1']],
])('%s', (_, closes, flags) => {
  expect(said(checkJumps, closes)).toEqual(flags);
});

test('a ticker that always moves as much is not flagged for moves like a small split', () => {
  // the price swings by a fifth every day, so 5:4 is its ordinary move
  const wild = Array.from({ length: 40 }, (_, at) => (at % 2 === 0 ? 100 : 80));
  expect(said(checkJumps, wild)).toEqual([]);
});

test('gaps, prices outside sessions and a stop are told by the day that they bear on', () => {
  const all = Int32Array.from([1, 2, 3, 4, 5, 8, 9, 10]);
  const calendar = sessionsOf([all, all, all], null);
  const check = (days: readonly number[]) => {
    const flagger = makeFlagger('KELP', makeFindings());
    const missing = checkSessions({ ticker: 'KELP', days: Int32Array.from(days) }, calendar, flagger);
    return [missing, ...flagger.flags().map(({ code, day }) => `${code} ${day}`)];
  };
  expect(check([...all])).toEqual([0]);
  expect(check([1, 2, 5, 8, 9, 10])).toEqual([2, 'gap 5']);
  expect(check([1, 2, 3, 5, 9, 10])).toEqual([2, 'gap 5', 'gap 9']);
  expect(check([3, 4, 5, 6, 8, 9, 10])).toEqual([0, 'offSession 6']);
  expect(check([1, 2, 3, 4, 5])).toEqual([0, 'stopped 5']);
  expect(longestGapDays(all)).toBe(3);
  expect(longestGapDays(Int32Array.from([7]))).toBe(0);
});

test('of very many flags of a kind the latest twenty are kept, and how many went before is said', () => {
  const flagger = makeFlagger('KELP', makeFindings());
  for (let day = 1; day <= 33; day += 1) flagger.raise('gap', day, `gap ${day}`);
  flagger.raise('stopped', 33, 'stopped');
  const flags = flagger.flags();
  expect(flags.map(({ day }) => day)).toEqual([...Array.from({ length: 20 }, (_, at) => 14 + at), 33]);
  expect(flags[0]?.text).toBe('gap 14 (and 13 more before)');
  expect(flags[1]?.text).toBe('gap 15');
});

test('the first and the last day of the sane calendar pass, those beside them and future ones do not', () => {
  const nowMs = Date.UTC(2026, 0, 5, 12);
  const check = (iso: string, now: number | null) => {
    const findings = makeFindings();
    const days = Int32Array.from([dayFromIso(iso) ?? 0]);
    const ranges = { starts: Int32Array.from([0]), ends: Int32Array.from([1]) };
    checkDays({ tickers: ['KELP'], ...ranges, days, closes: Float64Array.from([1]) }, 0, now, findings);
    return findings.list().map(({ code }) => code);
  };
  expect(check('1900-01-01', null)).toEqual([]);
  expect(check('1899-12-31', null)).toEqual(['dateOutside']);
  expect(check('2199-12-31', null)).toEqual([]);
  expect(check('2200-01-01', null)).toEqual(['dateOutside']);
  expect(check('2026-01-06', nowMs)).toEqual([]);
  expect(check('2026-01-07', nowMs)).toEqual(['futureDate']);
});

test('findings count everything, keep five examples and the first of every ticker', () => {
  const findings = makeFindings();
  for (let row = 1; row <= 9; row += 1)
    findings.record('unreadablePrice', { ticker: row < 9 ? 'KELP' : 'TARN', row });
  findings.record('blankRow', { row: 3 });
  expect(findings.list().map(({ code, count, examples }) => [code, count, examples.length])).toEqual([
    ['unreadablePrice', 9, 5],
    ['blankRow', 1, 1],
  ]);
  expect(findings.first('unreadablePrice', 'TARN')?.row).toBe(9);
  expect(findings.quarantineOf('TARN')).toBe('unreadablePrice');
  expect(findings.quarantineOf('WRACK')).toBe(null);
  expect([...findings.quarantinedTickers()]).toEqual(['KELP', 'TARN']);
});

test('twins are names that are the same but for case', () => {
  expect([...twinsOf(['KELP', 'TARN', 'kelp', 'Kelp'])]).toEqual([
    ['kelp', 'KELP'],
    ['KELP', 'Kelp'],
    ['Kelp', 'KELP'],
  ]);
});
