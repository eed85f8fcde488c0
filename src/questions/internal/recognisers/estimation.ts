import { limits } from '../../limits.ts';
import { quantityAt, wholeNumberOf } from '../words/numbers.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

const dayUnits: ReadonlyMap<string, 'day'> = new Map([
  ['d', 'day'],
  ['day', 'day'],
  ['days', 'day'],
]);

/** `on window 500d`: the returns from which a backtest makes each day's figure. */
export const estimation: Recogniser = (line, at) => {
  if (line.words[at + 1]?.lower !== 'window') return null;
  const quantity = quantityAt(line.words, at + 2, dayUnits);
  const returns = quantity === null ? null : wholeNumberOf(quantity.decimal, limits.windowReturns);
  const wordCount = 2 + (quantity?.wordCount ?? 0);
  if (returns !== null && returns > 0) return found({ kind: 'estimation', returns }, wordCount);
  const says = 'needs a number of returns, such as on window 500d.';
  return foundFault(faultAt(line, at, wordCount, { code: 'missingPart', says, instead: [''] }), wordCount);
};
