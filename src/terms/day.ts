/** A calendar day as the whole number of days since 1970-01-01 in the proleptic Gregorian calendar. */
export type Day = number;

const millisecondsPerDay = 86_400_000;
const isoPattern = /^(\d{4})-(\d{2})-(\d{2})$/;

/** The day of a Gregorian date, or null where that date does not exist. Month and day count from 1; years 1 to 9999. */
export const dayFromDate = (year: number, month: number, dayOfMonth: number): Day | null => {
  if (!(year >= 1 && year <= 9999)) return null;
  const date = new Date(0);
  date.setUTCFullYear(year, month - 1, dayOfMonth);
  const same =
    date.getUTCFullYear() === year && date.getUTCMonth() === month - 1 && date.getUTCDate() === dayOfMonth;
  return same ? Math.round(date.getTime() / millisecondsPerDay) : null;
};

/** The day written as `2026-11-27` (ISO 8601 calendar date, extended form only), or null. */
export const dayFromIso = (text: string): Day | null => {
  const parts = isoPattern.exec(text);
  return parts === null ? null : dayFromDate(Number(parts[1]), Number(parts[2]), Number(parts[3]));
};

export const isoFromDay = (day: Day): string => new Date(day * millisecondsPerDay).toISOString().slice(0, 10);

export type DateParts = { readonly year: number; readonly month: number; readonly dayOfMonth: number };

export const dateParts = (day: Day): DateParts => {
  const date = new Date(day * millisecondsPerDay);
  return { year: date.getUTCFullYear(), month: date.getUTCMonth() + 1, dayOfMonth: date.getUTCDate() };
};

/** ISO 8601 weekday: 1 is Monday, 7 is Sunday. */
export const weekdayOf = (day: Day): number => ((((day + 3) % 7) + 7) % 7) + 1;

export const isWeekday = (day: Day): boolean => weekdayOf(day) <= 5;

/** The same day of the month `months` later (or earlier), clamped to the end of a shorter month. */
export const addMonths = (day: Day, months: number): Day => {
  const { year, month, dayOfMonth } = dateParts(day);
  const monthIndex = year * 12 + (month - 1) + months;
  const lastOfMonth = new Date(0);
  lastOfMonth.setUTCFullYear(Math.floor(monthIndex / 12), (monthIndex % 12) + 1, 0);
  const clamped = Math.min(dayOfMonth, lastOfMonth.getUTCDate());
  lastOfMonth.setUTCDate(clamped);
  return Math.round(lastOfMonth.getTime() / millisecondsPerDay);
};
