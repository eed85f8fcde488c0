import type { Vocabulary } from '../../context.ts';
import { mentionMark } from '../cleaning/angleBrackets.ts';
import { type Chunk, splitAtCommas, splitAtSlashes, trimPunctuation } from './separators.ts';
import { createWord, type Word } from './word.ts';

const chunkPattern = /`([^`\n]*)`|[^\s`;"()[\]{}•…?!]+/g;

/** The words of a text. `offset` is where the text stands in the cleaned message. */
export const splitWords = (text: string, offset: number, vocabulary: Vocabulary): readonly Word[] => {
  const words: Word[] = [];
  for (const match of text.matchAll(chunkPattern)) {
    const start = offset + match.index;
    const ticked = match[1];
    if (ticked === undefined) words.push(...wordsOfChunk({ text: match[0], start }, vocabulary));
    else words.push(...wordsInBackTicks(ticked, start + 1, vocabulary));
  }
  return words;
};

/** Back-ticks mark a ticker where the feed has it; around anything else they are only formatting. */
const wordsInBackTicks = (inside: string, start: number, vocabulary: Vocabulary): readonly Word[] =>
  vocabulary.canonicalTicker(inside.trim()) === null
    ? splitWords(inside, start, vocabulary)
    : [createWord(inside.trim(), start + inside.search(/\S/), true)];

const isTicker = (text: string, vocabulary: Vocabulary): boolean => vocabulary.canonicalTicker(text) !== null;

const plainWord = /^[A-Za-z\d%]+$/;

const wordsOfChunk = (chunk: Chunk, vocabulary: Vocabulary): readonly Word[] => {
  if (plainWord.test(chunk.text) || chunk.text === mentionMark || isTicker(chunk.text, vocabulary))
    return [createWord(chunk.text, chunk.start)];
  return splitAtCommas(chunk)
    .flatMap((part) => (isTicker(part.text, vocabulary) ? [part] : splitAtSlashes(part, vocabulary)))
    .map((part) => (isTicker(part.text, vocabulary) ? part : trimPunctuation(part)))
    .filter((part) => part.text !== '')
    .map((part) => createWord(part.text, part.start));
};
