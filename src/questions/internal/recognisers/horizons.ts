import { limits } from '../../limits.ts';
import { decimalOf, quantityAt, wholeNumberOf } from '../words/numbers.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** Sessions in each unit, used only to suggest: a horizon is counted in days of trading. */
const sessionsIn: ReadonlyMap<string, number> = new Map([
  ['d', 1],
  ['day', 1],
  ['days', 1],
  ['w', 5],
  ['week', 5],
  ['weeks', 5],
  ['m', 21],
  ['month', 21],
  ['months', 21],
  ['y', 250],
  ['year', 250],
  ['years', 250],
]);

/** `over 10d`: how many trading days ahead a tail figure looks. */
export const horizon: Recogniser = (line, at) => {
  const quantity = quantityAt(line.words, at + 1, sessionsIn);
  if (quantity === null) return incomplete(line, at);
  const wordCount = quantity.wordCount + 1;
  const days = quantity.unit === 1 ? wholeNumberOf(quantity.decimal, limits.horizonDays) : null;
  if (days !== null && days > 0) return found({ kind: 'horizon', days }, wordCount);
  const asked = Math.round(Number(quantity.decimal) * quantity.unit);
  const near = Math.min(Math.max(asked, 1), limits.horizonDays);
  const says = `is not a horizon. Give whole trading days from 1d to ${limits.horizonDays}d.`;
  const fault = faultAt(line, at, wordCount, { code: 'sizeOutside', says, instead: [`over ${near}d`] });
  return foundFault(fault, wordCount);
};

const incomplete: Recogniser = (line, at) => {
  const decimal = decimalOf(line.words[at + 1]);
  const wordCount = decimal === null ? 1 : 2;
  const says =
    decimal === null ? 'needs trading days after it, such as over 10d.' : 'has no unit. Write over 10d.';
  const near = decimal === null ? [''] : [`over ${decimal}d`];
  return foundFault(faultAt(line, at, wordCount, { code: 'missingPart', says, instead: near }), wordCount);
};
