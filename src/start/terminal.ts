import { createInterface } from 'node:readline';
import type { Terminal } from '../workspaces/terminal/start.ts';
import { savePicture } from './pictures/save.ts';

const widthWithoutTerminal = 100;

/** A reader that stops reading (a pager, head) ends the conversation; it is no failure. */
export const leaveQuietlyOnClosedPipe = (): void => {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(0);
    throw error;
  });
};

/** Lines as they come, for piped input. */
const pipedLines = (): Terminal['nextLine'] => {
  const lines = createInterface({ input: process.stdin, crlfDelay: Number.POSITIVE_INFINITY })[
    Symbol.asyncIterator
  ]();
  return async () => {
    const { value, done } = await lines.next();
    return done === true ? null : value;
  };
};

/** A prompt with editing and history, for a person. */
const promptedLines = (): Terminal['nextLine'] => {
  const reader = createInterface({ input: process.stdin, output: process.stdout, terminal: true });
  const closed = new Promise<null>((resolve) => reader.once('close', () => resolve(null)));
  return (prompt) =>
    Promise.race([closed, new Promise<string>((resolve) => reader.question(prompt, resolve))]);
};

/** The terminal that this process runs in. */
export const thisTerminal = (): Terminal & { readonly close: () => void } => {
  leaveQuietlyOnClosedPipe();
  const interactive = process.stdin.isTTY === true && process.stdout.isTTY === true;
  return {
    nextLine: interactive ? promptedLines() : pipedLines(),
    write: (text) => process.stdout.write(text),
    hint: (text) => process.stdout.write(text),
    savePicture: (picture) => savePicture(picture),
    width: () => process.stdout.columns ?? widthWithoutTerminal,
    interactive,
    close: () => process.stdin.destroy(),
  };
};
