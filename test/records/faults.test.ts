import { closeSync, mkdtempSync, openSync, rmSync, statSync, writeSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { sql } from 'kysely';
import { afterAll, describe, expect, test } from 'vitest';
import { connectSqlite } from '../../src/records/openSqlite.ts';
import { healthOf } from '../../src/start/heartbeat.ts';
import { reopening } from '../../src/start/records/reopening.ts';
import { stateOf } from '../../src/start/storeState.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';
import { answerOf, askingAt } from './madeRecords.ts';

const folder = mkdtempSync(join(tmpdir(), 'leadsman-faults-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let files = 0;
const newPath = (): string => {
  files += 1;
  return join(folder, `records-${files}.db`);
};

/** A store as the bot holds it, with one answer on record, and what its operator was told. */
const running = async (path: string) => {
  const told: string[] = [];
  const store = reopening(
    () => connectSqlite(path),
    (trouble) => told.push(trouble === null ? 'works again' : trouble.message),
  );
  accepted(await store.keep(answerOf('R-A'), askingAt(1)));
  return { store, told };
};

const healthBeside = (store: Awaited<ReturnType<typeof running>>['store']) =>
  healthOf({ beatMs: 0, state: stateOf(store) }, 1_000);

const connectWithoutRoom = async (path: string) => {
  const connected = await connectSqlite(path);
  if (connected.ok) await sql`pragma max_page_count = 1`.execute(connected.value.db);
  return connected;
};

const event = {
  key: 'E1',
  messageKey: 'M1',
  kind: 'question',
  askedAtMs: 5,
  body: JSON.stringify({ text: 'x'.repeat(100_000) }),
} as const;
const lease = { holder: 'ann', untilMs: 100 };

describe('a full disk', () => {
  test('is said to the operator and in the health state, and nothing confirmed is lost', async () => {
    const path = newPath();
    const { store, told } = await running(path);
    await store.close();
    // the file may not grow any more, whoever writes to it: SQLite then says that the disk is full
    const full = reopening(
      () => connectWithoutRoom(path),
      (trouble) => told.push(trouble === null ? 'works again' : trouble.message),
    );
    expect(refusalCode(await full.inbox.keep(event, lease, 10))).toBe('storeUnavailable');
    expect(told).toEqual([expect.stringContaining('full')]);
    expect(healthBeside(full)).toMatchObject({ healthy: true, text: expect.stringContaining('full') });
    expect(accepted(await full.find('R-A'))?.askings).toHaveLength(1);
    await full.close();
    const after = reopening(() => connectSqlite(path));
    expect(accepted(await after.verify())).toMatchObject({ answers: 1, askings: 1, faults: [] });
    accepted(await after.inbox.keep(event, lease, 10));
    await after.close();
  });
});

describe('a database that may only be read', () => {
  test('is read, refuses to keep, and says so', async () => {
    const path = newPath();
    await (await running(path)).store.close();
    const copy = new Database(path);
    copy.pragma('journal_mode = DELETE');
    copy.close();
    // write version 3 in the header: by its file format SQLite then only reads
    const file = openSync(path, 'r+');
    writeSync(file, Uint8Array.of(3), 0, 1, 18);
    closeSync(file);
    const told: string[] = [];
    const store = reopening(
      () => connectSqlite(path),
      (trouble) => told.push(trouble?.message ?? 'works again'),
    );
    expect(refusalCode(await store.inbox.keep(event, lease, 10))).toBe('storeUnavailable');
    expect(told.join()).toMatch(/readonly|read-only/);
    expect(healthBeside(store).text).toMatch(/not kept.*(readonly|read-only)/);
    await store.close();
  });
});

describe('a file that is damaged while the bot runs', () => {
  test('is said to the operator, and nothing is said to be kept', async () => {
    const path = newPath();
    const { store, told } = await running(path);
    const folded = new Database(path);
    folded.pragma('wal_checkpoint(TRUNCATE)');
    folded.close();
    const file = openSync(path, 'r+');
    writeSync(file, Buffer.alloc(statSync(path).size - 100, 0xa5), 0, statSync(path).size - 100, 100);
    closeSync(file);
    await store.close();
    expect(refusalCode(await store.inbox.keep(event, lease, 10))).toBe('storeUnavailable');
    expect(told).toEqual([expect.stringMatching(/malformed|not a database|corrupt/)]);
    expect(healthBeside(store).text).toContain('not kept');
    await store.close();
  });
});
