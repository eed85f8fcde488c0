import { afterAll, test } from 'vitest';
import { openDatabase } from '../../../src/feed/internal/read/database.ts';
import { temporaryFolder } from '../settingsForTests.ts';
import { dayFirstDialect, fuzz, isoDialect } from './run.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

test('after 20,000 random edits: no crash, no price that the file does not state, none left out in silence', async () => {
  await fuzz(1001, 20_000, isoDialect, folder.write, database);
});

test('the same with day before month, a decimal comma and semicolons', async () => {
  await fuzz(50_001, 5_000, dayFirstDialect, folder.write, database);
});
