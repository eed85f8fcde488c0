import { readArguments } from './arguments.ts';
import { exitCodes } from './exit.ts';
import { inspect } from './inspection.ts';

const usage = 'npm run --silent inspect -- [--config FILE] [--json] [FILE]';
const purpose =
  'Says what a price file holds, or what is wrong with it; without FILE, the feed of the settings. Exits 2 where it would be refused.';
const usualWidth = 100;

const main = async (): Promise<number> => {
  if (process.argv.includes('--help')) {
    process.stdout.write(`${purpose}\n${usage}\n`);
    return exitCodes.answered;
  }
  const asked = readArguments(process.argv.slice(2));
  if ('wrong' in asked) {
    process.stderr.write(`${asked.wrong}. Write ${usage}.\n`);
    return exitCodes.refused;
  }
  const { code, out, err } = await inspect(asked, { nowMs: Date.now }, process.stdout.columns ?? usualWidth);
  process.stdout.write(out);
  process.stderr.write(err);
  return code;
};

main().then(
  (code) => {
    process.exitCode = code;
  },
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exitCode = exitCodes.broken;
  },
);
