import { calendarOf } from '../../src/digests/calendar.ts';
import { type Day, dayFromIso } from '../../src/terms/day.ts';
import type { Schedule } from '../../src/terms/subscriptions.ts';

export const day = (iso: string): Day => {
  const found = dayFromIso(iso);
  if (found === null) throw new RangeError(`${iso} is no day`);
  return found;
};

/** Holidays of 2026 and 2027 that the tests reckon with. */
export const calendar = calendarOf(
  new Set(['2026-12-25', '2026-12-28', '2027-01-01', '2027-03-26', '2027-03-29'].map(day)),
);

export const everyWeekday = calendarOf(null);

export const at = (text: string): number => Date.parse(text);

export const shown = (instantMs: number | null): string | null =>
  instantMs === null ? null : new Date(instantMs).toISOString().replace(':00.000Z', 'Z');

export const schedule = (
  days: Schedule['days'] | 'sessions' | 'weekdays' | 'daily' | 'monthStart' | 'monthEnd',
  minutes = 510,
  timeZone = 'Europe/London',
): Schedule => ({ days: typeof days === 'string' ? { kind: days } : days, minutes, timeZone });
