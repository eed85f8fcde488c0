import type { Word } from './word.ts';

const quantityPattern = /^([+-]?(?:\d{1,3}(?:,\d{3})+|\d{1,12})?(?:\.\d{1,8})?)([a-z%]*)$/;

type Parts = { readonly decimal: string; readonly unit: string };

const partsOf = (word: Word | undefined): Parts | null => {
  const parts = word === undefined || word.quoted ? null : quantityPattern.exec(word.lower);
  const decimal = (parts?.[1] ?? '').replace(/[,+]/g, '');
  return /\d/.test(decimal) ? { decimal, unit: parts?.[2] ?? '' } : null;
};

/** The number without its sign plus and its thousands commas, when the word is nothing but a number. */
export const decimalOf = (word: Word | undefined): string | null => {
  const parts = partsOf(word);
  return parts !== null && parts.unit === '' ? parts.decimal : null;
};

export type Quantity<Unit> = { readonly decimal: string; readonly unit: Unit; readonly wordCount: number };

/** A number with one of the units, in one word (`60d`) or two (`60 days`); null where there is none. */
export const quantityAt = <Unit>(
  words: readonly Word[],
  at: number,
  units: ReadonlyMap<string, Unit>,
): Quantity<Unit> | null => {
  const parts = partsOf(words[at]);
  if (parts === null) return null;
  const next = words[at + 1];
  const apart = parts.unit === '' && next !== undefined && !next.quoted;
  const unit = units.get(apart ? next.lower : parts.unit);
  return unit === undefined ? null : { decimal: parts.decimal, unit, wordCount: apart ? 2 : 1 };
};

/** The whole number that a decimal text is, or null where it has a fraction, a sign or too many digits. */
export const wholeNumberOf = (decimal: string, most: number): number | null => {
  const value = /^\d{1,12}$/.test(decimal) ? Number(decimal) : Number.NaN;
  return value <= most ? value : null;
};

/** The decimal times a power of ten, rounded once: `scaledDecimal('20', -4)` is 0.002. */
export const scaledDecimal = (decimal: string, powerOfTen: number): number =>
  Number(`${decimal}e${powerOfTen}`);
