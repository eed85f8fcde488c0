import { mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, describe, expect, test } from 'vitest';
import { openSqlite } from '../../src/records/openSqlite.ts';
import { deliveriesContract } from '../contracts/deliveries.contract.ts';
import { inboxContract } from '../contracts/inbox.contract.ts';
import { storeContract } from '../contracts/store.contract.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';
import { answerOf, askingAt } from './madeRecords.ts';

const folder = mkdtempSync(join(tmpdir(), 'leadsman-records-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let files = 0;
const newPath = (): string => {
  files += 1;
  return join(folder, `below-${files}`, 'records.db');
};

const inMemory = async () => accepted(await openSqlite(null));
storeContract('in memory', inMemory);
storeContract('in a file', async () => accepted(await openSqlite(newPath())));
inboxContract('in memory', inMemory);
deliveriesContract('in memory', inMemory);

/** A file with two answers, one of them asked twice. */
const filled = async (): Promise<string> => {
  const path = newPath();
  const store = accepted(await openSqlite(path));
  accepted(await store.keep(answerOf('R-A'), askingAt(10)));
  accepted(await store.keep(answerOf('R-B'), askingAt(20)));
  accepted(await store.keep(answerOf('R-A'), askingAt(30)));
  await store.close();
  return path;
};

const examined = async (path: string) => {
  const store = accepted(await openSqlite(path));
  const found = accepted(await store.verify());
  await store.close();
  return found;
};

describe('a file of records', () => {
  test('is found as it was left, and is for its owner alone', async () => {
    const path = await filled();
    expect(await examined(path)).toMatchObject({ answers: 2, askings: 3, faults: [] });
    expect(statSync(path).mode & 0o077).toBe(0);
  });

  test('keeps what was kept when the process ends without a word', async () => {
    const path = newPath();
    const store = accepted(await openSqlite(path));
    accepted(await store.keep(answerOf('R-A'), askingAt(10)));
    // the file as a crash at this instant would leave it: not closed, its log not folded in
    const crashed = newPath();
    await accepted(await openSqlite(crashed)).close();
    for (const ending of ['', '-wal']) writeFileSync(`${crashed}${ending}`, readFileSync(`${path}${ending}`));
    expect(await examined(crashed)).toMatchObject({ answers: 1, askings: 1, faults: [] });
    await store.close();
  });

  test.each([
    [
      'a figure is changed',
      "UPDATE answers SET body = '{}' WHERE id = 'R-A'",
      /answer R-A is not what was kept/,
    ],
    [
      'words are changed',
      "UPDATE askings SET words = 'no' WHERE asked_at_ms = 20",
      /R-B was asked\) is not what/,
    ],
    [
      'an instant is changed',
      'UPDATE askings SET asked_at_ms = 21 WHERE asked_at_ms = 20',
      /is not what was kept/,
    ],
    [
      'prices are changed',
      "UPDATE price_columns SET packed = x'00'",
      /Prices of KELP .* are not what was kept/,
    ],
    ['the meaning of prices is changed', "UPDATE answer_series SET about = '{}'", /answer R-A is not what/],
    ['an id is added', "INSERT INTO answer_ids VALUES ('R-Z', 'R-A', 1)", /answer R-A is not what was kept/],
    ['an asking is taken out', 'DELETE FROM askings WHERE asked_at_ms = 30', /gone without a trace/],
    ['an entry is taken out', 'DELETE FROM chain WHERE number = 2', /chain is broken at entry 3/],
    ['an entry is changed', "UPDATE chain SET digest = 'ab' WHERE number = 2", /chain is broken at entry 2/],
    [
      'the end is cut off',
      'DELETE FROM askings WHERE number = 5; DELETE FROM chain WHERE number = 5',
      /ends at entry 4, and 5 were written/,
    ],
    [
      'a row is slipped in',
      'INSERT INTO askings SELECT 9, answer_id, 5, place, team, channel, person, message, thread, words, reply_text, bot_version, node_version, settings_hash FROM askings LIMIT 1',
      /entry 9 of askings is not in the chain/,
    ],
  ])('is found not to be whole where %s', async (_name, change, fault) => {
    const path = await filled();
    const tampering = new Database(path);
    tampering.exec(change);
    tampering.close();
    expect((await examined(path)).faults.join('\n')).toMatch(fault);
  });

  test.each([
    ...['content', 'verb', 'question', 'as_of', 'method_version', 'body'].map((column) => [
      'answers',
      column,
    ]),
    ...['asked_at_ms', 'place', 'team', 'channel', 'person', 'message', 'thread', 'words', 'reply_text'].map(
      (column) => ['askings', column],
    ),
    ...['bot_version', 'node_version', 'settings_hash', 'answer_id'].map((column) => ['askings', column]),
    ...['kind', 'subject', 'digest', 'previous', 'hash'].map((column) => ['chain', column]),
    ...['length', 'hash'].map((column) => ['chain_head', column]),
  ])('is found not to be whole where in %s the %s is another', async (table, column) => {
    const path = await filled();
    const tampering = new Database(path);
    tampering.pragma('foreign_keys = OFF');
    tampering.exec(`UPDATE ${table} SET ${column} = 77 WHERE rowid = (SELECT min(rowid) FROM ${table})`);
    tampering.close();
    expect((await examined(path)).faults).not.toEqual([]);
  });

  test('is copied whole while it is open', async () => {
    const path = await filled();
    const store = accepted(await openSqlite(path));
    const copy = join(folder, 'copy.db');
    accepted(await store.backUp(copy));
    const { head } = accepted(await store.verify());
    await store.close();
    expect(await examined(copy)).toMatchObject({ answers: 2, askings: 3, head, faults: [] });
    expect(statSync(copy).mode & 0o077).toBe(0);
  });

  test('is not copied over a good copy where the copy cannot be finished', async () => {
    const store = accepted(await openSqlite(await filled()));
    const copy = join(folder, 'good-copy.db');
    writeFileSync(copy, 'the copy of yesterday');
    mkdirSync(`${copy}.new`);
    expect(refusalCode(await store.backUp(copy))).toBe('storeUnavailable');
    expect(readFileSync(copy, 'utf8')).toBe('the copy of yesterday');
    await store.close();
  });

  test('goes on where an interrupted start left the tables', async () => {
    const path = newPath();
    await accepted(await openSqlite(path)).close();
    const tampering = new Database(path);
    // as if the process had ended after the list of versions was made and before the first migration was
    tampering.pragma('foreign_keys = OFF');
    const tables = tampering
      .prepare("SELECT name FROM sqlite_master WHERE type = 'table' AND name <> 'schema_versions'")
      .pluck()
      .all();
    expect(tables.length).toBeGreaterThan(7);
    for (const table of tables) tampering.exec(`DROP TABLE ${String(table)}`);
    tampering.exec('DELETE FROM schema_versions');
    tampering.close();
    expect(await examined(path)).toMatchObject({ answers: 0, askings: 0, faults: [] });
  });

  test('is refused where a newer version of the program has made it over', async () => {
    const path = await filled();
    const newer = new Database(path);
    newer.exec('INSERT INTO schema_versions VALUES (99)');
    newer.close();
    const refused = await openSqlite(path);
    expect(refusalCode(refused)).toBe('storeUnavailable');
    expect(refused.ok ? '' : refused.problem.message).toContain('version 99');
  });

  test('is refused where it is no store, and left as it is', async () => {
    const path = join(folder, 'letter.db');
    writeFileSync(path, 'Dear Sir, this is no database at all.'.repeat(40));
    expect(refusalCode(await openSqlite(path))).toBe('storeUnavailable');
    expect(readFileSync(path, 'utf8')).toContain('Dear Sir');
  });

  test('is refused where its folder cannot be', async () => {
    const path = join(folder, 'a-file');
    writeFileSync(path, '');
    expect(refusalCode(await openSqlite(join(path, 'records.db')))).toBe('storeUnavailable');
  });

  test('locked by another process it refuses soon, and keeps again afterwards', async () => {
    const path = await filled();
    const store = accepted(await openSqlite(path));
    const other = new Database(path);
    other.exec('BEGIN IMMEDIATE');
    expect(refusalCode(await store.keep(answerOf('R-C'), askingAt(40)))).toBe('storeUnavailable');
    expect(accepted(await store.find('R-A'))?.answer.ids).toEqual(['R-A']);
    other.exec('ROLLBACK');
    accepted(await store.keep(answerOf('R-C'), askingAt(40)));
    other.close();
    await store.close();
  });

  test('that cannot be written to the end, as on a full disk, loses nothing of what it has', async () => {
    const path = await filled();
    const full = new Database(path);
    full.exec(
      "CREATE TRIGGER full BEFORE INSERT ON askings BEGIN SELECT RAISE(FAIL, 'database or disk is full'); END",
    );
    const store = accepted(await openSqlite(path));
    const refused = await store.keep(answerOf('R-C'), askingAt(40));
    expect(refused.ok ? '' : refused.problem.message).toContain('disk is full');
    expect(accepted(await store.find('R-C'))).toBe(null);
    expect(accepted(await store.verify())).toMatchObject({ answers: 2, askings: 3, faults: [] });
    full.exec('DROP TRIGGER full');
    full.close();
    accepted(await store.keep(answerOf('R-C'), askingAt(40)));
    await store.close();
  });
});
