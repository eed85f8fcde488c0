import { existsSync } from 'node:fs';
import { expect, test } from 'vitest';
import { openFeed } from '../../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../../src/feed/priceFiles.ts';
import { openInThread } from '../../../src/feed/thread/openInThread.ts';
import {
  accepted,
  demoPath,
  head,
  longCsv,
  pricesOf,
  problemOf,
  temporaryFolder,
} from '../settingsForTests.ts';

const folder = temporaryFolder();
// a thread of Node runs JavaScript alone: the built program's file
const threadFile = new URL('../../../dist/feed/thread/readThread.js', import.meta.url);

test('the program has been built, as a thread needs it', () => {
  expect(existsSync(threadFile), 'run npm run build first').toBe(true);
});

test('a thread reads the same snapshot, report and holidays, in shared memory', async () => {
  const settings = longCsv(demoPath, {
    holidays: {
      path: folder.write('holidays.csv', 'date\n2026-12-25\n'),
      columns: { date: 'date', calendar: null },
    },
  });
  const nowMs = Date.UTC(2026, 11, 1);
  const here = accepted(await openFeed(settings, nowMs));
  const there = accepted(await openInThread(await listPriceFiles(demoPath), settings, nowMs, threadFile));
  expect(there.fingerprint).toBe(here.fingerprint);
  expect(pricesOf(there)).toEqual(pricesOf(here));
  expect(there.report).toEqual(here.report);
  expect(there.holidays).toEqual(here.holidays);
  expect(there.columns.closes.buffer).toBeInstanceOf(SharedArrayBuffer);
});

test('a thread refuses what would be refused here', async () => {
  const path = folder.write('prices.csv', `${head}2026-01-05,KELP\n`);
  const files = await listPriceFiles(path);
  const there = problemOf(await openInThread(files, longCsv(path), null, threadFile));
  expect(there).toEqual(problemOf(await openFeed(longCsv(path))));
});

test('a thread that ends before it is done is an error, not a refusal', async () => {
  const broken = new URL(`data:text/javascript,${encodeURIComponent('process.exit(3)')}`);
  await expect(openInThread([], longCsv('x'), null, broken)).rejects.toThrow('ended with code 3');
});
