import { afterAll, test } from 'vitest';
import { openDatabase } from '../../../src/feed/internal/read/database.ts';
import { temporaryFolder } from '../settingsForTests.ts';
import { rewriteWhileReading } from './rewrites.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

test('while a writer rewrites the file 200 times in every way, each answer comes from one whole snapshot', async () => {
  await rewriteWhileReading(folder.path('prices.csv'), 200, database);
});
