import { limits } from '../../limits.ts';
import type { Word } from '../words/word.ts';

/**
 * A person's text as it may be repeated to them: without invisible and control characters, without anything that a
 * platform reads as a mark, a mention, a channel, an emoji name or a link, and not longer than the limit.
 */
export const safeText = (text: string): string => {
  const bare = text
    .replace(/[\p{C}\p{Zl}\p{Zp}\uFFFC]/gu, '')
    .replace(/[<>@#&|*_~`\\[\]"“”]/g, '')
    .replace(/:?\/{2,}|www\./gi, ' ')
    .replace(/:(?!\d)|(?<!\d):/g, '')
    .trim();
  const characters = Array.from(bare);
  return characters.length <= limits.shownCharacters
    ? bare
    : `${characters.slice(0, limits.shownCharacters - 1).join('')}…`;
};

const isMention = (word: Word): boolean => /^[@#\uFFFC]/.test(word.text);

const placeOf = (first: number, wordCount: number): string =>
  wordCount === 1 ? `word ${first + 1}` : `words ${first + 1} to ${first + wordCount}`;

/** `“over 10d” (words 3 to 4)`: words of the line and their place in it. Mentions are named, never shown. */
export const shownWords = (words: readonly Word[], first: number, wordCount: number): string => {
  const chosen = words.slice(first, first + wordCount);
  const place = placeOf(first, wordCount);
  if (chosen.every(isMention)) return `a mention (${place})`;
  const text = safeText(
    chosen
      .filter((word) => !isMention(word))
      .map((word) => word.text)
      .join(' '),
  );
  return text === '' ? `a sign (${place})` : `“${text}” (${place})`;
};

/** A message that begins with shown words begins like a sentence. */
export const asSentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}`;
