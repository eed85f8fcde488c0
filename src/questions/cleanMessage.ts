import type { Position } from '../terms/problem.ts';
import { removeFormattingMarks } from './internal/cleaning/formattingMarks.ts';
import { undoPlatformText } from './internal/cleaning/platformText.ts';

export type CleanMessage = {
  readonly text: string;
  /** Where a range of the cleaned text stands in the text as it was received. */
  readonly originalPosition: (position: Position) => Position;
};

const nothingToUndo = /^(?!\s*@)[\x20-\x7e\n]*$/;

/**
 * The text as it was typed, before a chat platform and a phone keyboard changed it: the mention at the head goes, links
 * become what they show, entities, typographic quotes, dashes and blanks become plain ones, invisible characters and
 * formatting marks go. Other mentions become one character each, which no reply shows. `ownId` is the bot's own
 * id on the platform. Example: `cleanMessage('<@U1> *interval* <http://KELP.ONE|KELP.ONE>').text.trim()` is `interval KELP.ONE`.
 */
export const cleanMessage = (text: string, ownId: string | null = null): CleanMessage => {
  if (nothingToUndo.test(text) && !/[<&*_~`]/.test(text))
    return { text, originalPosition: (position) => position };
  const cleaned = removeFormattingMarks(undoPlatformText(text, ownId));
  const { origins } = cleaned;
  const originOf = (index: number): number => origins[index] ?? text.length;
  return {
    text: cleaned.text,
    originalPosition: ({ start, end }) => ({
      start: originOf(start),
      end: end > start ? (origins[end - 1] ?? text.length - 1) + 1 : originOf(start),
    }),
  };
};
