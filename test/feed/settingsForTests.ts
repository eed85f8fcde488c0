import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll } from 'vitest';
import type { OpenSnapshot } from '../../src/feed/openFeed.ts';
import type { FeedSettings } from '../../src/feed/settings.ts';
import type { Result } from '../../src/terms/result.ts';

/** The settings that a long CSV file with the plain names needs. */
export const longCsv = (path: string, more: Partial<FeedSettings> = {}): FeedSettings => ({
  path,
  shape: 'long',
  columns: {
    date: 'date',
    ticker: 'ticker',
    close: 'close',
    adjustedClose: null,
    volume: null,
    currency: null,
  },
  format: { delimiter: 'comma', decimalMark: 'point', dateFormat: 'YYYY-MM-DD' },
  holidays: { path: null, columns: { date: 'date', calendar: null } },
  prices: { priceAdjustment: 'unknown', currency: null, quoteUnit: null, closingTime: null, calendar: null },
  tickers: {},
  ...more,
});

export const head = 'date,ticker,close\n';
export const demoPath = new URL('../../config/demo-prices.csv', import.meta.url).pathname;

/** A folder of the test file's own, gone at its end. */
export const temporaryFolder = (): {
  path: (name: string) => string;
  write: (name: string, content: string | Uint8Array) => string;
} => {
  const folder = mkdtempSync(join(tmpdir(), 'feed-'));
  afterAll(() => rmSync(folder, { recursive: true }));
  const path = (name: string): string => join(folder, name);
  const write = (name: string, content: string | Uint8Array): string => {
    mkdirSync(dirname(path(name)), { recursive: true });
    writeFileSync(path(name), content);
    return path(name);
  };
  return { path, write };
};

export const accepted = <Value>(result: Result<Value>): Value => {
  if (!result.ok) throw new Error(result.problem.message);
  return result.value;
};

export const problemOf = (result: Result<unknown>): { code: string; message: string } => {
  if (result.ok) throw new Error('should have been refused');
  return result.problem;
};

/** Every finding's code, in the order of the list. */
export const codesOf = (snapshot: OpenSnapshot): readonly string[] =>
  snapshot.report.findings.map(({ code }) => code);

/** Every served price as text lines. */
export const pricesOf = (snapshot: OpenSnapshot): readonly string[] =>
  snapshot.tickers.flatMap((ticker) => {
    const series = snapshot.series(ticker);
    return series === null
      ? []
      : Array.from(series.days, (day, row) => `${ticker} ${day} ${series.closes[row]}`);
  });
