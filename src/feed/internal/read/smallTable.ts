import { type Problem, problem } from '../../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../../terms/result.ts';
import type { TextFormat } from '../../../terms/tableFormat.ts';
import { acceptFile } from './acceptFile.ts';
import { daySql, numberSql, type SourceColumn, textSql } from './cellSql.ts';
import { findColumns } from './columnsNeeded.ts';
import { type Database, passingDatabase } from './database.ts';
import { readerProblem } from './readerProblem.ts';
import { openSource } from './source.ts';

export type CellKind = 'text' | 'day' | 'number';

/** A column that a small table must have: its name in the file, what its cells hold, and what to say where one does not. */
export type ColumnWanted = { readonly name: string; readonly kind: CellKind; readonly expected: string };

export type Cell = string | number;

const cellSql = (column: SourceColumn, kind: CellKind, format: TextFormat): string => {
  if (kind === 'text') return textSql(column);
  return kind === 'day' ? daySql(column, format) : numberSql(column, format.decimalMark);
};

type Row = readonly unknown[];

const wrongCell = (path: string, wanted: ColumnWanted, row: number, text: unknown): Problem => {
  const shown = typeof text === 'string' ? text.slice(0, 60) : '';
  const message = `${path}, column “${wanted.name}”, row ${row}: “${shown}” is not ${wanted.expected}. Correct the cell and save the file again.`;
  return problem('valueUnreadable', message);
};

const isCell = (value: unknown, kind: CellKind): value is Cell =>
  kind === 'text' ? typeof value === 'string' : typeof value === 'number' && Number.isFinite(value);

/** Rows without anything in them are left out; any other row must be whole. */
const checkRows = (
  path: string,
  rows: readonly Row[],
  wanted: readonly ColumnWanted[],
): Result<readonly (readonly Cell[])[]> => {
  const whole: Cell[][] = [];
  for (const [at, row] of rows.entries()) {
    const texts = row.slice(wanted.length);
    if (texts.every((text) => text === null)) continue;
    const cells: Cell[] = [];
    for (const [place, column] of wanted.entries()) {
      const value = row[place];
      if (!isCell(value, column.kind)) return refuse(wrongCell(path, column, at + 2, texts[place]));
      cells.push(value);
    }
    whole.push(cells);
  }
  return succeed(whole);
};

/** A file that is small enough to be held as rows: the wanted columns in the wanted order, each cell of its kind. */
export const readSmallTable = async (
  path: string,
  format: TextFormat,
  wanted: readonly ColumnWanted[],
  setting: string,
  database: Database = passingDatabase,
): Promise<Result<readonly (readonly Cell[])[]>> => {
  const accepted = await acceptFile(path);
  if (!accepted.ok) return accepted;
  const { kind } = accepted.value;
  return database(async (connection) => {
    try {
      const source = await openSource(connection, path, kind, format.delimiter);
      const names = Object.fromEntries(wanted.map(({ name }, place) => [String(place), name]));
      const found = findColumns(path, source.columns, names, setting);
      if (!found.ok) return found;
      const columns = wanted.map((_, place) => found.value[String(place)] as SourceColumn);
      const cells = columns.map((column, place) => cellSql(column, wanted[place]?.kind ?? 'text', format));
      const result = await connection.run(
        `SELECT ${[...cells, ...columns.map(textSql)].join(', ')} FROM ${source.from}`,
      );
      return checkRows(path, await result.getRowsJson(), wanted);
    } catch (error) {
      return refuse(readerProblem(path, kind, error));
    }
  });
};
