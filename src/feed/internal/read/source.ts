import type { DuckDBConnection } from '@duckdb/node-api';
import type { Delimiter } from '../../../terms/tableFormat.ts';
import type { SourceColumn } from './cellSql.ts';
import { sqlText } from './database.ts';
import type { FileKind } from './fileKind.ts';
import { cellsOfLine, delimiterOf } from './textLine.ts';
import { mostLineBytes } from './wholeness.ts';

/** A file ready to be read: its columns and the SQL that stands for its rows. */
export type Source = { readonly columns: readonly SourceColumn[]; readonly from: string };

/** The reader’s own buffers are many times larger without being faster. */
const bufferBytes = 2_000_000;

const csvScan = (path: string, cells: readonly string[], more: string): string => {
  const types = cells.map((name) => `${sqlText(name)}: 'VARCHAR'`).join(', ');
  return (
    `read_csv(${sqlText(path)}, auto_detect = false, columns = {${types}}, ` +
    `max_line_size = ${mostLineBytes}, buffer_size = ${bufferBytes}, strict_mode = true, null_padding = false, ${more})`
  );
};

const openCsv = async (connection: DuckDBConnection, path: string, delimiter: string): Promise<Source> => {
  // a delimiter that no file has leaves the first line whole, whatever compression the file is in
  const lines = csvScan(path, ['line'], String.raw`header = false, delim = '\x01', quote = '', escape = ''`);
  const result = await connection.run(`SELECT line FROM ${lines} LIMIT 1`);
  const line = (await result.getRowsJson())[0]?.[0];
  const names = typeof line === 'string' ? cellsOfLine(line, delimiter) : [];
  const cells = names.map((_, place) => `c${place}`);
  const from = csvScan(
    path,
    cells,
    `header = true, delim = ${sqlText(delimiter)}, quote = '"', escape = '"'`,
  );
  return { columns: names.map((name, place) => ({ name, cell: `c${place}`, type: 'VARCHAR' })), from };
};

const openParquet = async (connection: DuckDBConnection, path: string): Promise<Source> => {
  const result = await connection.run(`DESCRIBE SELECT * FROM read_parquet(${sqlText(path)})`);
  const columns = (await result.getRowsJson()).map((row, place) => ({
    name: String(row[0]),
    cell: `c${place}`,
    type: String(row[1]),
  }));
  const cells = columns.map(({ cell }) => cell).join(', ');
  return { columns, from: `(SELECT * FROM read_parquet(${sqlText(path)})) AS rows(${cells})` };
};

export const openSource = (
  connection: DuckDBConnection,
  path: string,
  kind: FileKind,
  delimiter: Delimiter,
): Promise<Source> =>
  kind === 'parquet' ? openParquet(connection, path) : openCsv(connection, path, delimiterOf[delimiter]);
