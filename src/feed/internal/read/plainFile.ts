import type { FileReport } from '../../../terms/feedReport.ts';
import type { FileState } from '../../priceFiles.ts';
import type { FeedSettings } from '../../settings.ts';
import type { Collected } from './collected.ts';
import { findColumns } from './columnsNeeded.ts';
import { fileKindOf } from './fileKind.ts';
import { gunzippedPieces, pieceBytes, textPieces } from './pieces.ts';
import { type CellPlaces, type LineReader, makeLineReader } from './plainRows.ts';
import { cellsOfLine, delimiterOf } from './textLine.ts';

/** Whether files may be plain for all that the settings say of them. */
export const mayBePlain = ({ shape, columns, format }: FeedSettings): boolean =>
  shape === 'long' &&
  columns.adjustedClose === null &&
  columns.volume === null &&
  columns.currency === null &&
  format.dateFormat === 'YYYY-MM-DD' &&
  format.decimalMark === 'point';

const lineFeed = 0x0a;

/** Where the wanted cells of a row stand by the first line; null where that line is not plain or lacks one. */
const placesOf = (line: string, path: string, { columns, format }: FeedSettings): CellPlaces | null => {
  if (!/^[\t -~]+$/.test(line) || line.includes('"')) return null;
  const delimiter = delimiterOf[format.delimiter];
  const cells = cellsOfLine(line, delimiter).map((name, place) => ({
    name,
    cell: String(place),
    type: 'VARCHAR',
  }));
  const { date, ticker, close } = columns;
  const found = findColumns(path, cells, { date, ticker, price: close }, 'feed.columns');
  if (!found.ok) return null;
  return {
    date: Number(found.value.date.cell),
    ticker: Number(found.value.ticker.cell),
    price: Number(found.value.price.cell),
    count: cells.length,
    delimiter: delimiter.charCodeAt(0),
  };
};

/** Twice a piece: what is left of one and the whole of the next. No row of a plain file is longer than a piece. */
const makeRest = () => {
  const bytes = new Uint8Array(2 * pieceBytes);
  let length = 0;
  return {
    bytes,
    /** How many bytes there are with a piece added. */
    add: (piece: Uint8Array): number => {
      bytes.set(piece, length);
      length += piece.length;
      return length;
    },
    /** Drops what was read. False where more is left than may be. */
    drop: (upTo: number): boolean => {
      bytes.copyWithin(0, upTo, length);
      length -= upTo;
      return length <= pieceBytes;
    },
    isEmpty: () => length === 0,
  };
};

/** Adds the rows of all pieces; how many there are, none where anything is not plain. */
const readPieces = async (
  pieces: AsyncIterable<Uint8Array>,
  path: string,
  settings: FeedSettings,
  collected: Collected,
): Promise<number> => {
  const rest = makeRest();
  let lines: LineReader | null = null;
  for await (const piece of pieces) {
    let length = rest.add(piece);
    if (lines === null) {
      const end = rest.bytes.subarray(0, length).indexOf(lineFeed);
      const places =
        end < 0
          ? null
          : placesOf(Buffer.from(rest.bytes.subarray(0, end)).toString('latin1'), path, settings);
      if (places === null) return 0;
      lines = makeLineReader(places, collected);
      rest.drop(end + 1);
      length -= end + 1;
    }
    const upTo = lines.read(rest.bytes, length);
    if (upTo < 0 || !rest.drop(upTo)) return 0;
  }
  return lines !== null && rest.isEmpty() ? lines.rowCount() : 0;
};

/**
 * Reads a text file whose every row is plainly written: cells without quotation marks, of printable ASCII, the date and the price
 * in their simplest form, each line ended. Nothing else is looked into: at the first byte that is otherwise the answer is null, and
 * the file is one for the reader that knows every form.
 */
export const readPlainFile = async (
  { path, bytes }: FileState,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReport | null> => {
  const kind = fileKindOf(path);
  if (kind !== 'csv' && kind !== 'gz') return null;
  try {
    const pieces = kind === 'csv' ? textPieces(path) : gunzippedPieces(path);
    const rowCount = await readPieces(pieces, path, settings, collected);
    return rowCount > 0 ? { path, kind, bytes, rowCount } : null;
  } catch {
    // damaged or not to be opened: the other reader says how
    return null;
  }
};
