import type { Repair } from '../faults/fault.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { recogniseAt } from '../recognisers/table.ts';
import { verbOfWord } from '../verbs/verbWords.ts';

/** Puts in back-ticks the words that were read as words of the language although the feed has a ticker of that name. */
export const quotedTickers = (line: Line): readonly Repair[] =>
  line.words.flatMap((word, at) => {
    const ticker = word.quoted ? null : line.context.vocabulary.canonicalTicker(word.text);
    const isWord = verbOfWord(word.lower) !== null || recogniseAt(line, at)?.piece.kind !== 'ticker';
    return ticker === null || !isWord ? [] : [[{ first: at, wordCount: 1, text: `\`${ticker}\`` }]];
  });
