import type { MappedText } from './mappedText.ts';

const isMark = (character: string): boolean => character === '*' || character === '_' || character === '~';

const opensAfter = /[\s*_~("'[{,;>]/;
const closesBefore = /[\s*_~)"'\]},;.:!?]/;

/** A mark opens where a word begins behind it and nothing stands before it; it closes the other way round. */
const canOpen = (text: string, at: number): boolean =>
  (at === 0 || opensAfter.test(text.charAt(at - 1))) && /\S/.test(text.charAt(at + 1));

const canClose = (text: string, at: number): boolean =>
  at > 0 &&
  /\S/.test(text.charAt(at - 1)) &&
  (at + 1 === text.length || closesBefore.test(text.charAt(at + 1)));

/** Where a run of back-ticks at `at` ends, or the pair that a single one opens: what stands in a pair is left alone. */
const skipBackTicks = (text: string, at: number, remove: Set<number>): number => {
  let end = at;
  while (text.charAt(end) === '`') end += 1;
  if (end - at > 1) {
    for (let index = at; index < end; index += 1) remove.add(index);
    return end;
  }
  const closing = text.indexOf('`', end);
  return closing < 0 || text.slice(end, closing).includes('\n') ? end : closing + 1;
};

const marksToRemove = (text: string): ReadonlySet<number> => {
  const remove = new Set<number>();
  const open = new Map<string, number[]>();
  let at = 0;
  while (at < text.length) {
    const character = text.charAt(at);
    if (character === '`') {
      at = skipBackTicks(text, at, remove);
      continue;
    }
    if (character === '\n') open.clear();
    if (isMark(character)) {
      const opened = open.get(character) ?? [];
      open.set(character, opened);
      const partner = canClose(text, at) ? opened.pop() : undefined;
      if (partner !== undefined) remove.add(partner).add(at);
      else if (canOpen(text, at)) opened.push(at);
    }
    at += 1;
  }
  return remove;
};

/**
 * Takes bold, italic and struck marks off in pairs, and runs of back-ticks (code blocks). A single pair of back-ticks
 * stays: the question language writes a ticker in them that would otherwise be a word.
 */
export const removeFormattingMarks = (mapped: MappedText): MappedText => {
  if (!/[*_~`]/.test(mapped.text)) return mapped;
  const remove = marksToRemove(mapped.text);
  if (remove.size === 0) return mapped;
  const parts: string[] = [];
  let kept = 0;
  for (const at of [...remove].sort((first, second) => first - second)) {
    parts.push(mapped.text.slice(kept, at));
    kept = at + 1;
  }
  parts.push(mapped.text.slice(kept));
  return { text: parts.join(''), origins: mapped.origins.filter((_, index) => !remove.has(index)) };
};
