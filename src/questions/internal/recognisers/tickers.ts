import { found, type Recogniser } from './recogniser.ts';

/** A ticker of the feed, in any case, also as `KELP's`. */
export const ticker: Recogniser = (line, at) => {
  const word = line.words[at];
  if (word === undefined) return null;
  const { canonicalTicker } = line.context.vocabulary;
  const named =
    canonicalTicker(word.text) ??
    (word.lower.endsWith("'s") ? canonicalTicker(word.text.slice(0, -2)) : null);
  return named === null ? null : found({ kind: 'ticker', ticker: named }, 1);
};
