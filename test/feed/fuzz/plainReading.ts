import { dayFromDate, dayFromIso } from '../../../src/terms/day.ts';

/**
 * A second, plain reading of a CSV price file, written apart from the feed's own and as strict as can be: `null` where
 * the file is not one that can be read without doubt. What it reads of a row is the texts as they stand.
 */
export type PlainRow = {
  readonly ticker: string;
  readonly day: number | null;
  readonly price: number | null;
};

const recordsOf = (text: string, delimiter: string): string[][] | null => {
  const plainCell = new RegExp(`^[^${delimiter}\n]*`);
  const records: string[][] = [];
  let cells: string[] = [];
  let at = 0;
  while (at < text.length) {
    let cell: string;
    // white space before a quotation mark is let pass
    if (/^ *"/.test(text.slice(at))) {
      const end = /^ *"((?:[^"]|"")*)" */.exec(text.slice(at));
      if (end === null) return null;
      cell = (end[1] ?? '').replaceAll('""', '"');
      at += end[0].length;
    } else {
      const end = plainCell.exec(text.slice(at));
      cell = end?.[0] ?? '';
      at += cell.length;
    }
    cells.push(cell);
    if (text[at] === delimiter) {
      at += 1;
      if (at === text.length || text[at] === '\n') cells.push('');
    }
    if (at < text.length && text[at] !== '\n') {
      if (text[at - 1] !== delimiter) return null;
      continue;
    }
    at += 1;
    records.push(cells);
    cells = [];
  }
  return records.filter((record) => record.length > 1 || record[0] !== '');
};

const numberPattern = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

export type PlainFormat = {
  readonly delimiter: string;
  readonly day: (text: string) => number | null;
  readonly price: (text: string) => number | null;
};

const priceOf = (text: string): number | null =>
  numberPattern.test(text.trim()) ? Number(text.trim()) : null;

export const plainFormat: PlainFormat = { delimiter: ',', day: dayFromIso, price: priceOf };

/** Day before month with slashes, a decimal comma and a semicolon between the cells. */
export const dayFirstFormat: PlainFormat = {
  delimiter: ';',
  day: (text) => {
    const parts = /^(\d{1,2})\/(\d{1,2})\/(\d{4})$/.exec(text);
    return parts === null ? null : dayFromDate(Number(parts[3]), Number(parts[2]), Number(parts[1]));
  },
  price: (text) => (text.includes('.') ? null : priceOf(text.replaceAll(',', '.'))),
};

export const plainReading = (bytes: Buffer, format: PlainFormat): readonly PlainRow[] | null => {
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
  const records = recordsOf(text.replaceAll(/\r\n|\r/g, '\n'), format.delimiter);
  if (records === null || records.length === 0) return null;
  const [header = [], ...rows] = records;
  const titles = header.map((title) => title.trim());
  const places = ['date', 'ticker', 'close'].map((name) => titles.indexOf(name));
  // an empty cell too many at the end of a row takes nothing from the others
  const fits = (row: readonly string[]): boolean =>
    row.length === header.length || (row.length === header.length + 1 && row.at(-1) === '');
  if (places.includes(-1) || !rows.every(fits)) return null;
  return rows.map((row) => {
    const [date = '', ticker = '', close = ''] = places.map((place) => row[place] ?? '');
    return { ticker: ticker.replace(/^ +| +$/g, ''), day: format.day(date), price: format.price(close) };
  });
};
