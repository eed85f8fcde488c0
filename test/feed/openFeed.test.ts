import { expect, test } from 'vitest';
import { openFeed } from '../../src/feed/openFeed.ts';
import { snapshotFromColumns } from '../../src/feed/snapshot.ts';
import { dayFromIso, isoFromDay } from '../../src/terms/day.ts';
import {
  accepted,
  codesOf,
  demoPath,
  head,
  longCsv,
  problemOf,
  temporaryFolder,
} from './settingsForTests.ts';

const folder = temporaryFolder();

const tickers = { TARN: { currency: 'GBP', quoteUnit: 'pence' }, KELP: { currency: null } };
const prices = { ...longCsv('').prices, currency: 'USD' };

const open = (text: string) => openFeed(longCsv(folder.write('prices.csv', text), { tickers, prices }));
const opened = async (text: string) => accepted(await open(text));

test('the demonstration prices open clean, twelve tickers to 2026-11-27', async () => {
  const snapshot = accepted(await openFeed(longCsv(demoPath), Date.UTC(2026, 11, 1)));
  expect(snapshot.tickers).toHaveLength(12);
  expect(isoFromDay(snapshot.lastDay)).toBe('2026-11-27');
  // 785 weekdays from 2023-11-27 to 2026-11-27, both ends in
  expect(snapshot.series('KELP')?.closes).toHaveLength(785);
  expect(snapshot.series('PETREL')?.closes).toHaveLength(16);
  expect(snapshot.fingerprint).toMatch(/^[0-9a-f]{64}$/);
  expect(snapshot.report.findings).toEqual([]);
  expect(snapshot.report.tickers.every(({ state }) => state === 'clean')).toBe(true);
  expect(snapshot.report).toMatchObject({ priceCount: 11 * 785 + 16, lastDay: snapshot.lastDay });
  expect(snapshot.report.files).toEqual([
    { path: demoPath, kind: 'csv', bytes: expect.any(Number), rowCount: 8651 },
  ]);
});

test('rows in any order are served by ticker and day, with what is known of each ticker', async () => {
  const snapshot = await opened(
    `${head}2026-01-06,TARN,5.5\n2026-01-06,KELP,2\n2026-01-05,TARN,5\n2026-01-05,KELP,1.5e0\n`,
  );
  expect(snapshot.tickers).toEqual(['KELP', 'TARN']);
  const kelp = snapshot.series('KELP');
  expect([...(kelp?.days ?? [])].map(isoFromDay)).toEqual(['2026-01-05', '2026-01-06']);
  expect([...(kelp?.closes ?? [])]).toEqual([1.5, 2]);
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
  expect(codesOf(snapshot)).toEqual(['daysOutOfOrder']);
});

test('the fingerprint is that of the values, not of the file', async () => {
  const one = await opened(`${head}2026-01-05,KELP,1.50\n2026-01-05,TARN,2\n`);
  const same = await opened(`close,more,ticker,date\r\n2.0,x,TARN,2026-01-05\r\n"1.5",y,KELP,2026-01-05\r\n`);
  const other = await opened(`${head}2026-01-05,KELP,1.51\n2026-01-05,TARN,2\n`);
  expect(same.fingerprint).toBe(one.fingerprint);
  expect(other.fingerprint).not.toBe(one.fingerprint);
});

test('a snapshot made from columns that crossed to another thread serves the same from shared memory', async () => {
  const snapshot = await opened(`${head}2026-01-05,KELP,1\n2026-01-06,KELP,2\n2026-01-05,TARN,-1\n`);
  const again = snapshotFromColumns(structuredClone(snapshot.columns));
  expect(again.series('KELP')).toEqual(snapshot.series('KELP'));
  expect(again.quarantined).toEqual(snapshot.quarantined);
  expect(again.columns.closes.buffer).toBeInstanceOf(SharedArrayBuffer);
  expect(again.columns.days.buffer).toBeInstanceOf(SharedArrayBuffer);
});

test('a ticker that contradicts itself is held back by name with the reason, the others are served', async () => {
  const snapshot = await opened(`${head}2026-01-05,KELP,1\n2026-01-05,KELP,2\n2026-01-05,TARN,5\n`);
  expect(snapshot.tickers).toEqual(['TARN']);
  expect(snapshot.series('KELP')).toBe(null);
  expect(snapshot.quarantined.get('KELP')).toContain(
    'two different prices for one day: 2026-01-05, “1 and 2”',
  );
  expect(snapshot.report.tickers.map(({ ticker, state }) => `${ticker} ${state}`)).toEqual([
    'KELP quarantined',
    'TARN clean',
  ]);
});

test('dates in the future are found against the present instant, allowing for the latest zone on earth', async () => {
  const path = folder.write('future.csv', `${head}2026-01-05,KELP,1\n2026-01-06,TARN,1\n`);
  // 2026-01-06 begins at 2026-01-05T10:00Z where the clock is furthest ahead (UTC+14)
  const before = accepted(await openFeed(longCsv(path), Date.UTC(2026, 0, 5, 9, 59)));
  const after = accepted(await openFeed(longCsv(path), Date.UTC(2026, 0, 5, 10, 0)));
  expect([...before.quarantined.keys()]).toEqual(['TARN']);
  expect(before.lastDay).toBe(dayFromIso('2026-01-05'));
  expect([...after.quarantined.keys()]).toEqual([]);
});

test('a file that is not there is refused by name', async () => {
  const problem = problemOf(await openFeed(longCsv(folder.path('absent.csv'))));
  expect(problem.code).toBe('fileUnreadable');
  expect(problem.message).toContain(folder.path('absent.csv'));
});
