import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** `as picture`, `as json`. */
export const wish: Recogniser = (line, at) => {
  const form = line.words[at + 1]?.lower;
  if (form === 'picture' || form === 'json') return found({ kind: 'wish', wish: form }, 2);
  const says = 'needs picture or json after it.';
  return foundFault(faultAt(line, at, 1, { code: 'missingPart', says, instead: [''] }), 1);
};
