import type { DuckDBConnection, DuckDBDataChunk } from '@duckdb/node-api';
import { type Problem, problem } from '../../../terms/problem.ts';
import type { FeedSettings } from '../../settings.ts';
import { blankDay, blankPrice, codedDaySql, codedPriceSql, isPrice, unreadDay } from './cellCodes.ts';
import type { SourceColumn } from './cellSql.ts';
import { type Collected, isTickerName } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import type { FileReading } from './longRows.ts';
import { rawDoubles, rawInts } from './rawVectors.ts';
import { recordNoPrice } from './rowFaults.ts';
import type { Source } from './source.ts';
import { chunksOf } from './vectors.ts';
import { firstRowOfFile, makeWantedTexts, textsOfRows, type WantedTexts } from './wantedTexts.ts';

/** Why the names of the ticker columns cannot stand; null where they can. */
const wrongNames = (path: string, columns: readonly SourceColumn[]): Problem | null => {
  const wrong = columns.find(({ name }) => name === '' || !isTickerName(name));
  if (wrong !== undefined) {
    const message = `${path} has a column called “${wrong.name.slice(0, 60)}”, which is not the name of a ticker. Name every column in the first row.`;
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

/** The columns of the file with the number of each one's ticker. */
type Tickers = readonly { readonly column: SourceColumn; readonly number: number }[];

type Rows = { readonly file: string; readonly firstRow: number; readonly days: Int32Array };

/** Adds a column's prices; the first row that has a cell in it but no date, or the number of rows where none has. */
const addColumn = (
  rows: Rows,
  prices: Float64Array,
  { column, number }: Tickers[number],
  collected: Collected,
  wanted: WantedTexts,
): number => {
  const { file, firstRow, days } = rows;
  let firstUndated = days.length;
  for (let at = 0; at < days.length; at += 1) {
    const day = days[at] as number;
    const price = prices[at] as number;
    if (day <= blankDay) {
      if (price !== blankPrice) firstUndated = Math.min(firstUndated, at);
    } else if (isPrice(price)) collected.add(number, day, price);
    else {
      const place = { file, row: firstRow + at, ticker: column.name, day };
      recordNoPrice(collected, place, price, column, wanted);
    }
  }
  return firstUndated;
};

/** Adds a chunk; the place of the first row whose date cannot be read, −1 where every row has one or is blank. */
const addRows = (
  chunk: DuckDBDataChunk,
  file: string,
  firstRow: number,
  tickers: Tickers,
  collected: Collected,
  wanted: WantedTexts,
): number => {
  const rows = { file, firstRow, days: rawInts(chunk, 0) };
  const wrongDate = rows.days.indexOf(unreadDay);
  let first = wrongDate < 0 ? chunk.rowCount : wrongDate;
  for (const [at, ticker] of tickers.entries()) {
    first = Math.min(first, addColumn(rows, rawDoubles(chunk, 1 + at), ticker, collected, wanted));
  }
  if (first < chunk.rowCount) return first;
  for (const [at, day] of rows.days.entries()) {
    if (day === blankDay) collected.findings.record('blankRow', { file, row: firstRow + at });
  }
  return -1;
};

/** Rows of a file with one row per date and one column per ticker. A row whose date cannot be read refuses the file. */
export const readWideRows = async (
  connection: DuckDBConnection,
  path: string,
  source: Source,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReading> => {
  const { format } = settings;
  const found = findColumns(path, source.columns, { date: settings.columns.date }, 'feed.columns');
  if (!found.ok) return { rowCount: 0, refusal: found.problem };
  const { date } = found.value;
  const columns = source.columns.filter((column) => column !== date);
  const wrong = wrongNames(path, columns);
  if (wrong !== null) return { rowCount: 0, refusal: wrong };
  const tickers = columns.map((column) => ({ column, number: collected.numberOf(column.name) }));
  const cells = [codedDaySql(date, format), ...columns.map((column) => codedPriceSql(column, format))];
  const result = await connection.stream(`SELECT ${cells.join(', ')} FROM ${source.from}`);
  const wanted = makeWantedTexts();
  let rowCount = 0;
  for await (const chunk of chunksOf(result)) {
    const firstRow = firstRowOfFile + rowCount;
    const at = addRows(chunk, path, firstRow, tickers, collected, wanted);
    if (at >= 0) {
      const row = firstRow + at;
      const text = (await textsOfRows(connection, source, date, [row])).get(row) ?? '';
      const message = `${path}, column “${date.name}”, row ${row}: “${text.slice(0, 60)}” is not a date written ${format.dateFormat}. Correct the cell, or set feed.format.dateFormat.`;
      return { rowCount, refusal: problem('valueUnreadable', message) };
    }
    rowCount += chunk.rowCount;
  }
  await wanted.fetch(connection, source);
  return { rowCount, refusal: null };
};
