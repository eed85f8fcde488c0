import type { DuckDBConnection } from '@duckdb/node-api';
import { sqlText } from './database.ts';

const mostLineBytes = 2_000_000;

const scan = (path: string, columns: readonly string[], more: string): string => {
  const types = columns.map((name) => `${sqlText(name)}: 'VARCHAR'`).join(', ');
  return (
    `read_csv(${sqlText(path)}, auto_detect = false, columns = {${types}}, ` +
    `max_line_size = ${mostLineBytes}, strict_mode = true, null_padding = false, ${more})`
  );
};

/** Every cell of a CSV file as text, its columns named c0, c1 and so on; the first row is skipped. */
export const csvScan = (path: string, columnCount: number): string =>
  scan(
    path,
    Array.from({ length: columnCount }, (_, place) => `c${place}`),
    `header = true, delim = ',', quote = '"', escape = '"'`,
  );

/** The cells of one CSV record that stands on one line. */
export const cellsOfLine = (line: string): string[] => {
  const cells: string[] = [];
  const cell = /(?:"((?:[^"]|"")*)"|([^,]*))(?:,|$)/y;
  while (cell.lastIndex < line.length || (line.at(-1) === ',' && cell.lastIndex === line.length)) {
    const atEnd = cell.lastIndex === line.length;
    const found = cell.exec(line);
    if (found === null) return [line];
    cells.push((found[1]?.replaceAll('""', '"') ?? found[2] ?? '').trim());
    if (atEnd) break;
  }
  return cells;
};

/** The names in the first row, in the order of the file. */
export const csvHeader = async (connection: DuckDBConnection, path: string): Promise<string[]> => {
  // a delimiter that no file has leaves the line whole, whatever compression the file is in
  const source = scan(path, ['line'], String.raw`header = false, delim = '\x01', quote = '', escape = ''`);
  const result = await connection.run(`SELECT line FROM ${source} LIMIT 1`);
  const rows = await result.getRowsJson();
  const line = rows[0]?.[0];
  return typeof line === 'string' ? cellsOfLine(line) : [];
};
