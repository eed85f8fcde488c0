import { readArguments } from './arguments.ts';
import { exitCodes } from './exit.ts';
import { inspect } from './inspection.ts';

const usage = 'npm run --silent inspect -- [--config FILE] [--json] [FILE]';
const usualWidth = 100;

const main = async (): Promise<number> => {
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
