import type { DateFormat, DecimalMark, TextFormat } from '../../../terms/tableFormat.ts';
import { sqlText } from './database.ts';

/** A column as it stands in a file: the name in its first row, and the SQL name and type by which its cells are read. */
export type SourceColumn = { readonly name: string; readonly cell: string; readonly type: string };

const isText = ({ type }: SourceColumn): boolean => type === 'VARCHAR' || type.startsWith('ENUM');

type WrittenDate = Exclude<DateFormat, 'spreadsheet number'>;

/** How each format is parsed, and the only shape that is let through to the parser: alone it takes words too. */
const patterns: Readonly<Record<WrittenDate, readonly [parse: string, shape: string]>> = {
  'YYYY-MM-DD': ['%Y-%m-%d', '[0-9]{4}-[0-9]{2}-[0-9]{2}'],
  'YYYY/MM/DD': ['%Y/%m/%d', '[0-9]{4}/[0-9]{1,2}/[0-9]{1,2}'],
  YYYYMMDD: ['%Y%m%d', '[0-9]{8}'],
  'DD/MM/YYYY': ['%d/%m/%Y', '[0-9]{1,2}/[0-9]{1,2}/[0-9]{4}'],
  'MM/DD/YYYY': ['%m/%d/%Y', '[0-9]{1,2}/[0-9]{1,2}/[0-9]{4}'],
  'DD.MM.YYYY': ['%d.%m.%Y', '[0-9]{1,2}[.][0-9]{1,2}[.][0-9]{4}'],
  'DD-MM-YYYY': ['%d-%m-%Y', '[0-9]{1,2}-[0-9]{1,2}-[0-9]{4}'],
  'MM-DD-YYYY': ['%m-%d-%Y', '[0-9]{1,2}-[0-9]{1,2}-[0-9]{4}'],
  'DD-MMM-YYYY': ['%d-%b-%Y', '[0-9]{1,2}-[A-Za-z]{3}-[0-9]{4}'],
  'DD MMM YYYY': ['%d %b %Y', '[0-9]{1,2} [A-Za-z]{3} [0-9]{4}'],
};

/** Days from the day that a spreadsheet counts as 0 to 1970-01-01. */
const spreadsheetEpoch = 25_569;

/** Years of four digits alone: other calendars of the reader reach beyond what a day can be shown for. */
const datedByUs = (date: string): string =>
  `CASE WHEN (${date}) BETWEEN DATE '0001-01-01' AND DATE '9999-12-31' THEN (${date}) END`;

const dateOfText = (cell: string, format: WrittenDate): string => {
  if (format === 'YYYY-MM-DD') {
    // faster than the pattern, and held to the very text: alone the cast takes even signs among the digits
    const date = `TRY_CAST(${cell} AS DATE)`;
    return `CASE WHEN strlen(${cell}) = 10 AND CAST(${date} AS VARCHAR) = ${cell} THEN ${date} END`;
  }
  const [parse, shape] = patterns[format];
  const date = `CAST(try_strptime(${cell}, ${sqlText(parse)}) AS DATE)`;
  return datedByUs(`CASE WHEN regexp_full_match(${cell}, ${sqlText(shape)}) THEN ${date} END`);
};

const epoch = `DATE '1970-01-01'`;

/** The date of a cell, null where it is blank or no date in the format. */
export const dateSql = (column: SourceColumn, { dateFormat }: TextFormat): string => {
  const { cell, type } = column;
  if (isText(column)) {
    if (dateFormat !== 'spreadsheet number') return dateOfText(cell, dateFormat);
    const day = `TRY_CAST(${cell} AS INTEGER) - ${spreadsheetEpoch}`;
    return `CASE WHEN regexp_full_match(${cell}, '[0-9]{1,6}') THEN ${epoch} + (${day}) END`;
  }
  if (type === 'DATE') return datedByUs(cell);
  // an instant within a day is not a trading day
  if (type.startsWith('TIMESTAMP') && !type.endsWith('TIME ZONE')) {
    return datedByUs(
      `CASE WHEN isfinite(${cell}) AND date_trunc('day', ${cell}) = ${cell} THEN CAST(${cell} AS DATE) END`,
    );
  }
  return 'CAST(NULL AS DATE)';
};

/** The number of the day of a cell, null where it has no date. */
export const daySql = (column: SourceColumn, format: TextFormat): string =>
  `CAST((${dateSql(column, format)}) - ${epoch} AS INTEGER)`;

/** The number of a cell, null where it is blank or no number. Digits are never grouped. */
export const numberSql = (column: SourceColumn, decimalMark: DecimalMark): string => {
  const { cell } = column;
  if (!isText(column)) return `TRY_CAST(${cell} AS DOUBLE)`;
  return decimalMark === 'point'
    ? `CASE WHEN NOT contains(${cell}, '_') THEN TRY_CAST(${cell} AS DOUBLE) END`
    : `CASE WHEN NOT (contains(${cell}, '_') OR contains(${cell}, '.')) THEN TRY_CAST(replace(${cell}, ',', '.') AS DOUBLE) END`;
};

/** The cell as text, with the white space around it taken off; null where nothing is left. */
export const textSql = ({ cell, type }: SourceColumn): string => {
  const text = type === 'VARCHAR' ? cell : `CAST(${cell} AS VARCHAR)`;
  return `nullif(trim(${text}), '')`;
};

/** The text of a cell that is not blank and yet could not be read; null else. */
export const unreadTextSql = (column: SourceColumn, readSql: string): string =>
  `CASE WHEN (${readSql}) IS NULL THEN ${textSql(column)} END`;
