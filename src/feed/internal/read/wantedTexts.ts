import type { DuckDBConnection } from '@duckdb/node-api';
import type { KeptExample } from '../findings.ts';
import { type SourceColumn, textSql } from './cellSql.ts';
import type { Source } from './source.ts';

/** Cells whose text is to be shown, gathered while the numbers are read and fetched from the file afterwards. */
export type WantedTexts = {
  readonly want: (example: KeptExample | null, column: SourceColumn, row: number) => void;
  readonly fetch: (connection: DuckDBConnection, source: Source) => Promise<void>;
};

/** The row of names is row 1. */
export const firstRowOfFile = 2;

const mostFetched = 200;

/** The text of one cell of each of some rows. A second look at the file is rare: a file without faults has none. */
export const textsOfRows = async (
  connection: DuckDBConnection,
  source: Source,
  column: SourceColumn,
  rows: readonly number[],
): Promise<ReadonlyMap<number, string | null>> => {
  const numbered = `SELECT row_number() OVER () + ${firstRowOfFile - 1} AS row_of_file, ${textSql(column)} AS text_of_cell FROM ${source.from}`;
  const result = await connection.run(
    `SELECT row_of_file, text_of_cell FROM (${numbered}) WHERE row_of_file IN (${rows.join(', ')})`,
  );
  return new Map(
    (await result.getRowsJson()).map(([row, text]) => [Number(row), typeof text === 'string' ? text : null]),
  );
};

export const makeWantedTexts = (): WantedTexts => {
  const byColumn = new Map<SourceColumn, { readonly example: KeptExample; readonly row: number }[]>();
  return {
    want: (example, column, row) => {
      if (example === null) return;
      const wanted = byColumn.get(column);
      if (wanted === undefined) byColumn.set(column, [{ example, row }]);
      else if (wanted.length < mostFetched) wanted.push({ example, row });
    },
    fetch: async (connection, source) => {
      for (const [column, wanted] of [...byColumn].slice(0, mostFetched)) {
        const found = await textsOfRows(
          connection,
          source,
          column,
          wanted.map(({ row }) => row),
        );
        for (const { example, row } of wanted) example.value = found.get(row) ?? '';
      }
    },
  };
};
