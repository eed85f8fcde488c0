import type { DuckDBConnection, DuckDBDataChunk } from '@duckdb/node-api';
import { type Problem, problem } from '../../../terms/problem.ts';
import type { FeedSettings } from '../../settings.ts';
import {
  blankDay,
  blankPrice,
  codedDaySql,
  codedPriceSql,
  codeOfNoPrice,
  isPrice,
  unreadDay,
} from './cellCodes.ts';
import { type SourceColumn, textSql } from './cellSql.ts';
import type { Collected } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import { type ExtraColumns, makeExtras } from './extras.ts';
import { rawDoubles, rawInts } from './rawVectors.ts';
import type { Source } from './source.ts';
import { makeTickerReader, noTicker } from './tickerNumbers.ts';
import { chunksOf } from './vectors.ts';
import { firstRowOfFile, makeWantedTexts, textsOfRows, type WantedTexts } from './wantedTexts.ts';

/** What reading one file came to: how many rows, or why the whole file is refused. */
export type FileReading = { readonly rowCount: number; readonly refusal: Problem | null };

type LongColumns = {
  readonly date: SourceColumn;
  readonly ticker: SourceColumn;
  readonly price: SourceColumn;
};

const querySql = (
  { format }: FeedSettings,
  { date, ticker, price }: LongColumns,
  extras: ExtraColumns,
  from: string,
): string => {
  const name = ticker.type === 'VARCHAR' ? ticker.cell : textSql(ticker);
  const columns = [
    `coalesce(${name}, '')`,
    codedDaySql(date, format),
    codedPriceSql(price, format),
    ...extras.sql,
  ];
  return `SELECT ${columns.join(', ')} FROM ${from}`;
};

/** The columns of a chunk. Row `at` of it stands in row `firstRow + at` of the file. */
type Rows = {
  readonly file: string;
  readonly firstRow: number;
  readonly tickerNumbers: Int32Array;
  readonly days: Int32Array;
  readonly prices: Float64Array;
};

const isWhole = (number: number, day: number, price: number): boolean =>
  number >= 0 && day > blankDay && isPrice(price);

/** Records why a row is not whole. False where the whole file must be refused: it has a price or a date but no ticker. */
const recordFault = (
  rows: Rows,
  at: number,
  columns: LongColumns,
  collected: Collected,
  wanted: WantedTexts,
): boolean => {
  const { file, firstRow, tickerNumbers, days, prices } = rows;
  const number = tickerNumbers[at] as number;
  const price = prices[at] as number;
  const row = firstRow + at;
  if (number < 0) {
    if (number !== noTicker || days[at] !== blankDay || price !== blankPrice) return false;
    collected.findings.record('blankRow', { file, row });
    return true;
  }
  const day = (days[at] as number) > blankDay ? (days[at] as number) : null;
  const place = { file, row, ticker: collected.names[number] ?? null, day };
  if (day === null) {
    const kept = collected.findings.record('unreadableDate', place);
    if (days[at] === unreadDay) wanted.want(kept, columns.date, row);
    else if (kept !== null) kept.value = '';
  }
  if (isPrice(price)) return true;
  const code = codeOfNoPrice(price);
  const hasNumber = code === 'priceNotPositive' || code === 'priceNotFinite';
  const kept = collected.findings.record(code, { ...place, value: hasNumber ? String(price) : null });
  if (code === 'unreadablePrice') wanted.want(kept, columns.price, row);
  return true;
};

/** Adds a chunk's prices. The place of the first row that refuses the file, or −1. */
const addRows = (rows: Rows, columns: LongColumns, collected: Collected, wanted: WantedTexts): number => {
  const { tickerNumbers, days, prices } = rows;
  let whole = 0;
  const count = days.length;
  while (
    whole < count &&
    isWhole(tickerNumbers[whole] as number, days[whole] as number, prices[whole] as number)
  ) {
    whole += 1;
  }
  collected.addAll(tickerNumbers.subarray(0, whole), days.subarray(0, whole), prices.subarray(0, whole));
  for (let at = whole; at < count; at += 1) {
    const number = tickerNumbers[at] as number;
    const day = days[at] as number;
    const price = prices[at] as number;
    if (isWhole(number, day, price)) collected.add(number, day, price);
    else if (!recordFault(rows, at, columns, collected, wanted)) return at;
  }
  return -1;
};

const mostShown = 60;

const withoutTicker = (path: string, column: string, row: number, name: string): Problem => {
  const message = `${path}, column “${column}”, row ${row}: “${name.slice(0, mostShown)}” is not the name of a ticker. Correct the cell and save the file again.`;
  return problem('valueUnreadable', message);
};

const readChunk = (
  chunk: DuckDBDataChunk,
  file: string,
  firstRow: number,
  tickerNumbers: Int32Array,
): Rows => ({
  file,
  firstRow,
  tickerNumbers,
  days: rawInts(chunk, 1),
  prices: rawDoubles(chunk, 2),
});

/** Rows of a file with one row per date and ticker. */
export const readLongRows = async (
  connection: DuckDBConnection,
  path: string,
  source: Source,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReading> => {
  const { date, ticker, close, adjustedClose } = settings.columns;
  const found = findColumns(
    path,
    source.columns,
    { date, ticker, price: adjustedClose ?? close },
    'feed.columns',
  );
  if (!found.ok) return { rowCount: 0, refusal: found.problem };
  const extras = makeExtras(path, source, settings, collected, 3);
  if (!extras.ok) return { rowCount: 0, refusal: extras.problem };
  const columns = found.value;
  const result = await connection.stream(querySql(settings, columns, extras.value, source.from));
  const readTickers = makeTickerReader(collected);
  const wanted = makeWantedTexts();
  const numbers = new Int32Array(4096);
  let rowCount = 0;
  for await (const chunk of chunksOf(result)) {
    readTickers(chunk, 0, numbers);
    const firstRow = firstRowOfFile + rowCount;
    const wrong = addRows(readChunk(chunk, path, firstRow, numbers), columns, collected, wanted);
    if (wrong >= 0) {
      const row = firstRow + wrong;
      const name = (await textsOfRows(connection, source, columns.ticker, [row])).get(row) ?? '';
      return { rowCount, refusal: withoutTicker(path, ticker, row, name) };
    }
    extras.value.read(chunk, numbers, firstRow);
    rowCount += chunk.rowCount;
  }
  await wanted.fetch(connection, source);
  return { rowCount, refusal: null };
};
