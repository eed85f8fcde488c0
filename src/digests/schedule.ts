import type { InstantMs } from '../terms/clock.ts';
import { type Day, isWeekday, weekdayOf } from '../terms/day.ts';
import type { Schedule, ScheduleDays } from '../terms/subscriptions.ts';
import { instantOf, localTimeAt } from '../terms/zonedTime.ts';
import { isFirstSessionOfMonth, isLastSessionOfMonth } from './calendar.ts';
import type { Calendar } from './ports.ts';

/** Holidays move what hangs on sessions and on the ends of months, and nothing else. */
export const isScheduledOn = (days: ScheduleDays, day: Day, calendar: Calendar): boolean => {
  switch (days.kind) {
    case 'sessions':
      return calendar.isSession(day);
    case 'weekdays':
      return isWeekday(day);
    case 'daily':
      return true;
    case 'on':
      return days.weekdays.includes(weekdayOf(day));
    case 'monthStart':
      return isFirstSessionOfMonth(day, calendar);
    case 'monthEnd':
      return isLastSessionOfMonth(day, calendar);
  }
};

/** A list of holidays in which no session is left for over a year is a mistake; nothing is due then. */
const longestSearchDays = 400;

/**
 * The first instant after another at which something is due: the scheduled time on the clocks of the schedule's zone. A
 * time that the clocks skip falls due when they skip it, one that they show twice the first time.
 */
export const nextDue = (
  { days, minutes, timeZone }: Schedule,
  afterMs: InstantMs,
  calendar: Calendar,
): InstantMs | null => {
  const today = localTimeAt(afterMs, timeZone).day;
  // a zone may stand a day back where its clocks were put back over midnight
  for (let day = today - 1; day <= today + longestSearchDays; day += 1) {
    if (!isScheduledOn(days, day, calendar)) continue;
    const dueMs = instantOf({ day, minutes }, timeZone);
    if (dueMs > afterMs) return dueMs;
  }
  return null;
};

/** Every instant after one and up to another at which something is due, in order. */
export const duesBetween = (
  schedule: Schedule,
  afterMs: InstantMs,
  untilMs: InstantMs,
  calendar: Calendar,
): readonly InstantMs[] => {
  const dues: InstantMs[] = [];
  for (
    let dueMs = nextDue(schedule, afterMs, calendar);
    dueMs !== null && dueMs <= untilMs;
    dueMs = nextDue(schedule, dueMs, calendar)
  )
    dues.push(dueMs);
  return dues;
};
