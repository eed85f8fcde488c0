import type { InstantMs } from '../terms/clock.ts';
import { type Day, dateParts, isWeekday } from '../terms/day.ts';
import type { Freshness } from '../terms/feedReport.ts';
import { localTimeAt } from '../terms/zonedTime.ts';
import type { Holidays } from './sessions.ts';

/** What the lateness of one group of tickers hangs on. `closingTime` is written like `17:30 Europe/London`. */
export type FreshnessAsked = {
  readonly lastDay: Day;
  readonly holidays: Holidays | null;
  readonly closingTime: string | null;
  readonly deskTimeZone: string;
  readonly nowMs: InstantMs;
};

/** The last day that is closed for business at a time and place. */
const lastClosedDay = (nowMs: InstantMs, closingTime: string | null): Day => {
  const [clock = '', zone = ''] = closingTime?.split(' ') ?? [];
  if (zone === '') return Number.POSITIVE_INFINITY;
  const [hours = 0, minutes = 0] = clock.split(':').map(Number);
  const local = localTimeAt(nowMs, zone);
  return local.minutes >= hours * 60 + minutes ? local.day : local.day - 1;
};

/**
 * How far the prices lag. The prices of a session are due once its day is over at the desk and the session has closed
 * where the shares trade. Sessions are the weekdays that the holidays do not name.
 */
export const freshnessOf = ({
  lastDay,
  holidays,
  closingTime,
  deskTimeZone,
  nowMs,
}: FreshnessAsked): Freshness => {
  const dueUpTo = Math.min(localTimeAt(nowMs, deskTimeZone).day - 1, lastClosedDay(nowMs, closingTime));
  const years = new Set([...(holidays ?? [])].map((day) => dateParts(day).year));
  const isSession = (day: Day): boolean => isWeekday(day) && holidays?.has(day) !== true;
  let expectedDay = dueUpTo;
  while (!isSession(expectedDay)) expectedDay -= 1;
  let sessionsBehind = 0;
  for (let day = lastDay + 1; day <= expectedDay; day += 1) if (isSession(day)) sessionsBehind += 1;
  const covered = years.has(dateParts(lastDay).year) && years.has(dateParts(expectedDay).year);
  return {
    lastDay,
    expectedDay,
    sessionsBehind,
    counted: covered ? 'weekdays without holidays' : 'weekdays',
  };
};

type Group = { lastDay: Day; readonly closingTime: string | null };

type Served = {
  readonly tickers: readonly {
    readonly state: string;
    readonly lastDay: Day | null;
    readonly meaning: { readonly calendar: string | null; readonly closingTime: string | null };
  }[];
};

/** The freshness of the group of tickers (of one calendar) that lags most. */
export const freshnessOfFeed = (
  report: Served,
  holidays: ReadonlyMap<string | null, Holidays>,
  deskTimeZone: string,
  nowMs: InstantMs,
): Freshness | null => {
  const groups = new Map<string | null, Group>();
  for (const { state, lastDay, meaning } of report.tickers) {
    if (state === 'quarantined' || lastDay === null) continue;
    const group = groups.get(meaning.calendar);
    if (group === undefined) groups.set(meaning.calendar, { lastDay, closingTime: meaning.closingTime });
    else group.lastDay = Math.max(group.lastDay, lastDay);
  }
  const all = [...groups].map(([calendar, group]) =>
    freshnessOf({ ...group, holidays: holidays.get(calendar) ?? null, deskTimeZone, nowMs }),
  );
  return all.reduce<Freshness | null>(
    (worst, one) => (worst === null || one.sessionsBehind > worst.sessionsBehind ? one : worst),
    null,
  );
};
