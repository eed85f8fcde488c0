import { editDistance } from '../../../terms/nearest.ts';
import { closestWords } from '../../closestWords.ts';
import { limits } from '../../limits.ts';
import type { Edit, Repair } from '../faults/fault.ts';
import type { Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { languageWords } from '../recognisers/table.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import type { Word } from '../words/word.ts';
import { meantBy } from './meantBy.ts';

const knownWords: readonly string[] = [...languageWords];

/** The word of the language, or of the verb's own, that comes nearest to an unread one. */
export const nearWords = (reader: VerbReader, word: Word): readonly string[] =>
  closestWords(word.lower, reader.ownWords ?? knownWords, 1).filter((near) => {
    const most = Math.max(1, Math.floor(near.length / 3));
    return near !== word.lower && editDistance(near, word.lower.slice(0, limits.shownCharacters)) <= most;
  });

export const tickerShape = /^[a-z\d.^=/-]{1,12}$/i;

export const nearTickers = (line: Line, word: Word): readonly string[] =>
  tickerShape.test(word.text) ? line.context.vocabulary.nearest(word.text, limits.suggestionsPerProblem) : [];

const textsFor = (line: Line, reader: VerbReader, word: Word, isTicker: boolean): readonly string[] => {
  const tickers = nearTickers(line, word).map((ticker) => `\`${ticker}\``);
  const words = [...meantBy(word.lower), ...nearWords(reader, word)];
  return isTicker ? [...tickers, ...words, ''] : [...words, ''];
};

const editOf = (placed: Placed, text: string): Edit => ({ first: placed.first, wordCount: 1, text });

const mostRepaired = 3;

/** For one word each of its readings; for a few the likeliest of each, or all left out; for many nothing is guessed. */
export const unreadRepairs = (
  line: Line,
  reader: VerbReader,
  unread: readonly Placed[],
  areTickers: boolean,
): readonly Repair[] => {
  if (unread.length > mostRepaired) return [];
  const choices = unread.map((placed) => {
    const word = line.words[placed.first];
    return { placed, texts: word === undefined ? [''] : textsFor(line, reader, word, areTickers) };
  });
  const [only] = choices;
  if (choices.length === 1 && only !== undefined)
    return only.texts.map((text) => [editOf(only.placed, text)]);
  return [
    choices.map(({ placed, texts }) => editOf(placed, texts[0] ?? '')),
    choices.map(({ placed }) => editOf(placed, '')),
  ];
};
