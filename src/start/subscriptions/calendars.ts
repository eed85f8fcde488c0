import { anyOf, calendarOf } from '../../digests/calendar.ts';
import type { Calendar } from '../../digests/ports.ts';
import type { Calendars } from '../../digests/run/parts.ts';
import type { OpenSnapshot } from '../../feed/openFeed.ts';
import type { Result } from '../../terms/result.ts';

type Holidays = OpenSnapshot['holidays'];

const keyOf = (holidays: Holidays): string =>
  JSON.stringify([...holidays].map(([name, days]) => [name, [...days]]));

/** The calendar of tickers by the holidays of their groups, from one reading of the holiday file. */
const calendarsOf = (holidays: Holidays, groupOf: (ticker: string) => string | null): Calendars => {
  const made = new Map<string | null, Calendar>();
  const ofGroup = (group: string | null): Calendar => {
    const calendar = made.get(group) ?? calendarOf(holidays.get(group) ?? null);
    made.set(group, calendar);
    return calendar;
  };
  return {
    of: (tickers) => {
      const [first, ...others] = [...new Set(tickers.map(groupOf))].map(ofGroup);
      if (first === undefined) return ofGroup(null);
      return others.length === 0 ? first : anyOf([first, ...others]);
    },
  };
};

/** The calendars as the live feed has them; the same object for as long as the holidays stay the same. */
export const calendarsFrom = (snapshot: () => Result<OpenSnapshot>): (() => Calendars) => {
  const groupOf = (ticker: string): string | null => {
    const live = snapshot();
    return live.ok ? (live.value.series(ticker)?.meaning.calendar ?? null) : null;
  };
  let seen: Holidays | null = null;
  let key: string | null = null;
  let calendars = calendarsOf(new Map(), groupOf);
  return () => {
    const live = snapshot();
    if (!live.ok || live.value.holidays === seen) return calendars;
    seen = live.value.holidays;
    const newKey = keyOf(seen);
    if (newKey !== key) calendars = calendarsOf(seen, groupOf);
    key = newKey;
    return calendars;
  };
};
