import type { DuckDBConnection, DuckDBDataChunk } from '@duckdb/node-api';
import { type Problem, problem } from '../../../terms/problem.ts';
import type { FeedSettings } from '../../settings.ts';
import { daySql, numberSql, type SourceColumn, textSql, unreadTextSql } from './cellSql.ts';
import { type Collected, isTickerName } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import { type ExtraColumns, makeExtras } from './extras.ts';
import { isPrice, recordNoPrice } from './priceCell.ts';
import type { Source } from './source.ts';
import { chunksOf, doubles, integers, texts } from './vectors.ts';

/** What reading one file came to: how many rows, or why the whole file is refused. */
export type FileReading = { readonly rowCount: number; readonly refusal: Problem | null };

type LongColumns = {
  readonly date: SourceColumn;
  readonly ticker: SourceColumn;
  readonly price: SourceColumn;
};

/** 52 bits of a hash stand for the ticker, because a number is read many times faster than a text. */
const hashSql = ({ cell }: SourceColumn): string => `CAST(hash(${cell}) >> 12 AS DOUBLE)`;

const querySql = (
  settings: FeedSettings,
  { date, ticker, price }: LongColumns,
  extras: ExtraColumns,
  from: string,
): string => {
  const day = daySql(date, settings.format);
  const number = numberSql(price, settings.format.decimalMark);
  const columns = [
    hashSql(ticker),
    day,
    number,
    textSql(ticker),
    unreadTextSql(date, day),
    unreadTextSql(price, number),
    ...extras.sql,
  ];
  return `SELECT ${columns.join(', ')} FROM ${from}`;
};

const noTicker = -1;
const wrongName = -2;

/** Numbers of the tickers of a chunk's rows. */
const makeTickerReader = (collected: Collected) => {
  const numberOfHash = new Map<number, number>();
  const firstSight = (name: string | null): number => {
    if (name === null) return noTicker;
    return isTickerName(name) ? collected.numberOf(name) : wrongName;
  };
  return (chunk: DuckDBDataChunk, numbers: Int32Array): void => {
    const hashes = doubles(chunk, 0);
    const names = texts(chunk, 3);
    let lastHash = Number.NaN;
    let number = noTicker;
    for (let row = 0; row < chunk.rowCount; row += 1) {
      const hash = hashes.getItem(row) as number;
      if (hash !== lastHash) {
        lastHash = hash;
        const known = numberOfHash.get(hash);
        number = known ?? firstSight(names.getItem(row));
        if (known === undefined) numberOfHash.set(hash, number);
      }
      numbers[row] = number;
    }
  };
};

const mostShown = 60;

const withoutTicker = (path: string, column: string, row: number, name: string | null): Problem => {
  const shown = (name ?? '').slice(0, mostShown);
  const message = `${path}, column “${column}”, row ${row}: “${shown}” is not the name of a ticker. Correct the cell and save the file again.`;
  return problem('valueUnreadable', message);
};

/** Rows of a file with one row per date and ticker. */
export const readLongRows = async (
  connection: DuckDBConnection,
  path: string,
  source: Source,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReading> => {
  const { columns } = settings;
  const priceName = columns.adjustedClose ?? columns.close;
  const found = findColumns(
    path,
    source.columns,
    { date: columns.date, ticker: columns.ticker, price: priceName },
    'feed.columns',
  );
  if (!found.ok) return { rowCount: 0, refusal: found.problem };
  const extras = makeExtras(path, source, settings, collected, 6);
  if (!extras.ok) return { rowCount: 0, refusal: extras.problem };
  const result = await connection.stream(querySql(settings, found.value, extras.value, source.from));
  const readTickers = makeTickerReader(collected);
  const numbers = new Int32Array(4096);
  let rowCount = 0;
  for await (const chunk of chunksOf(result)) {
    readTickers(chunk, numbers);
    const badRow = readPrices(chunk, numbers, path, 2 + rowCount, collected);
    if (badRow !== null) {
      return {
        rowCount,
        refusal: withoutTicker(path, columns.ticker, 2 + rowCount + badRow, texts(chunk, 3).getItem(badRow)),
      };
    }
    extras.value.read(chunk, numbers, 2 + rowCount);
    rowCount += chunk.rowCount;
  }
  return { rowCount, refusal: null };
};

/** Adds a chunk's prices; the place of the first row that has a price or a date but no ticker, null where there is none. */
const readPrices = (
  chunk: DuckDBDataChunk,
  numbers: Int32Array,
  file: string,
  firstRow: number,
  collected: Collected,
): number | null => {
  const days = integers(chunk, 1);
  const prices = doubles(chunk, 2);
  const unreadDates = texts(chunk, 4);
  const unreadPrices = texts(chunk, 5);
  const { findings, names, add } = collected;
  for (let at = 0; at < chunk.rowCount; at += 1) {
    const number = numbers[at] as number;
    const day = days.getItem(at);
    const price = prices.getItem(at);
    if (number >= 0 && day !== null && isPrice(price)) {
      add(number, day, price);
      continue;
    }
    const unreadDate = unreadDates.getItem(at);
    const unreadPrice = unreadPrices.getItem(at);
    const row = firstRow + at;
    if (number < 0) {
      const isBlank =
        number === noTicker && [day, price, unreadDate, unreadPrice].every((cell) => cell === null);
      if (!isBlank) return at;
      findings.record('blankRow', { file, row });
      continue;
    }
    const place = { file, ticker: names[number] ?? null, day, row };
    if (day === null) findings.record('unreadableDate', { ...place, value: unreadDate ?? '' });
    if (!isPrice(price)) recordNoPrice(findings, place, price, unreadPrice);
  }
  return null;
};
