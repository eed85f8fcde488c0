import type { DuckDBConnection } from '@duckdb/node-api';
import { type Problem, problem } from '../../../terms/problem.ts';
import type { TextFormat } from '../../../terms/tableFormat.ts';
import {
  blankDay,
  blankPrice,
  codedDaySql,
  codedPriceSql,
  codeOfNoPrice,
  isPrice,
  unreadDay,
} from './cellCodes.ts';
import { daySql, numberSql, type SourceColumn, textSql } from './cellSql.ts';
import { type Collected, noTicker } from './collected.ts';
import { rawDoubles, rawInts } from './rawVectors.ts';
import type { Source } from './source.ts';
import { chunksOf } from './vectors.ts';
import { firstRowOfFile, makeWantedTexts, textsOfRows, type WantedTexts } from './wantedTexts.ts';

export type LongColumns = {
  readonly date: SourceColumn;
  readonly ticker: SourceColumn;
  readonly price: SourceColumn;
};

/** A row that is not whole: its place, the number of its ticker, and its day and price or the codes for none. */
type FaultyRow = {
  readonly row: number;
  readonly number: number;
  readonly day: number;
  readonly price: number;
};

/** Records a price that cannot be one. */
export const recordNoPrice = (
  collected: Collected,
  place: {
    readonly file: string;
    readonly row: number;
    readonly ticker: string;
    readonly day: number | null;
  },
  price: number,
  column: SourceColumn,
  wanted: WantedTexts,
): void => {
  const code = codeOfNoPrice(price);
  const hasNumber = code === 'priceNotPositive' || code === 'priceNotFinite';
  const kept = collected.findings.record(code, { ...place, value: hasNumber ? String(price) : null });
  if (code === 'unreadablePrice') wanted.want(kept, column, place.row);
};

/** Records why a row is not whole. False where the whole file must be refused: it has a price or a date but no ticker. */
const recordFault = (
  { row, number, day, price }: FaultyRow,
  file: string,
  columns: LongColumns,
  collected: Collected,
  wanted: WantedTexts,
): boolean => {
  const ticker = collected.names[number];
  if (ticker === undefined) {
    const isBlank = number === noTicker && day === blankDay && price === blankPrice;
    if (isBlank) collected.findings.record('blankRow', { file, row });
    return isBlank;
  }
  const place = { file, row, ticker, day: day > blankDay ? day : null };
  if (place.day === null) {
    const kept = collected.findings.record('unreadableDate', place);
    if (day === unreadDay) wanted.want(kept, columns.date, row);
    else if (kept !== null) kept.value = '';
  }
  if (!isPrice(price)) recordNoPrice(collected, place, price, columns.price, wanted);
  return true;
};

const withoutTicker = (file: string, column: string, row: number, name: string): Problem => {
  const message = `${file}, column “${column}”, row ${row}: “${name.slice(0, 60)}” is not the name of a ticker. Correct the cell and save the file again.`;
  return problem('valueUnreadable', message);
};

/** Why a cell has no value costs time to tell, so only the rows that lack one are asked for it, in their order. */
const faultsSql = (columns: LongColumns, format: TextFormat, source: Source): string => {
  const { date, ticker, price } = columns;
  const lacking = [
    `${daySql(date, format)} IS NULL`,
    `${numberSql(price, format.decimalMark)} IS NULL`,
    `${textSql(ticker)} IS NULL`,
  ];
  const numbered = `SELECT CAST(row_number() OVER () AS INTEGER) AS row_of_file, * FROM ${source.from}`;
  const codes = `row_of_file, ${codedDaySql(date, format)}, ${codedPriceSql(price, format)}`;
  return `SELECT ${codes} FROM (${numbered}) WHERE ${lacking.join(' OR ')}`;
};

/** Rows that could not be added, gathered while a file is read and looked into afterwards. */
export type RowFaults = {
  /** `lacksValue` where the day, the price or the ticker is null: `day` and `price` are then without meaning. */
  readonly note: (fault: FaultyRow, lacksValue: boolean) => void;
  /** Records every fault; the problem where one refuses the whole file. */
  readonly settle: (
    connection: DuckDBConnection,
    source: Source,
    format: TextFormat,
  ) => Promise<Problem | null>;
};

export const makeRowFaults = (file: string, columns: LongColumns, collected: Collected): RowFaults => {
  const wanted = makeWantedTexts();
  const numberOfRow = new Map<number, number>();
  let firstWithoutTicker = Number.POSITIVE_INFINITY;
  const take = (fault: FaultyRow): void => {
    if (recordFault(fault, file, columns, collected, wanted)) return;
    firstWithoutTicker = Math.min(firstWithoutTicker, fault.row);
  };
  const takeLacking = async (
    connection: DuckDBConnection,
    source: Source,
    format: TextFormat,
  ): Promise<void> => {
    const result = await connection.stream(faultsSql(columns, format, source));
    for await (const chunk of chunksOf(result)) {
      const [rows, days, prices] = [rawInts(chunk, 0), rawInts(chunk, 1), rawDoubles(chunk, 2)];
      for (const [at, rowOfTable] of rows.entries()) {
        const row = rowOfTable + firstRowOfFile - 1;
        take({
          row,
          number: numberOfRow.get(row) ?? noTicker,
          day: days[at] as number,
          price: prices[at] as number,
        });
      }
    }
  };
  return {
    note: (fault, lacksValue) => {
      if (lacksValue) numberOfRow.set(fault.row, fault.number);
      else take(fault);
    },
    settle: async (connection, source, format) => {
      if (numberOfRow.size > 0) await takeLacking(connection, source, format);
      if (Number.isFinite(firstWithoutTicker)) {
        const names = await textsOfRows(connection, source, columns.ticker, [firstWithoutTicker]);
        return withoutTicker(
          file,
          columns.ticker.name,
          firstWithoutTicker,
          names.get(firstWithoutTicker) ?? '',
        );
      }
      await wanted.fetch(connection, source);
      return null;
    },
  };
};
