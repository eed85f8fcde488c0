import { createInterface } from 'node:readline';
import type { Terminal } from '../workspaces/terminal/start.ts';

const widthWithoutTerminal = 100;

/** The terminal that this process runs in. */
export const thisTerminal = (): Terminal => ({
  lines: createInterface({ input: process.stdin, terminal: false, crlfDelay: Number.POSITIVE_INFINITY }),
  write: (text) => process.stdout.write(text),
  width: () => process.stdout.columns ?? widthWithoutTerminal,
  interactive: process.stdin.isTTY === true && process.stdout.isTTY === true,
});
