import type { DuckDBDataChunk } from '@duckdb/node-api';
import { type Result, succeed } from '../../../terms/result.ts';
import type { FeedSettings } from '../../settings.ts';
import { numberSql, textSql, unreadTextSql } from './cellSql.ts';
import type { Collected, TickerExtras } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import { hasValue, rawInts, valueBits } from './rawVectors.ts';
import type { Source } from './source.ts';
import { doubles, texts } from './vectors.ts';

/** The optional columns of a long file: the SQL that reads them, and what is done with a chunk of them. */
export type ExtraColumns = {
  readonly sql: readonly string[];
  readonly read: (chunk: DuckDBDataChunk, tickerNumbers: Int32Array, firstRow: number) => void;
};

type Reader = (
  chunk: DuckDBDataChunk,
  column: number,
  extrasOf: (at: number) => TickerExtras | null,
  firstRow: number,
) => void;
type Part = { readonly sql: readonly string[]; readonly read: Reader };

const currencyPattern = /^[A-Z]{3}$/;

const currencyPart = (
  settings: FeedSettings,
  source: Source,
  path: string,
  collected: Collected,
): Result<Part | null> => {
  const name = settings.columns.currency;
  if (name === null) return succeed(null);
  const found = findColumns(path, source.columns, { currency: name }, 'feed.columns');
  if (!found.ok) return found;
  const read: Reader = (chunk, column, extrasOf, firstRow) => {
    const { rowCount } = chunk;
    const currencies = texts(chunk, column);
    for (let at = 0; at < rowCount; at += 1) {
      const extras = extrasOf(at);
      const currency = currencies.getItem(at);
      if (extras === null || currency === null || currency === extras.currency) continue;
      const example = { file: path, ticker: extras.ticker, row: firstRow + at, value: currency };
      if (!currencyPattern.test(currency)) collected.findings.record('unreadableCurrency', example);
      else if (extras.currency === null) extras.currency = currency;
      else collected.findings.record('mixedCurrencies', example);
    }
  };
  return succeed({ sql: [textSql(found.value.currency)], read });
};

const volumePart = (
  settings: FeedSettings,
  source: Source,
  path: string,
  collected: Collected,
): Result<Part | null> => {
  const name = settings.columns.volume;
  if (name === null) return succeed(null);
  const found = findColumns(path, source.columns, { volume: name }, 'feed.columns');
  if (!found.ok) return found;
  const number = numberSql(found.value.volume, settings.format.decimalMark);
  const read: Reader = (chunk, column, extrasOf, firstRow) => {
    const { rowCount } = chunk;
    const volumes = doubles(chunk, column);
    const unread = texts(chunk, column + 1);
    for (let at = 0; at < rowCount; at += 1) {
      const extras = extrasOf(at);
      if (extras === null) continue;
      const volume = volumes.getItem(at);
      const value = unread.getItem(at) ?? (volume !== null && volume >= 0 ? null : volume?.toString());
      if (typeof value === 'string') {
        collected.findings.record('unreadableVolume', {
          file: path,
          ticker: extras.ticker,
          row: firstRow + at,
          value,
        });
      } else if (volume === null || volume === 0) extras.daysWithoutVolume += 1;
    }
  };
  return succeed({ sql: [number, unreadTextSql(found.value.volume, number)], read });
};

/** Keeps each ticker's latest close, to be held against its latest adjusted close. */
const closePart = (
  settings: FeedSettings,
  source: Source,
  path: string,
  dayColumn: number,
): Result<Part | null> => {
  const { adjustedClose, close } = settings.columns;
  if (adjustedClose === null) return succeed(null);
  const found = findColumns(path, source.columns, { close }, 'feed.columns');
  if (!found.ok) return found;
  const read: Reader = (chunk, column, extrasOf) => {
    const { rowCount } = chunk;
    const days = rawInts(chunk, dayColumn);
    const dated = valueBits(chunk, dayColumn);
    const closes = doubles(chunk, column);
    for (let at = 0; at < rowCount; at += 1) {
      const extras = extrasOf(at);
      const day = days[at] as number;
      const value = closes.getItem(at);
      if (extras === null || !hasValue(dated, at) || value === null || day < extras.lastDay) continue;
      extras.lastDay = day;
      extras.lastClose = value;
    }
  };
  return succeed({ sql: [numberSql(found.value.close, settings.format.decimalMark)], read });
};

/** The optional columns that the settings name, from the place `firstColumn` of the query on; the day stands at `dayColumn`. */
export const makeExtras = (
  path: string,
  source: Source,
  settings: FeedSettings,
  collected: Collected,
  firstColumn: number,
  dayColumn: number,
): Result<ExtraColumns> => {
  const parts: Part[] = [];
  for (const part of [
    currencyPart(settings, source, path, collected),
    volumePart(settings, source, path, collected),
    closePart(settings, source, path, dayColumn),
  ]) {
    if (!part.ok) return part;
    if (part.value !== null) parts.push(part.value);
  }
  const read: ExtraColumns['read'] = (chunk, tickerNumbers, firstRow) => {
    let column = firstColumn;
    for (const part of parts) {
      part.read(chunk, column, (at) => collected.extrasOf(tickerNumbers[at] as number), firstRow);
      column += part.sql.length;
    }
  };
  return succeed({ sql: parts.flatMap(({ sql }) => sql), read });
};
