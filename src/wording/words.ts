import { type Day, dateParts, weekdayOf } from '../terms/day.ts';
import { digits, threeDigits } from './digits.ts';

/** `1 return`, `60 returns`. */
export const counted = (count: number, singular: string, plural = `${singular}s`): string =>
  `${digits(count, 0)} ${count === 1 ? singular : plural}`;

/** A p-value: three decimals' worth of three digits, and no smaller than "<0.001". */
export const probabilityValue = (p: number): string => (p < 0.001 ? '<0.001' : threeDigits(p));

/** `a, b and c`. */
export const listed = (words: readonly string[]): string =>
  words.length <= 1 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;

const monthNames = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** `4 May 2026`, for running text; tables and quiet lines use the ISO form. */
export const dayInWords = (day: Day): string => {
  const { year, month, dayOfMonth } = dateParts(day);
  return `${dayOfMonth} ${monthNames[month - 1]} ${year}`;
};

const weekdayNames = ['Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday', 'Sunday'];

/** `Thursday`. */
export const weekdayInWords = (day: Day): string => weekdayNames[weekdayOf(day) - 1] ?? '';

/** `Thursday 26 Nov 2026`. */
export const weekdayAndDay = (day: Day): string => `${weekdayInWords(day)} ${dayInWords(day)}`;

/** Money with three significant digits and its ISO 4217 code: `18,400 USD`. */
export const moneyInWords = (amount: number, currency: string): string =>
  `${threeDigits(amount)} ${currency}`;

/** `KELP’s`, `KELPS’`. */
export const possessive = (name: string): string => (/s$/i.test(name) ? `${name}’` : `${name}’s`);

/** The first letter in upper case, the rest as it is. */
export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** `2026-11-30 18:03 UTC`: an instant as a clock in that IANA time zone shows it. */
export const instantInWords = (instantMs: number, timeZone: string): string => {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
  }).formatToParts(instantMs);
  const part = (type: string): string => parts.find((each) => each.type === type)?.value ?? '';
  return `${part('year')}-${part('month')}-${part('day')} ${part('hour')}:${part('minute')} ${timeZone}`;
};
