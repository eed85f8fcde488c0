import { found, type Recogniser } from './recogniser.ts';

/** The closed list of words that are skipped. Any other word that is not read refuses the question. */
export const fillerWords: readonly string[] = [
  'please',
  'pls',
  'thanks',
  "what's",
  'the',
  'is',
  'for',
  'of',
  'makes',
  'about',
  'last',
  'vs',
  'and',
  '&',
  'same',
];

export const filler: Recogniser = () => found({ kind: 'filler' }, 1);

/** `a day` is skipped, since figures are daily; `a year` makes them annual. */
export const perPeriod: Recogniser = (line, at) => {
  const next = line.words[at + 1]?.lower;
  if (next === 'day') return found({ kind: 'filler' }, 2);
  return next === 'year' ? found({ kind: 'annual' }, 2) : null;
};
