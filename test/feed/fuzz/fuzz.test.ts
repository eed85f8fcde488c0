import { afterAll, expect, test } from 'vitest';
import { openDatabase } from '../../../src/feed/internal/read/database.ts';
import { temporaryFolder } from '../settingsForTests.ts';
import { hugeLine, makeChance } from './edits.ts';
import { dayFirstDialect, fuzz, goodFile, isoDialect, readAndJudge } from './run.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

test('the good file is served', async () => {
  expect(await readAndJudge(goodFile(), isoDialect, folder.write, database)).toBe('served');
});

test('after 300 random edits: no crash, no price that the file does not state, none left out in silence', async () => {
  await fuzz(1, 300, isoDialect, folder.write, database);
});

test('a row of ten million bytes is refused', async () => {
  expect(await readAndJudge(hugeLine(goodFile(), makeChance(1)), isoDialect, folder.write, database)).toBe(
    'refused',
  );
});

test('the same with day before month, a decimal comma and semicolons', async () => {
  await fuzz(50_001, 100, dayFirstDialect, folder.write, database);
});
