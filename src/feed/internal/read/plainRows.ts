import { type Collected, noTicker, numberOfCell } from './collected.ts';
import { makeDateReader, notPlain, readNumber } from './plainText.ts';
import { longestWordedText, makeWordTable } from './wordTable.ts';

/** Where the cells stand that are wanted of a row, counted from 0, and how many cells a row has. */
export type CellPlaces = {
  readonly date: number;
  readonly ticker: number;
  readonly price: number;
  readonly count: number;
  readonly delimiter: number;
};

const [lineFeed, quotationMark, space, tilde] = [0x0a, 0x22, 0x20, 0x7e];

/** Reads the number of the ticker that some bytes name; below zero where they name none. */
const makeTickerReader = (collected: Collected) => {
  const table = makeWordTable();
  const words = new Int32Array(3);
  const wordBytes = new Uint8Array(words.buffer);
  const last = new Int32Array(4).fill(-1);
  let lastNumber = noTicker;
  const textOf = (bytes: Uint8Array, start: number, end: number): string =>
    String.fromCharCode(...bytes.subarray(start, end));
  return (bytes: Uint8Array, start: number, end: number): number => {
    const length = end - start;
    if (length > longestWordedText) return numberOfCell(textOf(bytes, start, end), collected);
    words.fill(0);
    for (let at = 0; at < length; at += 1) wordBytes[at] = bytes[start + at] as number;
    const first = words[0] as number;
    const second = words[1] as number;
    const third = words[2] as number;
    const isLast = length === last[0] && first === last[1] && second === last[2] && third === last[3];
    if (isLast) return lastNumber;
    const known = table.get(length, first, second, third);
    lastNumber = known ?? numberOfCell(textOf(bytes, start, end), collected);
    if (known === null) table.add(length, first, second, third, lastNumber);
    last.set([length, first, second, third]);
    return lastNumber;
  };
};

export type LineReader = {
  /** Adds the rows of whole lines; where the line begins that is not whole yet, or −1 at the first row that is not plain. */
  readonly read: (bytes: Uint8Array, length: number) => number;
  readonly rowCount: () => number;
};

export const makeLineReader = (places: CellPlaces, collected: Collected): LineReader => {
  const { date, ticker, price, count, delimiter } = places;
  const readDate = makeDateReader();
  const readTicker = makeTickerReader(collected);
  // cell i stands from bounds[i] to before bounds[i + 1] − 1, where a delimiter or the line end is
  const bounds = new Int32Array(count + 1);
  let rowCount = 0;

  const addRow = (bytes: Uint8Array): boolean => {
    const day = readDate(bytes, bounds[date] as number, (bounds[date + 1] as number) - 1);
    const close = readNumber(bytes, bounds[price] as number, (bounds[price + 1] as number) - 1);
    const number = readTicker(bytes, bounds[ticker] as number, (bounds[ticker + 1] as number) - 1);
    if (day === notPlain || !(close > 0) || number < 0) return false;
    collected.add(number, day, close);
    rowCount += 1;
    return true;
  };
  const read: LineReader['read'] = (bytes, length) => {
    let cell = 0;
    bounds[0] = 0;
    for (let at = 0; at < length; at += 1) {
      const byte = bytes[at] as number;
      if (byte === delimiter) {
        cell += 1;
        if (cell === count) return -1;
        bounds[cell] = at + 1;
      } else if (byte === lineFeed) {
        if (cell !== count - 1) return -1;
        bounds[count] = at + 1;
        if (!addRow(bytes)) return -1;
        cell = 0;
        bounds[0] = at + 1;
      } else if (byte < space || byte > tilde || byte === quotationMark) return -1;
    }
    return bounds[0] as number;
  };
  return { read, rowCount: () => rowCount };
};
