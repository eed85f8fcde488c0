import { createInterface } from 'node:readline';
import type { Terminal } from '../workspaces/terminal/start.ts';

const widthWithoutTerminal = 100;

/** A reader that stops reading (a pager, head) ends the conversation; it is no failure. */
const leaveQuietlyOnClosedPipe = (): void => {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(0);
    throw error;
  });
};

/** The terminal that this process runs in. */
export const thisTerminal = (): Terminal => {
  leaveQuietlyOnClosedPipe();
  return {
    lines: createInterface({ input: process.stdin, terminal: false, crlfDelay: Number.POSITIVE_INFINITY }),
    write: (text) => process.stdout.write(text),
    width: () => process.stdout.columns ?? widthWithoutTerminal,
    interactive: process.stdin.isTTY === true && process.stdout.isTTY === true,
  };
};
