import { pastDateAt } from './dates.ts';
import { faultAt, found, foundFault, type Line, type Recogniser } from './recogniser.ts';

/** How many of the words from `at` on only lead to the date: `before`, `after`, `before and after`. */
const leadingWords = (line: Line, at: number): number => {
  const [second, third] = [line.words[at + 1]?.lower, line.words[at + 2]?.lower];
  const both = second === 'and' && (third === 'before' || third === 'after');
  return both ? 3 : 1;
};

/** `before 2026-05-04` or `after 2026-05-04`: the day on which the second of two periods begins. */
export const splitDay: Recogniser = (line, at) => {
  const leading = leadingWords(line, at);
  const date = pastDateAt(line, at + leading);
  if (date === null) {
    const says = 'needs a day after it, such as 2026-05-04, 4 May or monday.';
    return foundFault(faultAt(line, at, leading, { code: 'missingPart', says, instead: [''] }), leading);
  }
  const wordCount = leading + date.wordCount;
  if (!date.ok) return foundFault(date.fault, wordCount);
  return found({ kind: 'splitDay', day: date.day }, wordCount, date.assumed);
};
