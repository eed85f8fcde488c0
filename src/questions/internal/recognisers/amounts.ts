import type { Exposure } from '../../question.ts';
import { decimalOf, quantityAt, scaledDecimal } from '../words/numbers.ts';
import type { Word } from '../words/word.ts';
import { currencyOf } from './currencies.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** Powers of ten. `mm` and `mn` for millions and `bn` are trade usage. */
const magnitudes: ReadonlyMap<string, number> = new Map([
  ['k', 3],
  ['thousand', 3],
  ['m', 6],
  ['mm', 6],
  ['mn', 6],
  ['million', 6],
  ['bn', 9],
  ['billion', 9],
]);

export const amountWords: readonly string[] = [...magnitudes.keys(), 'share', 'shares'];

type AmountFound = { readonly amount: number; readonly wordCount: number };

const amountAt = (words: readonly Word[], at: number): AmountFound | null => {
  const quantity = quantityAt(words, at, magnitudes);
  if (quantity !== null)
    return { amount: scaledDecimal(quantity.decimal, quantity.unit), wordCount: quantity.wordCount };
  const decimal = decimalOf(words[at]);
  return decimal === null ? null : { amount: Number(decimal), wordCount: 1 };
};

type ExposureFound = { readonly exposure: Exposure; readonly wordCount: number };

/** Shares, a currency or nothing may follow the amount; nothing leaves the currency to the ticker. */
const exposureOf = ({ amount, wordCount }: AmountFound, after: Word | undefined): ExposureFound => {
  if (after?.lower === 'shares' || after?.lower === 'share')
    return { exposure: { kind: 'shares', shares: amount }, wordCount: wordCount + 1 };
  const currency = after === undefined || after.quoted ? null : currencyOf(after.lower);
  return {
    exposure: { kind: 'money', amount, currency },
    wordCount: currency === null ? wordCount : wordCount + 1,
  };
};

/** `on 2m USD`, `on 500k`, `on 500 shares`; negative is short. */
export const exposure: Recogniser = (line, at) => {
  const amount = amountAt(line.words, at + 1);
  if (amount === null) {
    const says = 'needs an amount after it, such as on 2m USD or on 500 shares.';
    return foundFault(faultAt(line, at, 1, { code: 'missingPart', says, instead: [''] }), 1);
  }
  const read = exposureOf(amount, line.words[at + 1 + amount.wordCount]);
  const wordCount = read.wordCount + 1;
  if (amount.amount !== 0) return found({ kind: 'exposure', exposure: read.exposure }, wordCount);
  const says = 'is nothing at stake. Give an amount other than 0.';
  return foundFault(faultAt(line, at, wordCount, { code: 'sizeOutside', says, instead: [''] }), wordCount);
};
