import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { openFeed } from '../../src/feed/openFeed.ts';
import type { FeedSettings } from '../../src/feed/settings.ts';
import { snapshotFromColumns } from '../../src/feed/snapshot.ts';
import { dayFromIso, isoFromDay } from '../../src/terms/day.ts';

const folder = mkdtempSync(join(tmpdir(), 'feed-'));
afterAll(() => rmSync(folder, { recursive: true }));

const settings = (path: string): FeedSettings => ({
  path,
  columns: { date: 'date', ticker: 'ticker', close: 'close' },
  prices: { priceAdjustment: 'unknown', currency: 'USD', quoteUnit: null, closingTime: null, calendar: null },
  tickers: { TARN: { currency: 'GBP', quoteUnit: 'pence' }, KELP: { currency: null } },
});

const open = (text: string) => {
  const path = join(folder, 'prices.csv');
  writeFileSync(path, text);
  return openFeed(settings(path));
};

const opened = async (text: string) => {
  const reading = await open(text);
  if (!reading.ok) throw new Error(reading.problem.message);
  return reading.value;
};

const head = 'date,ticker,close\n';
const demoPath = new URL('../../config/demo-prices.csv', import.meta.url).pathname;

test('the demonstration prices open, twelve tickers to 2026-11-27', async () => {
  const reading = await openFeed(settings(demoPath));
  if (!reading.ok) throw new Error(reading.problem.message);
  expect(reading.value.tickers).toHaveLength(12);
  expect(isoFromDay(reading.value.lastDay)).toBe('2026-11-27');
  // 785 weekdays from 2023-11-27 to 2026-11-27, both ends in
  expect(reading.value.series('KELP')?.closes).toHaveLength(785);
  expect(reading.value.series('PETREL')?.closes).toHaveLength(16);
  expect(reading.value.fingerprint).toMatch(/^[0-9a-f]{64}$/);
});

test('rows in any order are served by ticker and day, with what is known of each ticker', async () => {
  const snapshot = await opened(
    `${head}2026-01-06,TARN,5.5\n2026-01-06,KELP,2\n2026-01-05,TARN,5\n2026-01-05,KELP,1e0\n`,
  );
  expect(snapshot.tickers).toEqual(['KELP', 'TARN']);
  const kelp = snapshot.series('KELP');
  expect([...(kelp?.days ?? [])].map(isoFromDay)).toEqual(['2026-01-05', '2026-01-06']);
  expect([...(kelp?.closes ?? [])]).toEqual([1, 2]);
  expect(kelp?.meaning.currency).toBe(null);
  expect(snapshot.series('TARN')?.meaning).toEqual({
    priceAdjustment: 'unknown',
    currency: 'GBP',
    quoteUnit: 'pence',
    closingTime: null,
    calendar: null,
  });
  expect(snapshot.series('kelp')).toBe(null);
  expect(snapshot.series('')).toBe(null);
  expect(snapshot.lastDay).toBe(dayFromIso('2026-01-06'));
});

test('the fingerprint is that of the values, not of the file', async () => {
  const one = await opened(`${head}2026-01-05,KELP,1.50\n2026-01-05,TARN,2\n`);
  const same = await opened(`close,more,ticker,date\r\n2.0,x,TARN,2026-01-05\r\n"1.5",y,KELP,2026-01-05\r\n`);
  const other = await opened(`${head}2026-01-05,KELP,1.51\n2026-01-05,TARN,2\n`);
  expect(same.fingerprint).toBe(one.fingerprint);
  expect(other.fingerprint).not.toBe(one.fingerprint);
});

test('a snapshot made from columns that crossed to another thread serves the same', async () => {
  const snapshot = await opened(`${head}2026-01-05,KELP,1\n2026-01-06,KELP,2\n`);
  const again = snapshotFromColumns(structuredClone(snapshot.columns));
  expect(again.series('KELP')).toEqual(snapshot.series('KELP'));
  expect(again.columns.closes.buffer).toBeInstanceOf(SharedArrayBuffer);
});

test.each([
  ['', 'columnMissing', 'no column “date”'],
  ['date,ticker,price\n2026-01-05,KELP,1\n', 'columnMissing', 'no column “close”'],
  ['date,ticker,close,close\n2026-01-05,KELP,1,1\n', 'columnMissing', '“close” twice'],
  [head, 'fileEmpty', 'holds no price'],
  [`${head}2026-01-05,KELP,1\n2026-02-30,KELP,2\n`, 'valueUnreadable', 'column “date”, row 3: “2026-02-30”'],
  [`${head}05/01/2026,KELP,1\n`, 'valueUnreadable', 'row 2: “05/01/2026”'],
  [`${head}2026-01-05,KELP,1\n2026-01-06,,2\n`, 'valueUnreadable', 'column “ticker”, row 3'],
  [`${head}2026-01-05,KELP,n/a\n`, 'valueUnreadable', 'column “close”, row 2: “n/a”'],
  [`${head}2026-01-05,KELP,1_000\n`, 'valueUnreadable', '“1_000”'],
  [`${head}2026-01-05,KELP,0\n`, 'valueUnreadable', '“0” is not a price above zero'],
  [`${head}2026-01-05,KELP,-3\n`, 'valueUnreadable', '“-3”'],
  [`${head}2026-01-05,KELP,inf\n`, 'valueUnreadable', '“inf”'],
  [`${head}2026-01-05,KELP\n`, 'fileUnreadable', 'Line: 2'],
  [`${head}2026-01-05,KELP,1\n2026-01-05,KELP,2\n`, 'valueUnreadable', 'two prices for KELP on 2026-01-05'],
])('%j is refused by name', async (text, code, words) => {
  const reading = await open(text);
  expect(reading.ok ? null : reading.problem.code).toBe(code);
  expect(reading.ok ? '' : reading.problem.message).toContain(words);
  expect(reading.ok ? '' : reading.problem.message).toContain(join(folder, 'prices.csv'));
});

test('a file that is not there is refused by name', async () => {
  const reading = await openFeed(settings(join(folder, 'absent.csv')));
  expect(reading.ok ? null : reading.problem).toMatchObject({ code: 'fileUnreadable' });
});
