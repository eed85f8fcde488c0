import { type DuckDBConnection, DuckDBDoubleVector, DuckDBIntegerVector } from '@duckdb/node-api';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { FeedSettings } from '../settings.ts';
import { csvHeader, csvScan } from './csvSource.ts';
import { makeRowBlocks, type RowBlock } from './rowBlocks.ts';

export type FileRows = { readonly names: readonly string[]; readonly blocks: readonly RowBlock[] };

type Cells = { readonly date: string; readonly ticker: string; readonly close: string };

/** Where each needed column stands, or which one the file lacks. */
const findColumns = (settings: FeedSettings, header: readonly string[]): Result<Cells> => {
  const { path, columns } = settings;
  const place = (name: string): number => header.indexOf(name);
  const absent = Object.values(columns).filter((name) => place(name) < 0);
  if (absent.length > 0) {
    const message =
      `${path} has no column ${absent.map((name) => `“${name}”`).join(' and ')}; its first row names ` +
      `${header.map((name) => `“${name}”`).join(', ')}. Correct the file, or name its columns under feed.columns.`;
    return refuse(problem('columnMissing', message));
  }
  const twice = Object.values(columns).find((name) => header.indexOf(name) !== header.lastIndexOf(name));
  if (twice !== undefined) {
    return refuse(
      problem('columnMissing', `${path} names the column “${twice}” twice. Keep one of the two.`),
    );
  }
  const cell = (name: string): string => `c${place(name)}`;
  return succeed({ date: cell(columns.date), ticker: cell(columns.ticker), close: cell(columns.close) });
};

/** A calendar date is ten characters wide: a year of five digits or a time of day is not read as one. */
const daySql = (cell: string): string =>
  `CASE WHEN strlen(${cell}) = 10 THEN CAST(date_diff('day', DATE '1970-01-01', TRY_CAST(${cell} AS DATE)) AS INTEGER) END`;

const closeSql = (cell: string): string =>
  `CASE WHEN NOT contains(${cell}, '_') THEN TRY_CAST(${cell} AS DOUBLE) END`;

const unreadable = async (
  connection: DuckDBConnection,
  settings: FeedSettings,
  source: string,
  cells: Cells,
) => {
  const { path, columns } = settings;
  const bad = [
    `coalesce(${cells.ticker}, '') = ''`,
    `${daySql(cells.date)} IS NULL`,
    `NOT coalesce(isfinite(${closeSql(cells.close)}) AND ${closeSql(cells.close)} > 0, false)`,
  ];
  const result = await connection.run(
    `SELECT row_number, ${cells.ticker}, ${cells.date}, ${cells.close}, ${bad.join(', ')} FROM ` +
      `(SELECT row_number() OVER () AS row_number, * FROM ${source}) WHERE ${bad.join(' OR ')} LIMIT 1`,
  );
  const [row] = await result.getRowsJson();
  const at = row?.slice(4).indexOf(true) ?? -1;
  const name = [columns.ticker, columns.date, columns.close][at] ?? '';
  const expected = ['a ticker', 'a date such as 2026-11-27', 'a price above zero such as 102.5'][at] ?? '';
  const value = row?.[1 + at] ?? '';
  const message = `${path}, column “${name}”, row ${1 + Number(row?.[0])}: “${String(value)}” is not ${expected}. Correct the cell and save the file again.`;
  return refuse(problem('valueUnreadable', message));
};

/** All rows of the price file in the order of the file. */
export const readRows = async (
  connection: DuckDBConnection,
  settings: FeedSettings,
): Promise<Result<FileRows>> => {
  const header = await csvHeader(connection, settings.path);
  const cells = findColumns(settings, header);
  if (!cells.ok) return cells;
  const { ticker, date, close } = cells.value;
  const source = csvScan(settings.path, header.length);
  // 52 bits of the hash stand for the ticker: a number is read many times faster than a text
  const query = `SELECT ${ticker}, CAST(hash(${ticker}) >> 12 AS DOUBLE), ${daySql(date)}, ${closeSql(close)} FROM ${source}`;
  const result = await connection.stream(query);
  const names: string[] = [];
  const numberOfHash = new Map<number, number>();
  const { blocks, add } = makeRowBlocks();
  for (
    let chunk = await result.fetchChunk();
    chunk !== null && chunk.rowCount > 0;
    chunk = await result.fetchChunk()
  ) {
    const [tickers, hashes, days, closes] = [0, 1, 2, 3].map((column) => chunk?.getColumnVector(column));
    if (
      !(
        hashes instanceof DuckDBDoubleVector &&
        days instanceof DuckDBIntegerVector &&
        closes instanceof DuckDBDoubleVector
      )
    ) {
      throw new Error('the database gave columns of other types than were asked for');
    }
    for (let row = 0; row < chunk.rowCount; row += 1) {
      const hash = hashes.getItem(row) ?? 0;
      let number = numberOfHash.get(hash);
      if (number === undefined) {
        const name = tickers?.getItem(row);
        if (typeof name !== 'string' || name === '')
          return unreadable(connection, settings, source, cells.value);
        number = names.length;
        names.push(name);
        numberOfHash.set(hash, number);
      }
      const day = days.getItem(row);
      const price = closes.getItem(row);
      if (day === null || price === null || !(price > 0 && price < Number.POSITIVE_INFINITY)) {
        return unreadable(connection, settings, source, cells.value);
      }
      add(number, day, price);
    }
  }
  return succeed({ names, blocks });
};
