import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { type Arguments, readArguments } from './arguments.ts';
import { exitCodes } from './exit.ts';
import { recordsPath, recordsToRead } from './records/records.ts';
import { settingsFor } from './settings.ts';

const usage = 'npm run --silent backup -- [--config FILE] [--records FILE] COPY';

const refuseWith = (problems: readonly { readonly message: string }[]): number => {
  for (const { message } of problems) process.stderr.write(`${message}\n`);
  return exitCodes.refused;
};

/** Copies the records whole, also while the bot is running. */
const run = async (asked: Arguments): Promise<number> => {
  const [copy, more] = asked.words;
  if (copy === undefined || more !== undefined)
    return refuseWith([{ message: `Name the one file to copy the records to. Write ${usage}.` }]);
  const reading = settingsFor(asked);
  if (!reading.ok) return refuseWith(reading.problems);
  if (reading.settings.records.url !== null)
    return refuseWith([
      {
        message:
          'The records are in PostgreSQL, which has its own way to be copied. Run pg_dump --format=custom --file=COPY on that database.',
      },
    ]);
  const [path, own] = [resolve(copy), recordsPath(reading.settings)];
  if (!existsSync(own))
    return refuseWith([{ message: `There are no records at ${own}. Set records.path or say --records.` }]);
  if (path === own)
    return refuseWith([{ message: `${path} is the file of the records itself. Name another.` }]);
  const store = recordsToRead(reading.settings);
  const done = await store.backUp(path);
  await store.close();
  if (!done.ok) return refuseWith([done.problem]);
  process.stdout.write(`The records were copied to ${path}.\n`);
  return exitCodes.answered;
};

const asked = readArguments(process.argv.slice(2));
process.exitCode =
  'wrong' in asked ? refuseWith([{ message: `${asked.wrong}. Write ${usage}.` }]) : await run(asked);
