import type { InstantMs } from './clock.ts';
import { type Day, dayFromDate } from './day.ts';

/** What the clocks and calendars of a time zone show: a day and whole minutes after midnight. */
export type LocalTime = { readonly day: Day; readonly minutes: number };

const millisecondsPerDay = 86_400_000;
const millisecondsPerMinute = 60_000;

/** Making one is slow; there are as many as zones were named. */
const formats = new Map<string, Intl.DateTimeFormat>();

const formatOf = (timeZone: string): Intl.DateTimeFormat => {
  const made =
    formats.get(timeZone) ??
    new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hourCycle: 'h23',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
      hour: 'numeric',
      minute: 'numeric',
    });
  formats.set(timeZone, made);
  return made;
};

/** What the clocks of an IANA time zone show at an instant, seconds dropped. */
export const localTimeAt = (instantMs: InstantMs, timeZone: string): LocalTime => {
  const parts = formatOf(timeZone).formatToParts(instantMs);
  const part = (type: string): number => Number(parts.find((one) => one.type === type)?.value);
  const day = dayFromDate(part('year'), part('month'), part('day'));
  if (day === null) throw new Error(`localTimeAt: no calendar day at ${instantMs} in ${timeZone}`);
  return { day, minutes: part('hour') * 60 + part('minute') };
};

/** How far the clocks of the zone are ahead of UTC, in milliseconds. */
const offsetAt = (instantMs: InstantMs, timeZone: string): number => {
  const { day, minutes } = localTimeAt(instantMs, timeZone);
  const shown = day * millisecondsPerDay + minutes * millisecondsPerMinute;
  return shown - Math.floor(instantMs / millisecondsPerMinute) * millisecondsPerMinute;
};

/** The first whole minute in (from, to] at which the offset is no longer the one at `from`. */
const changeBetween = (fromMs: InstantMs, toMs: InstantMs, timeZone: string): InstantMs => {
  const before = offsetAt(fromMs, timeZone);
  let [low, high] = [fromMs / millisecondsPerMinute, toMs / millisecondsPerMinute];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (offsetAt(middle * millisecondsPerMinute, timeZone) === before) low = middle;
    else high = middle;
  }
  return high * millisecondsPerMinute;
};

/**
 * The instant at which the clocks of a zone show a time of a day. A time that they show twice is the first of the two; a
 * time that they skip is the instant at which they skip it. Example: 02:30 on 2026-03-29 in Europe/Berlin is skipped and
 * becomes 01:00 UTC, when 02:00 turns into 03:00.
 */
export const instantOf = ({ day, minutes }: LocalTime, timeZone: string): InstantMs => {
  const shownMs = day * millisecondsPerDay + minutes * millisecondsPerMinute;
  const [before, after] = [
    offsetAt(shownMs - millisecondsPerDay, timeZone),
    offsetAt(shownMs + millisecondsPerDay, timeZone),
  ];
  const candidates = [shownMs - Math.max(before, after), shownMs - Math.min(before, after)] as const;
  const found = candidates.find((instantMs) => offsetAt(instantMs, timeZone) === shownMs - instantMs);
  return found ?? changeBetween(candidates[0], candidates[1], timeZone);
};

/** The zone as the engine's own list of IANA names writes it, in whatever case it is given; null where it has none. */
export const namedTimeZone = (text: string): string | null => {
  try {
    return new Intl.DateTimeFormat('en-GB', { timeZone: text }).resolvedOptions().timeZone;
  } catch {
    // the engine's one way of saying that it does not know a zone
    return null;
  }
};

const twoDigits = (value: number): string => String(value).padStart(2, '0');

/** `08:30`: minutes after midnight as a clock shows them. */
export const clockText = (minutes: number): string =>
  `${twoDigits(Math.floor(minutes / 60))}:${twoDigits(minutes % 60)}`;
