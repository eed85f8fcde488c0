import type { Reply } from '../reply.ts';

/** `and 12 more lines have no room here; …`: how much is missing and where all of it stands. */
export const restInWords = (count: number, singular: string, { whole }: Pick<Reply, 'whole'>): string => {
  const things = count === 1 ? `1 more ${singular} has` : `${count} more ${singular}s have`;
  return whole === null ? `${things} no room here.` : `${things} no room here; ${whole}.`;
};

/** Cut at a word, with an ellipsis. */
export const clipped = (text: string, room: number): string =>
  text.length <= room ? text : `${text.slice(0, Math.max(0, room - 1)).replace(/\s+\S*$/, '')}…`;

/** A text in pieces that each have room, parted at blanks where there are any. */
export const pieces = (text: string, room: number): readonly string[] => {
  const parts: string[] = [];
  let left = text;
  while (left.length > room) {
    const blank = left.lastIndexOf(' ', room);
    const end = blank > room / 2 ? blank : room;
    parts.push(left.slice(0, end));
    left = left.slice(end).trimStart();
  }
  return [...parts, left];
};

/** The first lines that fit into so many characters, with their line ends, and how many do not. */
export const firstLines = (
  lines: readonly string[],
  room: number,
): { readonly shown: readonly string[]; readonly restCount: number } => {
  let used = 0;
  let count = 0;
  for (const line of lines) {
    used += line.length + 1;
    if (used > room) break;
    count += 1;
  }
  return { shown: lines.slice(0, count), restCount: lines.length - count };
};

/** Lines that fit, and one that says how many do not. Room for that one is kept only where it is needed. */
export const cutLines = (
  lines: readonly string[],
  room: number,
  rest: (count: number) => string,
): readonly string[] => {
  const all = firstLines(lines, room);
  if (all.restCount === 0) return lines;
  const longestNote = rest(lines.length).length + 1;
  const { shown, restCount } = firstLines(lines, room - longestNote);
  return [...shown, rest(restCount)];
};

/** Lines gathered into as few texts of limited length as they fit in, at most so many texts. */
export const gathered = (lines: readonly string[], room: number): readonly string[] => {
  const texts: string[] = [];
  for (const line of lines.flatMap((each) => pieces(each, room))) {
    const last = texts.at(-1);
    if (last !== undefined && last.length + 1 + line.length <= room)
      texts[texts.length - 1] = `${last}\n${line}`;
    else texts.push(line);
  }
  return texts;
};
