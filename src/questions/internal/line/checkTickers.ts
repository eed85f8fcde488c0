import type { Fault } from '../faults/fault.ts';
import { allOf, type Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import { quotedTickers } from './quotedTickers.ts';

const noTicker = (line: Line, reader: VerbReader): Fault => ({
  code: 'noTicker',
  message: `${reader.verb} needs a ticker and none was given. Name one; feed lists them.`,
  first: 0,
  wordCount: line.words.length,
  repairs: [
    ...quotedTickers(line),
    ...line.context.vocabulary
      .nearest('', 1)
      .map((ticker) => [{ first: line.words.length, wordCount: 0, text: `\`${ticker}\`` }]),
  ],
});

/** Too few or too many tickers for the verb; null where their number is right. */
export const checkTickers = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null => {
  const { least, most } = reader.tickers;
  const tickers = allOf(pieces, 'ticker');
  if (tickers.length < least) return noTicker(line, reader);
  const spare = tickers.slice(most);
  const [first] = spare;
  if (first === undefined) return null;
  return {
    code: 'tooManyTickers',
    message: `${tickers.length} tickers are more than the ${most} that are answered at once. Ask for the others separately.`,
    first: first.first,
    wordCount: 1,
    repairs: [spare.map((placed) => ({ first: placed.first, wordCount: placed.wordCount, text: '' }))],
  };
};
