import type { Window } from '../../../terms/window.ts';
import { limits } from '../../limits.ts';
import { quantityAt, wholeNumberOf } from '../words/numbers.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

type WindowUnit = 'day' | 'week' | 'month' | 'year';

const windowUnits: ReadonlyMap<string, WindowUnit> = new Map([
  ['d', 'day'],
  ['day', 'day'],
  ['days', 'day'],
  ['w', 'week'],
  ['week', 'week'],
  ['weeks', 'week'],
  ['m', 'month'],
  ['month', 'month'],
  ['months', 'month'],
  ['y', 'year'],
  ['year', 'year'],
  ['years', 'year'],
]);

export const windowUnitWords: readonly string[] = [...windowUnits.keys()];

const windowOf = (amount: number, unit: WindowUnit): Window =>
  unit === 'day' ? { kind: 'returns', count: amount } : { kind: 'span', amount, unit };

/** Whole months or weeks near a fraction of a larger unit: `1.5y` is 18 months. */
const wholeParts = (decimal: string, unit: WindowUnit): readonly string[] => {
  const amount = Number(decimal);
  if (!(amount > 0)) return [];
  if (unit === 'year') return [`${Math.max(1, Math.round(amount * 12))}m`];
  return [`${Math.max(1, Math.round(amount))}${unit.charAt(0)}`];
};

/** `60d`, `60 days`, `12w`, `3m`, `1y`. */
export const windowLength: Recogniser = (line, at) => {
  const quantity = quantityAt(line.words, at, windowUnits);
  if (quantity === null) return null;
  const { decimal, unit, wordCount } = quantity;
  const amount = wholeNumberOf(decimal, limits.windowReturns);
  if (amount !== null && amount > 0)
    return found({ kind: 'window', window: windowOf(amount, unit) }, wordCount);
  const code = Number(decimal) > 0 ? 'sizeOutside' : 'windowEmpty';
  const says = `is not a window. Give a whole number of ${unit}s from 1 to ${limits.windowReturns}.`;
  const near = amount === null ? wholeParts(decimal, unit) : [];
  return foundFault(faultAt(line, at, wordCount, { code, says, instead: [...near, ''] }), wordCount);
};

export const yearToDate: Recogniser = () => found({ kind: 'window', window: { kind: 'yearToDate' } }, 1);

export const wholeHistory: Recogniser = () => found({ kind: 'window', window: { kind: 'all' } }, 1);
