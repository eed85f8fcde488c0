import type { Vocabulary } from '../../context.ts';

/** A part of the text with where it begins. */
export type Chunk = { readonly text: string; readonly start: number };

/** Commas separate, but not inside a number such as 1,000,000. */
export const splitAtCommas = (chunk: Chunk): readonly Chunk[] =>
  chunk.text.includes(',') ? splitBetween(chunk, /(?<!\d),|,(?!\d)/g) : [chunk];

const splitBetween = ({ text, start }: Chunk, separator: RegExp): readonly Chunk[] => {
  const chunks: Chunk[] = [];
  let from = 0;
  for (const match of text.matchAll(separator)) {
    chunks.push({ text: text.slice(from, match.index), start: start + from });
    from = match.index + match[0].length;
  }
  chunks.push({ text: text.slice(from), start: start + from });
  return chunks.filter((part) => part.text !== '');
};

/** Punctuation around a word goes, except the sign of a number and the point of `.5%`. */
export const trimPunctuation = ({ text, start }: Chunk): Chunk => {
  const begin = text.search(/[^.,:'-]|[.-](?=\.?\d)/);
  if (begin < 0) return { text: '', start };
  const end = text.slice(begin).replace(/[.,:'-]+$/, '').length + begin;
  return { text: text.slice(begin, end), start: start + begin };
};

const mostSlashes = 5;

/** `/` belongs to a ticker if the feed has it so, else it separates; dates and their intervals keep it too. */
export const splitAtSlashes = (chunk: Chunk, vocabulary: Vocabulary): readonly Chunk[] => {
  if (!chunk.text.includes('/') || /^[\d./-]+$/.test(chunk.text)) return [chunk];
  const parts = splitBetween(chunk, /\//g);
  return parts.length > mostSlashes + 1 ? [chunk] : joinTickers(parts, chunk, vocabulary);
};

const joinTickers = (parts: readonly Chunk[], whole: Chunk, vocabulary: Vocabulary): readonly Chunk[] => {
  const [head, ...rest] = parts;
  if (head === undefined) return [];
  for (let taken = rest.length; taken >= 1; taken -= 1) {
    const last = rest[taken - 1];
    if (last === undefined) continue;
    const text = whole.text.slice(head.start - whole.start, last.start + last.text.length - whole.start);
    if (vocabulary.canonicalTicker(text) !== null)
      return [{ text, start: head.start }, ...joinTickers(rest.slice(taken), whole, vocabulary)];
  }
  return [head, ...joinTickers(rest, whole, vocabulary)];
};
