import { editDistance } from '../../../terms/nearest.ts';
import { notAsked } from '../../help/topics.ts';
import type { Fault } from '../faults/fault.ts';
import { asSentence, shownWords } from '../faults/shownWords.ts';
import { allOf, type Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import type { Word } from '../words/word.ts';
import { notAskedFault } from './notAskedFault.ts';
import { nearTickers, nearWords, tickerShape, unreadRepairs } from './unreadRepairs.ts';

const isOneSlipFrom = (word: Word, near: string | undefined): boolean =>
  near !== undefined && editDistance(near.toLowerCase(), word.lower) <= 1;

const leastLettersOfSlip = 4;

/** Typed like a ticker or one slip away from one, and no misspelt word of the language. */
const meantAsTicker = (line: Line, reader: VerbReader, word: Word): boolean => {
  if (!tickerShape.test(word.text) || !/[a-z]/i.test(word.text)) return false;
  if (isOneSlipFrom(word, nearTickers(line, word)[0])) return true;
  const misspelt = word.text.length >= leastLettersOfSlip && isOneSlipFrom(word, nearWords(reader, word)[0]);
  return !misspelt && word.text === word.text.toUpperCase();
};

/** The only word left for a verb that lacks its ticker counts as one, whatever it looks like. */
const areTickers = (
  line: Line,
  reader: VerbReader,
  words: readonly Word[],
  lacksTicker: boolean,
): boolean => {
  if (reader.tickers.most === 0) return false;
  const [only] = words;
  const lastResort = lacksTicker && words.length === 1 && only !== undefined && tickerShape.test(only.text);
  return lastResort || words.every((word) => meantAsTicker(line, reader, word));
};

const mostShown = 3;

const shownAll = (line: Line, unread: readonly Placed[]): string => {
  const shown = unread.slice(0, mostShown).map(({ first }) => shownWords(line.words, first, 1));
  const more = unread.length - shown.length;
  return asSentence(`${shown.join(', ')}${more > 0 ? ` and ${more} more` : ''}`);
};

const notInFeed = (line: Line, words: readonly Word[]): string => {
  const near = [...new Set(words.slice(0, mostShown).flatMap((word) => nearTickers(line, word)))];
  const closest = near.length === 0 ? 'Ask feed for what is there.' : `Closest: ${near.join(', ')}.`;
  return `${words.length === 1 ? 'is' : 'are'} not in the feed. ${closest}`;
};

/** Why the words that nothing read refuse the line; null where every word was read. */
export const unreadFault = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null => {
  const unread = allOf(pieces, 'unread');
  const [first] = unread;
  const last = unread[unread.length - 1];
  if (first === undefined || last === undefined) return null;
  const words = unread.flatMap((placed) => line.words[placed.first] ?? []);
  const topic = notAsked(words[0]?.lower ?? '');
  if (topic !== null) return notAskedFault(line, first.first, topic);
  const lacksTicker = allOf(pieces, 'ticker').length < reader.tickers.least;
  const tickers = areTickers(line, reader, words, lacksTicker);
  const says = tickers
    ? notInFeed(line, words)
    : 'cannot be read here. Leave out what is not needed, or ask help for what can be said.';
  return {
    code: tickers ? 'unknownTicker' : 'unreadableWords',
    message: `${shownAll(line, unread)} ${says}`,
    first: first.first,
    wordCount: last.first - first.first + 1,
    repairs: unreadRepairs(line, reader, unread, tickers),
  };
};
