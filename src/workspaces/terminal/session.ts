import type { Terminal } from './start.ts';

/**
 * A conversation in the terminal, written down: a head with the width it was shown at, each typed line after `> `, each
 * line that was shown after two blanks. A person can read it, and it can be typed again by itself.
 */
const headOf = (width: number): string => `leadsman session 1, width ${width}`;

const headPattern = /^leadsman session 1, width (\d{1,4})$/;

const shownLines = (text: string): readonly string[] => text.replace(/\n$/, '').split('\n');

/** The same terminal, of which every typed and every shown line is noted, after the head. */
export const recorded = (terminal: Terminal, note: (line: string) => void): Terminal => {
  const width = terminal.width();
  note(headOf(width));
  return {
    ...terminal,
    // a session is shown at one width, so that it can be compared later
    width: () => width,
    nextLine: async (prompt) => {
      const typed = await terminal.nextLine(prompt);
      if (typed !== null) note(`> ${typed}`);
      return typed;
    },
    write: (text) => {
      for (const line of shownLines(text)) note(`  ${line}`);
      terminal.write(text);
    },
  };
};

/** One line of a session, with its number in the file. */
type Noted = { readonly number: number; readonly text: string };

export type Session = {
  readonly width: number;
  readonly typed: readonly string[];
  readonly lines: readonly Noted[];
};

/** A session that was written down; null where the file is none. */
export const readSession = (file: string): Session | null => {
  const [head = '', ...rest] = file.replace(/\r/g, '').replace(/\n$/, '').split('\n');
  const width = headPattern.exec(head)?.[1];
  if (width === undefined || rest.some((line) => !/^(>( |$)| {2}|$)/.test(line))) return null;
  const lines = rest.map((text, index) => ({ number: index + 2, text: text.trimEnd() }));
  const typed = rest.filter((line) => line.startsWith('>')).map((line) => line.slice(2));
  return { width: Number(width), typed, lines };
};

export type FirstDifference = {
  /** The line of the file; null where more was shown than is written there. */
  readonly line: number | null;
  readonly expected: string;
  readonly came: string;
};

const nothing = '(nothing)';

/** When something was asked is another time each time, and no difference. */
const withoutInstants = (line: string): string =>
  line.replace(/\b\d{4}-\d\d-\d\d \d\d:\d\d [A-Z][\w/+-]*/g, '(an instant)');

/** Where what was noted anew first differs from a session; null where it is the same. */
export const firstDifference = ({ lines }: Session, noted: readonly string[]): FirstDifference | null => {
  const [, ...again] = noted.map((line) => line.trimEnd());
  const count = Math.max(lines.length, again.length);
  for (let index = 0; index < count; index += 1) {
    const before = lines[index];
    const came = again[index];
    if (before === undefined || came === undefined || withoutInstants(before.text) !== withoutInstants(came))
      return { line: before?.number ?? null, expected: before?.text ?? nothing, came: came ?? nothing };
  }
  return null;
};

/** A terminal in which a session types itself. */
export const typingAgain = (terminal: Terminal, { width, typed }: Session): Terminal => {
  const left = [...typed];
  return {
    ...terminal,
    interactive: false,
    width: () => width,
    nextLine: async () => left.shift() ?? null,
  };
};
