import { appendFileSync, readFileSync, writeFileSync } from 'node:fs';
import {
  type FirstDifference,
  firstDifference,
  readSession,
  recorded,
  typingAgain,
} from '../workspaces/terminal/session.ts';
import type { Terminal } from '../workspaces/terminal/start.ts';
import type { Arguments } from './arguments.ts';
import { exitCodes } from './exit.ts';

/** A conversation in a terminal; resolves when the person leaves it. */
type Sitting = (terminal: Terminal) => Promise<unknown>;

const say = (words: string): void => void process.stderr.write(`${words}\n`);

const refuse = (words: string): number => {
  say(words);
  return exitCodes.refused;
};

const reasonOf = (error: unknown): string => (error instanceof Error ? error.message : String(error));

/** An older session is never written over. */
const recordInto = async (path: string, terminal: Terminal, sit: Sitting): Promise<number> => {
  try {
    writeFileSync(path, '', { flag: 'wx' });
  } catch (error) {
    return refuse(`The session cannot be recorded: ${reasonOf(error)}. Name a file that is not there yet.`);
  }
  await sit(recorded(terminal, (line) => appendFileSync(path, `${line}\n`)));
  return exitCodes.answered;
};

const inWords = (path: string, { line, expected, came }: FirstDifference): string =>
  [
    `The session differs from ${path} ${line === null ? 'after its last line' : `from line ${line} on`}.`,
    `written: ${expected}`,
    `came:    ${came}`,
  ].join('\n');

const readOrReason = (path: string): { readonly text: string } | { readonly reason: string } => {
  try {
    return { text: readFileSync(path, 'utf8') };
  } catch (error) {
    return { reason: reasonOf(error) };
  }
};

const replayFrom = async (path: string, terminal: Terminal, sit: Sitting): Promise<number> => {
  const file = readOrReason(path);
  if ('reason' in file) return refuse(`The session cannot be read: ${file.reason}.`);
  const session = readSession(file.text);
  if (session === null) return refuse(`${path} is no recorded session. Record one with --record FILE.`);
  const noted: string[] = [];
  await sit(recorded(typingAgain(terminal, session), (line) => void noted.push(line)));
  const difference = firstDifference(session, noted);
  if (difference !== null) return refuse(inWords(path, difference));
  say(`The session comes out as it stands in ${path}.`);
  return exitCodes.answered;
};

/** Lets somebody sit at the terminal: as they are, with all of it written down, or with a session that types itself again. */
export const sitAt = async (
  terminal: Terminal,
  { record, replay }: Pick<Arguments, 'record' | 'replay'>,
  sit: Sitting,
): Promise<number> => {
  if (replay !== null) return replayFrom(replay, terminal, sit);
  if (record !== null) return recordInto(record, terminal, sit);
  await sit(terminal);
  return exitCodes.answered;
};
