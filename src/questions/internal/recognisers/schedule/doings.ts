import type { Doing } from '../../pieces/piece.ts';
import { found, type Recogniser } from '../recogniser.ts';

/** Plain words for what is done with a digest or a watch that exists. */
const doings: readonly Doing[] = ['list', 'now', 'pause', 'resume', 'change', 'stop'];

export const doingWords: readonly string[] = doings;

export const doing: Recogniser = (line, at) => {
  const word = line.words[at];
  const named = word?.quoted === false ? doings.find((each) => each === word.lower) : undefined;
  return named === undefined ? null : found({ kind: 'doing', doing: named }, 1);
};
