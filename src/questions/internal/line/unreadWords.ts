import { editDistance } from '../../../terms/nearest.ts';
import { closestWords } from '../../closestWords.ts';
import { notAsked } from '../../help/topics.ts';
import { limits } from '../../limits.ts';
import type { Edit, Fault, Repair } from '../faults/fault.ts';
import { shownWords } from '../faults/shownWords.ts';
import type { Placed } from '../pieces/piece.ts';
import { allOf } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { languageWords } from '../recognisers/table.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import type { Word } from '../words/word.ts';
import { meantBy } from './meantBy.ts';
import { notAskedFault } from './notAskedFault.ts';

const tickerShape = /^[a-z\d.^=/-]{1,12}$/i;

const knownWords: readonly string[] = [...languageWords];

const nearTickers = (line: Line, word: Word): readonly string[] =>
  tickerShape.test(word.text) ? line.context.vocabulary.nearest(word.text, limits.suggestionsPerProblem) : [];

/** Typed like a ticker, one slip away from one, or the only word left for a verb that lacks its ticker. */
const meantAsTicker = (line: Line, word: Word, lacksTicker: boolean): boolean => {
  if (!tickerShape.test(word.text) || !/[a-z]/i.test(word.text)) return false;
  const [near] = nearTickers(line, word);
  const oneSlip = near !== undefined && editDistance(near.toLowerCase(), word.lower) <= 1;
  const typedAsOne = word.text === word.text.toUpperCase();
  return typedAsOne || oneSlip || lacksTicker;
};

const textsFor = (line: Line, word: Word): readonly string[] => [
  ...meantBy(word.lower),
  ...closestWords(word.lower, knownWords, 1),
  ...nearTickers(line, word).map((ticker) => `\`${ticker}\``),
  '',
];

const editOf = (placed: Placed, text: string): Edit => ({ first: placed.first, wordCount: 1, text });

const mostRepaired = 3;

/** For one word each of its readings; for a few the likeliest of each, or all left out; for many nothing is guessed. */
const repairsOf = (line: Line, unread: readonly Placed[]): readonly Repair[] => {
  if (unread.length > mostRepaired) return [];
  const choices = unread.map((placed) => {
    const word = line.words[placed.first];
    return { placed, texts: word === undefined ? [''] : textsFor(line, word) };
  });
  const [only] = choices;
  if (choices.length === 1 && only !== undefined)
    return only.texts.map((text) => [editOf(only.placed, text)]);
  return [
    choices.map(({ placed, texts }) => editOf(placed, texts[0] ?? '')),
    choices.map(({ placed }) => editOf(placed, '')),
  ];
};

const mostShown = 3;

const shownAll = (line: Line, unread: readonly Placed[]): string => {
  const shown = unread.slice(0, mostShown).map(({ first }) => shownWords(line.words, first, 1));
  const more = unread.length - shown.length;
  return `${shown.join(', ')}${more > 0 ? ` and ${more} more` : ''}`;
};

const notInFeed = (line: Line, word: Word, placed: Placed): string => {
  const near = nearTickers(line, word);
  const closest = near.length === 0 ? 'Ask feed for what is.' : `Closest: ${near.join(', ')}.`;
  return `${shownWords(line.words, placed.first, 1)} is not in the feed. ${closest}`;
};

const ofOneWord = (
  line: Line,
  placed: Placed,
  word: Word,
  reader: VerbReader,
  lacksTicker: boolean,
): Fault => {
  const topic = notAsked(word.lower);
  if (topic !== null) return notAskedFault(line, placed.first, topic);
  const repairs = repairsOf(line, [placed]);
  const place = { first: placed.first, wordCount: 1 };
  if (reader.tickers.most > 0 && meantAsTicker(line, word, lacksTicker))
    return { code: 'unknownTicker', message: notInFeed(line, word, placed), ...place, repairs };
  const message = `${shownWords(line.words, placed.first, 1)} cannot be read here. Leave it out, or ask help for what can be said.`;
  return { code: 'unreadableWords', message, ...place, repairs };
};

/** Why the words that nothing read refuse the line; null where every word was read. */
export const unreadFault = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null => {
  const unread = allOf(pieces, 'unread');
  const [first] = unread;
  const last = unread[unread.length - 1];
  if (first === undefined || last === undefined) return null;
  const word = line.words[first.first];
  const lacksTicker = allOf(pieces, 'ticker').length < reader.tickers.least;
  if (unread.length === 1 && word !== undefined) return ofOneWord(line, first, word, reader, lacksTicker);
  return {
    code: 'unreadableWords',
    message: `${shownAll(line, unread)} cannot be read here. Leave out what is not needed, or ask help for what can be said.`,
    first: first.first,
    wordCount: last.first - first.first + 1,
    repairs: repairsOf(line, unread),
  };
};
