import { dayFromDate } from '../../../terms/day.ts';

/** What stands for a day or a price that is not plainly written. */
export const notPlain = -2_147_483_648;

const [zero, nine, hyphen, point] = [0x30, 0x39, 0x2d, 0x2e];

/** The number of some digits from `start` to before `end`; less than zero where anything else stands there. */
const digits = (bytes: Uint8Array, start: number, end: number): number => {
  let value = 0;
  for (let at = start; at < end; at += 1) {
    const byte = bytes[at] as number;
    if (byte < zero || byte > nine) return -1;
    value = 10 * value + byte - zero;
  }
  return value;
};

const unknownMonth = notPlain + 1;

/** Reads dates like `2026-11-27`: the day, or `notPlain`. The first day of a month is worked out once. */
export const makeDateReader = (): ((bytes: Uint8Array, start: number, end: number) => number) => {
  const firstDays = new Int32Array(12 * 10_000).fill(unknownMonth);
  const lengths = new Uint8Array(12 * 10_000);
  const learn = (year: number, month: number): number => {
    const place = 12 * year + month - 1;
    const first = dayFromDate(year, month, 1) ?? notPlain;
    firstDays[place] = first;
    lengths[place] = [31, 30, 29, 28].find((last) => dayFromDate(year, month, last) !== null) ?? 0;
    return first;
  };
  return (bytes, start, end) => {
    if (end - start !== 10 || bytes[start + 4] !== hyphen || bytes[start + 7] !== hyphen) return notPlain;
    const year = digits(bytes, start, start + 4);
    const month = digits(bytes, start + 5, start + 7);
    const dayOfMonth = digits(bytes, start + 8, start + 10);
    if (year < 1 || month < 1 || month > 12 || dayOfMonth < 1) return notPlain;
    const place = 12 * year + month - 1;
    let first = firstDays[place] as number;
    if (first === unknownMonth) first = learn(year, month);
    return dayOfMonth <= (lengths[place] as number) ? first + dayOfMonth - 1 : notPlain;
  };
};

/** So many digits are a whole number that a double holds exactly, whatever the digits are. */
const mostDigits = 15;
const powersOfTen = Float64Array.from({ length: mostDigits + 1 }, (_, power) => 10 ** power);

/**
 * The number of digits with or without a decimal point among them; `notPlain` for anything else. Both the digits and
 * the power of ten are exact doubles, so that their quotient is the double nearest to what is written (Clinger 1990).
 */
export const readNumber = (bytes: Uint8Array, start: number, end: number): number => {
  let pointAt = start;
  while (pointAt < end && bytes[pointAt] !== point) pointAt += 1;
  const decimals = Math.max(end - pointAt - 1, 0);
  const wholeDigits = pointAt - start;
  if (wholeDigits < 1 || wholeDigits + decimals > mostDigits || pointAt === end - 1) return notPlain;
  if (wholeDigits > 1 && bytes[start] === zero) return notPlain;
  const whole = digits(bytes, start, pointAt);
  const fraction = digits(bytes, pointAt + 1, end);
  if (whole < 0 || fraction < 0) return notPlain;
  const scale = powersOfTen[decimals] as number;
  return (whole * scale + fraction) / scale;
};
