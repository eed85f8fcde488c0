import type { DuckDBConnection, DuckDBDataChunk } from '@duckdb/node-api';
import { type Problem, problem } from '../../../terms/problem.ts';
import type { FeedSettings } from '../../settings.ts';
import { daySql, numberSql, type SourceColumn, unreadTextSql } from './cellSql.ts';
import { type Collected, isTickerName } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import type { FileReading } from './longRows.ts';
import { isPrice, recordNoPrice } from './priceCell.ts';
import type { Source } from './source.ts';
import { chunksOf, doubles, integers, texts } from './vectors.ts';

/** Why the names of the ticker columns cannot stand; null where they can. */
const wrongNames = (path: string, columns: readonly SourceColumn[]): Problem | null => {
  const place = columns.findIndex(({ name }) => name === '' || !isTickerName(name));
  if (place >= 0) {
    const message = `${path}: column ${place + 2} has “${columns[place]?.name.slice(0, 60)}” for a name, which is not the name of a ticker. Name every column in the first row.`;
    return problem('columnMissing', message);
  }
  const names = columns.map(({ name }) => name);
  const twice = names.find((name, at) => names.indexOf(name) !== at);
  if (twice !== undefined) {
    return problem('columnMissing', `${path} names the column “${twice}” twice. Keep one of the two.`);
  }
  return columns.length > 0
    ? null
    : problem('columnMissing', `${path} has no column beside the date. Add one column per ticker.`);
};

const querySql = (
  settings: FeedSettings,
  date: SourceColumn,
  tickers: readonly SourceColumn[],
  from: string,
): string => {
  const day = daySql(date, settings.format);
  const cells = tickers.flatMap((column) => {
    const number = numberSql(column, settings.format.decimalMark);
    return [number, unreadTextSql(column, number)];
  });
  return `SELECT ${[day, unreadTextSql(date, day), ...cells].join(', ')} FROM ${from}`;
};

type Rows = { readonly days: readonly (number | null)[]; readonly firstRow: number; readonly file: string };

/** Adds a column's prices; the first row that has a cell in it but no date, or the number of rows where none has. */
const readColumn = (
  chunk: DuckDBDataChunk,
  column: number,
  tickerNumber: number,
  rows: Rows,
  collected: Collected,
): number => {
  const { days, firstRow, file } = rows;
  const prices = doubles(chunk, column);
  const unread = texts(chunk, column + 1);
  const ticker = collected.names[tickerNumber] ?? null;
  let firstUndated = chunk.rowCount;
  for (let at = 0; at < chunk.rowCount; at += 1) {
    const day = days[at] ?? null;
    const price = prices.getItem(at);
    if (day !== null && isPrice(price)) {
      collected.add(tickerNumber, day, price);
      continue;
    }
    const text = price === null ? unread.getItem(at) : null;
    if (day !== null)
      recordNoPrice(collected.findings, { file, ticker, day, row: firstRow + at }, price, text);
    else if (price !== null || text !== null) firstUndated = Math.min(firstUndated, at);
  }
  return firstUndated;
};

/** Reads a chunk; the problem with the first row whose date cannot be read, null where every row has one or is blank. */
const readChunk = (
  chunk: DuckDBDataChunk,
  numbers: readonly number[],
  file: string,
  firstRow: number,
  settings: FeedSettings,
  collected: Collected,
): Problem | null => {
  const dates = integers(chunk, 0);
  const unreadDates = texts(chunk, 1);
  const days = Array.from({ length: chunk.rowCount }, (_, at) => dates.getItem(at));
  const undated = numbers.map((number, at) =>
    readColumn(chunk, 2 + 2 * at, number, { days, firstRow, file }, collected),
  );
  const wrongDate = days.findIndex((day, at) => day === null && unreadDates.getItem(at) !== null);
  const at = Math.min(...undated, wrongDate < 0 ? chunk.rowCount : wrongDate);
  if (at < chunk.rowCount) {
    const { columns, format } = settings;
    const shown = (unreadDates.getItem(at) ?? '').slice(0, 60);
    const message = `${file}, column “${columns.date}”, row ${firstRow + at}: “${shown}” is not a date written ${format.dateFormat}. Correct the cell, or set feed.format.dateFormat.`;
    return problem('valueUnreadable', message);
  }
  days.forEach((day, blank) => {
    if (day === null) collected.findings.record('blankRow', { file, row: firstRow + blank });
  });
  return null;
};

/** Rows of a file with one row per date and one column per ticker. A row whose date cannot be read refuses the file. */
export const readWideRows = async (
  connection: DuckDBConnection,
  path: string,
  source: Source,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReading> => {
  const found = findColumns(path, source.columns, { date: settings.columns.date }, 'feed.columns');
  if (!found.ok) return { rowCount: 0, refusal: found.problem };
  const { date } = found.value;
  const tickers = source.columns.filter((column) => column !== date);
  const wrong = wrongNames(path, tickers);
  if (wrong !== null) return { rowCount: 0, refusal: wrong };
  const numbers = tickers.map(({ name }) => collected.numberOf(name));
  const result = await connection.stream(querySql(settings, date, tickers, source.from));
  let rowCount = 0;
  for await (const chunk of chunksOf(result)) {
    const refusal = readChunk(chunk, numbers, path, 2 + rowCount, settings, collected);
    if (refusal !== null) return { rowCount, refusal };
    rowCount += chunk.rowCount;
  }
  return { rowCount, refusal: null };
};
