import type { Day } from '../../../terms/day.ts';
import { decimalOf } from '../words/numbers.ts';
import { isoReadings } from './numericDates.ts';
import { found, type Recogniser } from './recogniser.ts';

/** A number without a unit. Only the verb can say whether it has a use for one. */
export const bareNumber: Recogniser = (line, at) => {
  const decimal = decimalOf(line.words[at]);
  return decimal === null ? null : found({ kind: 'number', decimal }, 1);
};

/** Texts that a bare number may have been short for: a level, a window, or a date without dashes. */
export const levelOrWindow = (decimal: string, today: Day): readonly string[] => {
  if (/^\d{8}$/.test(decimal)) return isoReadings(decimal, today).map((day) => `since ${day}`);
  const value = Number(decimal);
  const level = value > 0 && value < 100 ? [`at ${decimal}${value < 1 ? '' : '%'}`] : [];
  const window = /^\d{1,7}$/.test(decimal) && value > 0 ? [`${decimal}d`] : [];
  return [...level, ...window];
};
