import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Settings } from '../../config/schema.ts';
import { connectPostgres } from '../../records/openPostgres.ts';
import { connectSqlite } from '../../records/openSqlite.ts';
import type { Clock } from '../../terms/clock.ts';
import type { Versions } from '../../terms/records.ts';
import { type Reopening, reopening } from './reopening.ts';

const project = fileURLToPath(new URL('../../../', import.meta.url));

export const recordsPath = ({ records }: Settings): string => resolve(project, records.path);

/** The records of a desk, made where there are none. */
export const recordsToKeep = (settings: Settings): Reopening => {
  const { url } = settings.records;
  return reopening(() =>
    url === null ? connectSqlite(recordsPath(settings)) : connectPostgres(url.reveal()),
  );
};

/** The records of a desk for a command that only reads: where there is no file, none is made. */
export const recordsToRead = (settings: Settings): Reopening =>
  settings.records.url === null && !existsSync(recordsPath(settings))
    ? reopening(() => connectSqlite(null))
    : recordsToKeep(settings);

/** What answers here, as it is kept with every answer. */
export const versionsOf = (settings: Settings): Versions => {
  const { version: bot }: { version: string } = JSON.parse(readFileSync(`${project}package.json`, 'utf8'));
  return {
    bot,
    node: process.versions.node,
    settingsHash: createHash('sha256').update(JSON.stringify(settings)).digest('hex'),
  };
};

const dayMs = 86_400_000;

/** Deletes what is older than the settings allow, now and once a day; the result ends it. */
export const keepTidy = (
  store: Reopening,
  { records: { keepDays } }: Settings,
  clock: Clock,
  tell: (message: string) => void,
): (() => void) => {
  if (keepDays === null) return () => {};
  const tidy = async () => {
    const forgotten = await store.forgetBefore(clock.nowMs() - keepDays * dayMs);
    if (!forgotten.ok) tell(`Old records were not deleted: ${forgotten.problem.message}`);
  };
  void tidy();
  const timer = setInterval(() => void tidy(), dayMs);
  timer.unref();
  return () => clearInterval(timer);
};
