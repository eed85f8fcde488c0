import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Settings } from '../../config/schema.ts';
import { connectPostgres } from '../../records/openPostgres.ts';
import { connectSqlite } from '../../records/openSqlite.ts';
import type { Clock } from '../../terms/clock.ts';
import type { Versions } from '../../terms/records.ts';
import { type Reopening, reopening, type TellTrouble } from './reopening.ts';

const project = fileURLToPath(new URL('../../../', import.meta.url));

export const recordsPath = ({ records }: Settings): string => resolve(project, records.path);

type OperatorLog = Readonly<Record<'info' | 'error', (message: string) => void>>;

const toldTo =
  ({ info, error }: OperatorLog): TellTrouble =>
  (trouble) =>
    trouble === null
      ? info('the store of records works again')
      : error(`the store of records fails, and what is asked meanwhile may not be kept: ${trouble.message}`);

/** The records of a desk, made where there are none. */
export const recordsToKeep = (settings: Settings, log?: OperatorLog): Reopening => {
  const { url } = settings.records;
  return reopening(
    () => (url === null ? connectSqlite(recordsPath(settings)) : connectPostgres(url.reveal())),
    log === undefined ? undefined : toldTo(log),
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

const hourMs = 3_600_000;
const dayMs = 24 * hourMs;
/** An event is sent again for an hour at the most, and a question can be edited to some effect for ten minutes. */
const inboxLifeMs = dayMs;
/** What was said can be marked as superseded for so long; then the records of answers are the place for it. */
const contentLifeMs = hourMs;
/** For so long no key is used again. */
const keyLifeMs = 400 * dayMs;

/** Deletes what is older than the settings allow, and what was dealt with long ago, now and every hour; the result ends it. */
export const keepTidy = (
  store: Reopening,
  { records: { keepDays } }: Settings,
  clock: Clock,
  tell: (message: string) => void,
): (() => void) => {
  const tidy = async () => {
    const nowMs = clock.nowMs();
    if (keepDays !== null) {
      const forgotten = await store.forgetBefore(nowMs - keepDays * dayMs);
      if (!forgotten.ok) tell(`Old records were not deleted: ${forgotten.problem.message}`);
    }
    // what these leave behind they take the next time
    await store.inbox.tidy(nowMs - inboxLifeMs);
    await store.deliveries.tidy(nowMs - contentLifeMs, nowMs - keyLifeMs);
  };
  void tidy();
  const timer = setInterval(() => void tidy(), hourMs);
  timer.unref();
  return () => clearInterval(timer);
};
