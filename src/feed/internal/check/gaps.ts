import { isoFromDay } from '../../../terms/day.ts';
import type { PriceSeries } from '../../../terms/prices.ts';
import { isSession, type SessionCalendar, sessionsBetween } from '../../sessions.ts';
import type { Flagger } from './flagger.ts';

type Days = Pick<PriceSeries, 'ticker' | 'days'>;

const sessionCount = (count: number): string => (count === 1 ? 'one session' : `${count} sessions`);

/** Flags sessions without a price, prices outside sessions, and a ticker that stopped. Returns how many sessions it misses. */
export const checkSessions = (
  { ticker, days }: Days,
  calendar: SessionCalendar,
  flagger: Flagger,
): number => {
  let missingInAll = 0;
  let previous = days[0] as number;
  for (let row = 0; row < days.length; row += 1) {
    const day = days[row] as number;
    const missing = row === 0 ? 0 : sessionsBetween(calendar, previous, day);
    if (missing > 0) {
      missingInAll += missing;
      const text = `${ticker} has no price on ${sessionCount(missing)} between ${isoFromDay(previous)} and ${isoFromDay(day)}`;
      flagger.raise('gap', day, text, String(missing));
    }
    if (!isSession(calendar, day)) {
      flagger.raise(
        'offSession',
        day,
        `${ticker} has a price on ${isoFromDay(day)}, when most tickers have none`,
      );
    }
    previous = day;
  }
  const behind = sessionsBetween(calendar, previous, calendar.lastSession + 1);
  if (behind > 0) {
    const text = `${ticker} has no price since ${isoFromDay(previous)}, ${sessionCount(behind)} before the latest of the feed`;
    flagger.raise('stopped', previous, text, String(behind));
  }
  return missingInAll;
};

export const longestGapDays = (days: Int32Array): number => {
  let longest = 0;
  for (let row = 1; row < days.length; row += 1) {
    longest = Math.max(longest, (days[row] as number) - (days[row - 1] as number));
  }
  return longest;
};
