/** How dates may be written in a text file, by the name a desk chooses in its settings. Nothing else is tried. */
export const dateFormats = [
  'YYYY-MM-DD',
  'YYYY/MM/DD',
  'YYYYMMDD',
  'DD/MM/YYYY',
  'MM/DD/YYYY',
  'DD.MM.YYYY',
  'DD-MM-YYYY',
  'MM-DD-YYYY',
  'DD-MMM-YYYY',
  'DD MMM YYYY',
  'spreadsheet number',
] as const;
export type DateFormat = (typeof dateFormats)[number];

export const delimiters = ['comma', 'semicolon', 'tab'] as const;
export type Delimiter = (typeof delimiters)[number];

export const decimalMarks = ['point', 'comma'] as const;
export type DecimalMark = (typeof decimalMarks)[number];

/** How a text file is written. Parquet files carry their own types and need none of it. */
export type TextFormat = {
  readonly delimiter: Delimiter;
  readonly decimalMark: DecimalMark;
  readonly dateFormat: DateFormat;
};
