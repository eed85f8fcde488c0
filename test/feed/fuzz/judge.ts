import { expect } from 'vitest';
import type { OpenSnapshot } from '../../../src/feed/openFeed.ts';
import type { Result } from '../../../src/terms/result.ts';
import { type PlainFormat, plainReading } from './plainReading.ts';

const key = (ticker: string, day: number): string => `${ticker}|${day}`;

/**
 * Holds what the feed made of a file against the plain reading. Every served price must stand in the file just so, and
 * every row of the file must be served unless its ticker is held back. A file that the plain reading does not
 * understand must be refused.
 */
export const judge = (
  bytes: Buffer,
  format: PlainFormat,
  outcome: Result<OpenSnapshot>,
): 'refused' | 'served' => {
  if (!outcome.ok) {
    expect(outcome.problem.message).not.toMatch(/undefined|\[object/);
    return 'refused';
  }
  const snapshot = outcome.value;
  const rows = plainReading(bytes, format);
  if (rows === null) throw new Error('a file that cannot be read without doubt was served');
  const stated = new Map<string, Set<number | null>>();
  for (const { ticker, day, price } of rows) {
    if (ticker === '' || day === null) continue;
    const prices = stated.get(key(ticker, day)) ?? new Set();
    stated.set(key(ticker, day), prices.add(price));
  }
  let served = 0;
  for (const ticker of snapshot.tickers) {
    const series = snapshot.series(ticker);
    if (series === null) throw new Error(`${ticker} is listed and not served`);
    for (const [row, day] of series.days.entries()) {
      const close = series.closes[row] ?? Number.NaN;
      const prices = [...(stated.get(key(ticker, day)) ?? [])].filter((price) => price !== null);
      expect(prices, `${ticker} on day ${day}`).toEqual([close]);
      expect(close > 0 && Number.isFinite(close)).toBe(true);
      expect(row === 0 || day > (series.days[row - 1] ?? day)).toBe(true);
      served += 1;
    }
  }
  for (const { ticker, day, price } of rows) {
    if (ticker === '' || snapshot.quarantined.has(ticker)) continue;
    const days = snapshot.series(ticker)?.days;
    if (days === undefined) throw new Error(`${ticker} is in the file, not served and not held back`);
    if (price !== null)
      expect(day !== null && days.includes(day), `${ticker} has a row that is not served`).toBe(true);
  }
  const lastByte = bytes.at(-1);
  if (lastByte !== 0x0a && lastByte !== 0x0d) {
    const last = rows.at(-1)?.ticker ?? '';
    const flags = snapshot.series(last)?.flags.map(({ code }) => code) ?? [];
    expect(
      snapshot.quarantined.has(last) || rows.at(-1)?.price === null || flags.includes('unfinishedLine'),
    ).toBe(true);
  }
  expect(snapshot.report.priceCount).toBe(served);
  return 'served';
};
