import type { DuckDBConnection, DuckDBDataChunk } from '@duckdb/node-api';
import type { Problem } from '../../../terms/problem.ts';
import type { FeedSettings } from '../../settings.ts';
import { isPrice } from './cellCodes.ts';
import { dateSql, numberSql, textSql } from './cellSql.ts';
import type { Collected } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import { type ExtraColumns, makeExtras } from './extras.ts';
import { hasValue, rawDoubles, rawInts, type ValueBits, valueBits } from './rawVectors.ts';
import { type LongColumns, makeRowFaults, type RowFaults } from './rowFaults.ts';
import type { Source } from './source.ts';
import { makeTickerReader } from './tickerNumbers.ts';
import { chunksOf } from './vectors.ts';
import { firstRowOfFile } from './wantedTexts.ts';

/** What reading one file came to: how many rows, or why the whole file is refused. */
export type FileReading = { readonly rowCount: number; readonly refusal: Problem | null };

const [tickerAt, dayAt, priceAt, extrasAt] = [0, 1, 2, 3];

const querySql = (
  { format }: FeedSettings,
  { date, ticker, price }: LongColumns,
  extras: ExtraColumns,
  from: string,
): string => {
  const name = ticker.type === 'VARCHAR' ? ticker.cell : textSql(ticker);
  const columns = [name, dateSql(date, format), numberSql(price, format.decimalMark), ...extras.sql];
  return `SELECT ${columns.join(', ')} FROM ${from}`;
};

/** The columns of a chunk. Row `at` of it stands in row `firstRow + at` of the file. */
type Rows = {
  readonly firstRow: number;
  readonly tickerNumbers: Int32Array;
  readonly days: Int32Array;
  readonly prices: Float64Array;
  readonly lacking: readonly ValueBits[];
};

const readChunk = (chunk: DuckDBDataChunk, firstRow: number, tickerNumbers: Int32Array): Rows => ({
  firstRow,
  tickerNumbers,
  days: rawInts(chunk, dayAt),
  prices: rawDoubles(chunk, priceAt),
  lacking: [tickerAt, dayAt, priceAt]
    .map((column) => valueBits(chunk, column))
    .filter((bits) => bits !== null),
});

/** How many rows from the first on have a ticker and a price above zero. */
const wholeRows = ({ tickerNumbers, prices }: Rows): number => {
  let at = 0;
  while (at < prices.length && (tickerNumbers[at] as number) >= 0 && isPrice(prices[at] as number)) at += 1;
  return at;
};

const addRows = (rows: Rows, collected: Collected, faults: RowFaults): void => {
  const { firstRow, tickerNumbers, days, prices, lacking } = rows;
  const whole = lacking.length > 0 ? 0 : wholeRows(rows);
  collected.addAll(tickerNumbers.subarray(0, whole), days.subarray(0, whole), prices.subarray(0, whole));
  for (let at = whole; at < days.length; at += 1) {
    const number = tickerNumbers[at] as number;
    const day = days[at] as number;
    const price = prices[at] as number;
    const lacksValue = lacking.some((bits) => !hasValue(bits, at));
    if (!lacksValue && number >= 0 && isPrice(price)) collected.add(number, day, price);
    else faults.note({ row: firstRow + at, number, day, price }, lacksValue);
  }
};

/** A file with dates but neither tickers nor closes may have a column per ticker. */
const looksWide = ({ columns }: Source, { columns: names }: FeedSettings): boolean => {
  const has = (name: string): boolean => columns.some((column) => column.name === name);
  return has(names.date) && !has(names.ticker) && !has(names.close);
};

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
    looksWide(source, settings) ? ', or set feed.shape to wide' : '',
  );
  if (!found.ok) return { rowCount: 0, refusal: found.problem };
  const extras = makeExtras(path, source, settings, collected, extrasAt, dayAt);
  if (!extras.ok) return { rowCount: 0, refusal: extras.problem };
  const result = await connection.stream(querySql(settings, found.value, extras.value, source.from));
  const readTickers = makeTickerReader(collected);
  const faults = makeRowFaults(path, found.value, collected);
  const numbers = new Int32Array(4096);
  let rowCount = 0;
  for await (const chunk of chunksOf(result)) {
    const firstRow = firstRowOfFile + rowCount;
    readTickers(chunk, tickerAt, numbers);
    addRows(readChunk(chunk, firstRow, numbers), collected, faults);
    extras.value.read(chunk, numbers, firstRow);
    rowCount += chunk.rowCount;
  }
  return { rowCount, refusal: await faults.settle(connection, source, settings.format) };
};
