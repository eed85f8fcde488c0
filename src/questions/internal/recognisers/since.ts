import { pastDateAt } from './dates.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** `since 2026-05-04`, `since 4 May`, `since monday`. */
export const since: Recogniser = (line, at) => {
  const date = pastDateAt(line, at + 1);
  if (date === null) {
    const says = 'needs a day after it, such as 2026-05-04, 4 May or monday.';
    return foundFault(faultAt(line, at, 1, { code: 'missingPart', says, instead: [''] }), 1);
  }
  const wordCount = date.wordCount + 1;
  if (!date.ok) return foundFault(date.fault, wordCount);
  return found({ kind: 'window', window: { kind: 'since', day: date.day } }, wordCount, date.assumed);
};
