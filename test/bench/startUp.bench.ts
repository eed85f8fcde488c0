import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { bench, describe } from 'vitest';
import { openSqlite } from '../../src/records/openSqlite.ts';
import { accepted } from '../laws/outcomes.ts';
import { answerOf, askingAt } from '../records/madeRecords.ts';

const recordCount = 100_000;
const once = { iterations: 10, time: 0, warmupIterations: 1, warmupTime: 0 };

const newPath = (): string => join(mkdtempSync(join(tmpdir(), 'leadsman-start-')), 'records.db');

const withOneRecord = async (): Promise<string> => {
  const path = newPath();
  const store = accepted(await openSqlite(path));
  accepted(await store.keep(answerOf('R-A'), askingAt(1)));
  await store.close();
  return path;
};

/** The rows of one kept answer and its asking, many times over; what is looked at on the way in is not their content. */
const withManyRecords = async (): Promise<string> => {
  const path = await withOneRecord();
  const database = new Database(path);
  database.pragma('foreign_keys = OFF');
  const numbers = `WITH RECURSIVE n(i) AS (SELECT 3 UNION ALL SELECT i + 1 FROM n WHERE i < ${recordCount + 2})`;
  database.exec(`
    INSERT INTO answers ${numbers} SELECT 'R-' || i, i, content, verb, question, as_of, method_version, body FROM n, answers;
    INSERT INTO answer_ids ${numbers} SELECT 'R-' || i, 'R-' || i, 0 FROM n;
    INSERT INTO answer_series ${numbers} SELECT 'R-' || i, 0, ticker, prices, about FROM n, answer_series;
    INSERT INTO askings ${numbers} SELECT i, 'R-' || i, i, place, team, channel, person, message, thread, words, reply_text,
      bot_version, node_version, settings_hash FROM n, askings;
    INSERT INTO chain ${numbers} SELECT i, kind, subject, digest, previous, hash FROM n, chain WHERE number = 1;`);
  database.close();
  return path;
};

const openAndUse = async (path: string): Promise<void> => {
  const store = accepted(await openSqlite(path));
  accepted(await store.list({ ticker: null, sinceMs: null }, 10));
  accepted(await store.inbox.takeOver({ holder: 'bench', untilMs: 2 }, 1, [], 200));
  accepted(await store.deliveries.takeOver({ holder: 'bench', untilMs: 2 }, 1, [], 200));
  await store.close();
};

const few = await withOneRecord();
const many = await withManyRecords();

// Goal: with 100,000 records under 1 s more than with next to none.
describe('opening the records and the first look at them', () => {
  bench('one record', () => openAndUse(few), once);
  bench('100,000 records (goal: under 1 s more)', () => openAndUse(many), once);
});
