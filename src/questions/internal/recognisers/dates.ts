import {
  addMonths,
  type Day,
  dateParts,
  dayFromDate,
  dayFromIso,
  isoFromDay,
  weekdayOf,
} from '../../../terms/day.ts';
import type { Fault } from '../faults/fault.ts';
import { monthName, monthNumbers, weekdayNumbers } from './calendarWords.ts';
import { isoReadings, latestBefore, looksLikeDate } from './numericDates.ts';
import { faultAt, type Line } from './recogniser.ts';

/** A date that was read at some words, or why what stands there is none. `assumed` says which day was taken. */
export type DateFound =
  | { readonly ok: true; readonly day: Day; readonly wordCount: number; readonly assumed: string | null }
  | { readonly ok: false; readonly fault: Fault; readonly wordCount: number };

type DateReader = (line: Line, at: number) => DateFound | null;

const wrong = (
  line: Line,
  at: number,
  wordCount: number,
  says: string,
  instead: readonly string[],
): DateFound => ({
  ok: false,
  wordCount,
  fault: faultAt(line, at, wordCount, { code: 'badDate', says, instead }),
});

const right = (day: Day, wordCount: number, assumed: string | null = null): DateFound => ({
  ok: true,
  day,
  wordCount,
  assumed,
});

const isoShape = /^\d{4}-\d{2}-\d{2}$/;

/** The last day of a month, for a date such as 30 February. */
const monthEnd = (year: number, month: number): readonly string[] => {
  const start = dayFromDate(year, month, 1);
  return start === null ? [] : [isoFromDay(addMonths(start, 1) - 1)];
};

const isoDate: DateReader = (line, at) => {
  const text = line.words[at]?.text ?? '';
  if (!isoShape.test(text)) return null;
  const day = dayFromIso(text);
  if (day !== null) return right(day, 1);
  const month = Number(text.slice(5, 7));
  return wrong(
    line,
    at,
    1,
    'does not exist. Give a day of the calendar.',
    monthEnd(Number(text.slice(0, 4)), month),
  );
};

const numericDate: DateReader = (line, at) => {
  const text = line.words[at]?.text ?? '';
  if (!looksLikeDate(text) && !/^\d{8}$/.test(text)) return null;
  const says =
    'is not a date that is read here. Write year-month-day, such as 2026-05-04, or name the month: 4 May.';
  return wrong(line, at, 1, says, isoReadings(text, line.context.today));
};

const dayOfMonthAt = (line: Line, at: number): number | null => {
  const parts = /^(\d{1,2})(?:st|nd|rd|th)?$/.exec(line.words[at]?.lower ?? '');
  return parts === null ? null : Number(parts[1]);
};

const yearAt = (line: Line, at: number): number | null => {
  const text = line.words[at]?.text ?? '';
  return /^(?:19|20)\d{2}$/.test(text) ? Number(text) : null;
};

const monthAt = (line: Line, at: number): number | null =>
  monthNumbers.get(line.words[at]?.lower ?? '') ?? null;

/** `4 May`, `May 4`, either with a year after it; without one the latest past day is meant. */
const namedDate: DateReader = (line, at) => {
  const month = monthAt(line, at) ?? monthAt(line, at + 1);
  const dayOfMonth = dayOfMonthAt(line, at) ?? dayOfMonthAt(line, at + 1);
  if (month === null || dayOfMonth === null) return null;
  const year = yearAt(line, at + 2);
  const wordCount = year === null ? 2 : 3;
  const day =
    year === null
      ? latestBefore(line.context.today, month, dayOfMonth)
      : dayFromDate(year, month, dayOfMonth);
  if (day === null) {
    const near = monthEnd(year ?? dateParts(line.context.today).year, month);
    return wrong(line, at, wordCount, 'does not exist. Give a day of the calendar.', near);
  }
  const said = `${dayOfMonth} ${monthName(month)} read as ${isoFromDay(day)}`;
  return right(day, wordCount, year === null ? said : null);
};

/** `monday`: the latest one before today. */
const weekday: DateReader = (line, at) => {
  const lower = line.words[at]?.lower ?? '';
  const wanted = weekdayNumbers.get(lower);
  if (wanted === undefined) return null;
  const { today } = line.context;
  const daysBack = ((weekdayOf(today) - wanted + 6) % 7) + 1;
  const day = today - daysBack;
  return right(day, 1, `${lower} read as ${isoFromDay(day)}`);
};

/** A month or a year alone is not a day, but its first day is near. */
const dayMissing: DateReader = (line, at) => {
  const { today } = line.context;
  const [month, year] = [monthAt(line, at), yearAt(line, at)];
  if (month === null && year === null) return null;
  const first = month === null ? dayFromDate(year ?? 0, 1, 1) : latestBefore(today, month, 1);
  return wrong(line, at, 1, 'is not a day. Give the day too.', first === null ? [] : [isoFromDay(first)]);
};

const readers: readonly DateReader[] = [isoDate, numericDate, namedDate, weekday, dayMissing];

/** The day that the words from `at` on name. */
export const dateAt: DateReader = (line, at) => {
  if (line.words[at]?.quoted !== false) return null;
  for (const read of readers) {
    const date = read(line, at);
    if (date !== null) return date;
  }
  return null;
};

/** A date that must be before tomorrow: a window that begins in the future is empty. */
export const pastDateAt: DateReader = (line, at) => {
  const date = dateAt(line, at);
  const { today } = line.context;
  if (date === null || !date.ok || date.day <= today) return date;
  const { month, dayOfMonth } = dateParts(date.day);
  const near = latestBefore(today, month, dayOfMonth);
  const says = `is after today, ${isoFromDay(today)}. Give a day in the past.`;
  return wrong(line, at, date.wordCount, says, near === null ? [] : [isoFromDay(near)]);
};
