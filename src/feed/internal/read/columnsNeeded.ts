import { problem } from '../../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../../terms/result.ts';
import type { SourceColumn } from './cellSql.ts';

const quoted = (names: readonly string[]): string => names.map((name) => `“${name}”`).join(', ');

const mostNamesShown = 20;

const present = (columns: readonly SourceColumn[]): string => {
  if (columns.length === 0) return 'it is empty';
  const names = columns.slice(0, mostNamesShown).map(({ name }) => name);
  const more = columns.length - names.length;
  return `its first row names ${quoted(names)}${more > 0 ? ` and ${more} more` : ''}`;
};

/** What else may be set right: a first row that is one name with a mark in it has another delimiter than was said. */
const advice = (columns: readonly SourceColumn[], setting: string, otherwise: string): string => {
  const [only] = columns.length === 1 ? columns : [];
  if (only !== undefined && /[,;\t|]/.test(only.name))
    return `Choose the delimiter of the file in the settings, or name its columns under ${setting}.`;
  return `Correct the file, or name its columns under ${setting}${otherwise}.`;
};

/** Finds each needed column by its exact name, which must stand there once. `names` maps our word to the file's name; `otherwise` is more advice where one is not there. */
export const findColumns = <Word extends string>(
  path: string,
  columns: readonly SourceColumn[],
  names: Readonly<Record<Word, string>>,
  setting: string,
  otherwise = '',
): Result<Readonly<Record<Word, SourceColumn>>> => {
  const wanted: string[] = Object.values(names);
  const absent = wanted.filter((name) => columns.every((column) => column.name !== name));
  if (absent.length > 0) {
    const message = `${path} has no column ${quoted(absent)}; ${present(columns)}. ${advice(columns, setting, otherwise)}`;
    return refuse(problem(columns.length === 0 ? 'fileEmpty' : 'columnMissing', message));
  }
  const twice = wanted.find((name) => columns.filter((column) => column.name === name).length > 1);
  if (twice !== undefined) {
    const message = `${path} names the column “${twice}” twice. Keep one of the two.`;
    return refuse(problem('columnMissing', message));
  }
  const byName = new Map(columns.map((column) => [column.name, column]));
  const found = Object.fromEntries(
    Object.entries<string>(names).map(([word, name]) => [word, byName.get(name)]),
  );
  return succeed(found as Record<Word, SourceColumn>);
};
