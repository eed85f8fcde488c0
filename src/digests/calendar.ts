import { type Day, dateParts, dayFromDate, isWeekday } from '../terms/day.ts';
import type { Calendar } from './ports.ts';

/** Every weekday that a list of holidays does not name; without a list every weekday. */
export const calendarOf = (holidays: ReadonlySet<Day> | null): Calendar => {
  const years = new Set([...(holidays ?? [])].map((day) => dateParts(day).year));
  return {
    isSession: (day) => isWeekday(day) && holidays?.has(day) !== true,
    knows: (year) => years.has(year),
  };
};

/** A session of any of several calendars: tickers that share no holidays trade on one where the other rests. */
export const anyOf = (calendars: readonly Calendar[]): Calendar => ({
  isSession: (day) => calendars.some((calendar) => calendar.isSession(day)),
  knows: (year) => calendars.every((calendar) => calendar.knows(year)),
});

const firstOfMonth = (day: Day): Day => day - dateParts(day).dayOfMonth + 1;

const firstOfNextMonth = (day: Day): Day => {
  const { year, month } = dateParts(day);
  const next = month === 12 ? dayFromDate(year + 1, 1, 1) : dayFromDate(year, month + 1, 1);
  if (next === null) throw new RangeError(`firstOfNextMonth: the calendar ends after ${day}`);
  return next;
};

const noSession = (from: Day, to: Day, { isSession }: Calendar): boolean => {
  for (let day = from; day < to; day += 1) if (isSession(day)) return false;
  return true;
};

export const isFirstSessionOfMonth = (day: Day, calendar: Calendar): boolean =>
  calendar.isSession(day) && noSession(firstOfMonth(day), day, calendar);

export const isLastSessionOfMonth = (day: Day, calendar: Calendar): boolean =>
  calendar.isSession(day) && noSession(day + 1, firstOfNextMonth(day), calendar);
