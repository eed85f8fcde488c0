import { expect, test } from 'vitest';
import { freshnessOf, freshnessOfFeed } from '../../src/feed/freshness.ts';
import { dayFromIso, isoFromDay } from '../../src/terms/day.ts';

const day = (iso: string): number => dayFromIso(iso) ?? 0;
const holidays = (...days: string[]) => new Set(days.map(day));

// 2026-11-27 is a Friday (cal 11 2026)
const base = {
  lastDay: day('2026-11-27'),
  holidays: null,
  closingTime: null,
  deskTimeZone: 'UTC',
  nowMs: Date.parse('2026-11-28T12:00:00Z'),
};

test.each([
  // instant, desk zone, closing time, expected day, sessions behind
  ['2026-11-27T23:59:00Z', 'UTC', null, '2026-11-26', 0],
  ['2026-11-28T00:00:00Z', 'UTC', null, '2026-11-27', 0],
  ['2026-11-30T12:00:00Z', 'UTC', null, '2026-11-27', 0],
  ['2026-12-01T00:00:00Z', 'UTC', null, '2026-11-30', 1],
  ['2026-12-05T00:00:00Z', 'UTC', null, '2026-12-04', 5],
  // Monday is over in Tokyo at 15:00Z, in New York at 05:00Z of Tuesday (offsets +9 and −5 in winter)
  ['2026-11-30T15:00:00Z', 'Asia/Tokyo', null, '2026-11-30', 1],
  ['2026-11-30T14:59:00Z', 'Asia/Tokyo', null, '2026-11-27', 0],
  ['2026-12-01T04:59:00Z', 'America/New_York', null, '2026-11-27', 0],
  ['2026-12-01T05:00:00Z', 'America/New_York', null, '2026-11-30', 1],
  // the day is over at a desk in Tokyo, but New York closes at 21:00Z
  ['2026-11-30T20:59:00Z', 'Asia/Tokyo', '16:00 America/New_York', '2026-11-27', 0],
  ['2026-11-30T21:00:00Z', 'Asia/Tokyo', '16:00 America/New_York', '2026-11-30', 1],
])(
  'at %s for a desk in %s with a close at %s, %s is expected',
  (now, deskTimeZone, closingTime, expected, behind) => {
    const freshness = freshnessOf({ ...base, nowMs: Date.parse(now), deskTimeZone, closingTime });
    expect(isoFromDay(freshness.expectedDay)).toBe(expected);
    expect(freshness.sessionsBehind).toBe(behind);
  },
);

test('holidays are no sessions, and it is said whether they were known', () => {
  const nowMs = Date.parse('2026-12-01T12:00:00Z');
  const without = freshnessOf({ ...base, nowMs });
  const withHoliday = freshnessOf({ ...base, nowMs, holidays: holidays('2026-11-30') });
  expect(without).toMatchObject({ sessionsBehind: 1, counted: 'weekdays' });
  expect(withHoliday).toMatchObject({ sessionsBehind: 0, counted: 'weekdays without holidays' });
  expect(isoFromDay(withHoliday.expectedDay)).toBe('2026-11-27');
  // a list that ends before the year in question says nothing of it
  expect(freshnessOf({ ...base, nowMs, holidays: holidays('2025-12-25') }).counted).toBe('weekdays');
});

test('the group that lags most speaks for the feed, by its newest ticker', () => {
  const ticker = (calendar: string, lastDay: string, state = 'clean') => ({
    state,
    lastDay: day(lastDay),
    meaning: { calendar, closingTime: null },
  });
  const tickers = [
    ticker('coast', '2026-11-27'),
    ticker('coast', '2026-11-20'),
    ticker('hills', '2026-11-26'),
    ticker('isles', '2026-11-02', 'quarantined'),
  ];
  const worst = freshnessOfFeed({ tickers }, new Map(), 'UTC', base.nowMs);
  expect(worst).toMatchObject({ lastDay: day('2026-11-26'), sessionsBehind: 1 });
  expect(freshnessOfFeed({ tickers: [] }, new Map(), 'UTC', base.nowMs)).toBe(null);
});
