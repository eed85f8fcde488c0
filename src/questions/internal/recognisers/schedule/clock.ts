import { faultAt, found, foundFault, type Line, type Recogniser } from '../recogniser.ts';

/** `08:30`, `8.30`, `8:30am`, `8pm`. With a point and a single 0 before it, a level is meant: 0.55. */
const timePattern = /^(?!0\.)(\d{1,2})(?:[:.](\d{2}))?(am|pm)?$/;

type Time = { readonly hours: number; readonly minutes: number; readonly half: string | null };

type TimeFound = { readonly time: Time; readonly wordCount: number };

/** What is written like a time: a part of an hour or a half of the day tells it from a number. */
const timeAt = ({ words }: Line, at: number): TimeFound | null => {
  const [word, next] = [words[at], words[at + 1]];
  const parts = word?.quoted === false ? timePattern.exec(word.lower) : null;
  if (parts === null) return null;
  const apart = parts[3] === undefined && (next?.lower === 'am' || next?.lower === 'pm');
  const half = apart ? next.lower : (parts[3] ?? null);
  if (parts[2] === undefined && half === null) return null;
  const time = { hours: Number(parts[1]), minutes: Number(parts[2] ?? 0), half };
  return { time, wordCount: apart ? 2 : 1 };
};

/** Minutes after midnight; null where no clock shows it. */
const minutesOf = ({ hours, minutes, half }: Time): number | null => {
  if (minutes > 59) return null;
  if (half === null) return hours <= 23 ? hours * 60 + minutes : null;
  if (hours < 1 || hours > 12) return null;
  return ((hours % 12) + (half === 'pm' ? 12 : 0)) * 60 + minutes;
};

/** A decimal with a point that no clock shows is left to the levels: `99.50`. */
const mayBeLevel = ({ words }: Line, at: number): boolean => words[at]?.text.includes('.') ?? false;

/** When something is posted, with or without `at` before it. */
export const clock: Recogniser = (line, at) => {
  const lead = line.words[at]?.lower === 'at' ? 1 : 0;
  const read = timeAt(line, at + lead);
  if (read === null) return null;
  const wordCount = lead + read.wordCount;
  const minutes = minutesOf(read.time);
  if (minutes !== null) return found({ kind: 'clock', minutes }, wordCount);
  if (read.time.half === null && mayBeLevel(line, at + lead)) return null;
  const says = 'is not a time of day. Write 08:30, 8.30 or 8:30am.';
  return foundFault(faultAt(line, at, wordCount, { code: 'badTime', says, instead: ['08:30'] }), wordCount);
};

/** Times that a bare number may be short for. */
export const asClock = (decimal: string): readonly string[] =>
  /^\d{1,2}$/.test(decimal) && Number(decimal) <= 23 ? [`${decimal.padStart(2, '0')}:00`] : [];
