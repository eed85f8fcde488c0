import { afterAll, expect, test } from 'vitest';
import { openDatabase } from '../../src/feed/internal/read/database.ts';
import { openFiles } from '../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../src/feed/priceFiles.ts';
import { type BadFeed, badFeeds } from '../fixtures/feeds/badFeeds.ts';
import { accepted, codesOf, longCsv, problemOf, temporaryFolder } from './settingsForTests.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);
const now = Date.UTC(2026, 11, 1, 12);

const open = async ({ file, content, settings, columns, format }: BadFeed) => {
  const base = longCsv(folder.write(file ?? 'prices.csv', content), settings);
  const whole = { ...base, columns: { ...base.columns, ...columns }, format: { ...base.format, ...format } };
  return openFiles(await listPriceFiles(base.path), whole, now, database);
};

test('the corpus is as large as was promised, and every name stands once', () => {
  expect(badFeeds.length).toBeGreaterThanOrEqual(60);
  expect(new Set(badFeeds.map(({ name }) => name)).size).toBe(badFeeds.length);
});

test.each(badFeeds.filter(({ refused }) => refused !== undefined))('$name is refused', async (feed) => {
  const problem = problemOf(await open(feed));
  const [code, ...words] = feed.refused ?? [];
  expect(problem.code).toBe(code);
  for (const part of words) expect(problem.message).toContain(part);
  expect(problem.message).toContain(folder.path(feed.file ?? 'prices.csv'));
});

test.each(badFeeds.filter(({ refused }) => refused === undefined))('$name is found', async (feed) => {
  const snapshot = accepted(await open(feed));
  expect(codesOf(snapshot)).toEqual(feed.codes);
  expect([...snapshot.quarantined.keys()]).toEqual(feed.heldBack ?? []);
  for (const reason of snapshot.quarantined.values()) expect(reason).toContain('is held back because');
  const flagged = snapshot.tickers.flatMap((ticker) => {
    const flags = snapshot.series(ticker)?.flags.map(({ code }) => code) ?? [];
    return flags.length > 0 ? [[ticker, flags] as const] : [];
  });
  expect(Object.fromEntries(flagged)).toEqual(feed.flagged ?? {});
});
