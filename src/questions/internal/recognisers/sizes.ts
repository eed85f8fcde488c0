import { quantityAt, scaledDecimal } from '../words/numbers.ts';
import type { Word } from '../words/word.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** Powers of ten of the units: a basis point is a hundredth of a percent. */
export const sizeUnits: ReadonlyMap<string, number> = new Map([
  ['bp', -4],
  ['bps', -4],
  ['%', -2],
  ['percent', -2],
]);

const basisPointUnits: ReadonlyMap<string, number> = new Map([
  ['bp', -4],
  ['bps', -4],
]);

export const sizeUnitWords: readonly string[] = [...sizeUnits.keys()];

type SizeFound = { readonly fraction: number; readonly wordCount: number };

const sizeAt = (words: readonly Word[], at: number, units: ReadonlyMap<string, number>): SizeFound | null => {
  const quantity = quantityAt(words, at, units);
  return quantity === null
    ? null
    : { fraction: scaledDecimal(quantity.decimal, quantity.unit), wordCount: quantity.wordCount };
};

/** `20bp`, `20 bps`. A percentage is left to {@link percent}, since it may be a level. */
export const basisPoints: Recogniser = (line, at) => {
  const size = sizeAt(line.words, at, basisPointUnits);
  return size === null ? null : found({ kind: 'size', fraction: size.fraction }, size.wordCount);
};

/** `beyond 4%`, `beyond 400bp`: a daily loss, written without a sign. */
export const beyond: Recogniser = (line, at) => {
  const size = sizeAt(line.words, at + 1, sizeUnits);
  if (size === null) {
    const says = 'needs a daily loss after it, such as beyond 4%.';
    return foundFault(faultAt(line, at, 1, { code: 'missingPart', says, instead: [''] }), 1);
  }
  const wordCount = size.wordCount + 1;
  if (size.fraction > 0 && size.fraction < 1)
    return found({ kind: 'beyond', fraction: size.fraction }, wordCount);
  const unsigned = line.words[at + 1]?.text.replace(/^[+-]/, '') ?? '';
  const says = 'is not a daily loss. Give more than 0% and less than 100%, without a sign.';
  const near = size.fraction < 0 ? [`beyond ${unsigned}${size.wordCount === 2 ? '%' : ''}`] : [];
  const fault = faultAt(line, at, wordCount, { code: 'sizeOutside', says, instead: [...near, 'beyond 4%'] });
  return foundFault(fault, wordCount);
};
