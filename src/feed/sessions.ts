import { type Day, dateParts, isWeekday } from '../terms/day.ts';

/** The sessions of tickers that share holidays. `upTo[i]` counts the sessions up to and with the day `firstDay + i`. */
export type SessionCalendar = {
  readonly firstDay: Day;
  readonly lastSession: Day;
  readonly upTo: Int32Array;
};

/** Days on which the tickers of one calendar do not trade. */
export type Holidays = ReadonlySet<Day>;

const countUpTo = ({ firstDay, upTo }: SessionCalendar, day: Day): number => {
  if (day < firstDay) return 0;
  return upTo[Math.min(day - firstDay, upTo.length - 1)] as number;
};

export const isSession = (calendar: SessionCalendar, day: Day): boolean =>
  countUpTo(calendar, day) > countUpTo(calendar, day - 1);

/** Sessions strictly between two days. */
export const sessionsBetween = (calendar: SessionCalendar, first: Day, second: Day): number =>
  countUpTo(calendar, second - 1) - countUpTo(calendar, first);

/** Years that a list of holidays speaks of; it says nothing of the others. */
const yearsOf = (holidays: Holidays): ReadonlySet<number> =>
  new Set([...holidays].map((day) => dateParts(day).year));

/**
 * The sessions that prices themselves show: a day is one if at least half of the tickers that are live on it (between
 * their first and last day) have a price. In the years that a list of holidays covers, every weekday that it does not
 * name is a session too. `daysOf` gives each ticker's days in ascending order, at least one of them.
 */
export const sessionsOf = (daysOf: readonly Int32Array[], holidays: Holidays | null): SessionCalendar => {
  const firstDay = daysOf.reduce(
    (least, days) => Math.min(least, days[0] as number),
    Number.POSITIVE_INFINITY,
  );
  const lastDay = daysOf.reduce(
    (most, days) => Math.max(most, days.at(-1) as number),
    Number.NEGATIVE_INFINITY,
  );
  const length = lastDay - firstDay + 1;
  const priced = new Int32Array(length);
  const liveChange = new Int32Array(length + 1);
  for (const days of daysOf) {
    const from = (days[0] as number) - firstDay;
    const after = (days.at(-1) as number) - firstDay + 1;
    liveChange[from] = (liveChange[from] as number) + 1;
    liveChange[after] = (liveChange[after] as number) - 1;
    for (let at = 0; at < days.length; at += 1) {
      const day = (days[at] as number) - firstDay;
      priced[day] = (priced[day] as number) + 1;
    }
  }
  const years = holidays === null ? new Set<number>() : yearsOf(holidays);
  const isDue = (day: Day): boolean =>
    years.size > 0 && isWeekday(day) && years.has(dateParts(day).year) && holidays?.has(day) === false;
  const upTo = new Int32Array(length);
  let live = 0;
  let count = 0;
  let lastSession = firstDay;
  for (let at = 0; at < length; at += 1) {
    live += liveChange[at] as number;
    if ((live > 0 && 2 * (priced[at] as number) >= live) || isDue(firstDay + at)) {
      count += 1;
      lastSession = firstDay + at;
    }
    upTo[at] = count;
  }
  return { firstDay, lastSession, upTo };
};
