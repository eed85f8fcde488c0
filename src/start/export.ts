import type { Settings } from '../config/schema.ts';
import { dayFromIso } from '../terms/day.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { type Arguments, readArguments } from './arguments.ts';
import { exitCodes } from './exit.ts';
import { exportRecords } from './records/exportRecords.ts';
import { recordsToRead } from './records/records.ts';
import { settingsFor } from './settings.ts';
import { leaveQuietlyOnClosedPipe } from './terminal.ts';
import { dayStartMs } from './today.ts';

const usage =
  'npm run --silent export -- [--config FILE] [--records FILE] [--ticker TICKER] [--since YYYY-MM-DD] [--csv]';

const refuseWith = (problems: readonly { readonly message: string }[]): number => {
  for (const { message } of problems) process.stderr.write(`${message}\n`);
  return exitCodes.refused;
};

const sinceMsOf = (since: string | null, { deskTimeZone }: Settings): Result<number | null> => {
  if (since === null) return succeed(null);
  const day = dayFromIso(since);
  return day === null
    ? refuse(problem('badDate', `“${since}” is no date. Write --since as in 2026-05-04.`))
    : succeed(dayStartMs(day, deskTimeZone));
};

const run = async (asked: Arguments): Promise<number> => {
  const reading = settingsFor(asked);
  if (!reading.ok) return refuseWith(reading.problems);
  const sinceMs = sinceMsOf(asked.since, reading.settings);
  if (!sinceMs.ok) return refuseWith([sinceMs.problem]);
  const store = recordsToRead(reading.settings);
  const filter = { ticker: asked.ticker, sinceMs: sinceMs.value };
  const done = await exportRecords(store, filter, asked.csv ? 'csv' : 'json', (line) =>
    process.stdout.write(`${line}\n`),
  );
  await store.close();
  return done.ok ? exitCodes.answered : refuseWith([done.problem]);
};

leaveQuietlyOnClosedPipe();
const asked = readArguments(process.argv.slice(2));
process.exitCode =
  'wrong' in asked ? refuseWith([{ message: `${asked.wrong}. Write ${usage}.` }]) : await run(asked);
