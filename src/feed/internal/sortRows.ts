import { breathe } from './breathe.ts';
import { endOfRun, type RowBlock, type RowBlocks } from './rowBlocks.ts';

/** Row ranges by ticker: ticker i owns rows `starts[i]` to `starts[i + 1]`. */
export type SortedColumns = {
  readonly tickers: readonly string[];
  readonly starts: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
};

export const sharedInts = (length: number): Int32Array => new Int32Array(new SharedArrayBuffer(4 * length));
export const sharedDoubles = (length: number): Float64Array =>
  new Float64Array(new SharedArrayBuffer(8 * length));

/** Where a ticker's rows go on, in columns in which they began at `start`. */
type SortedRange = {
  readonly days: Int32Array;
  readonly closes: Float64Array;
  readonly start: number;
  readonly row: number;
};

/** Numbers of the names in the ascending order of their UTF-16 code units. */
const orderOf = (names: readonly string[]): number[] =>
  names
    .map((_, number) => number)
    .sort((first, second) => ((names[first] as string) < (names[second] as string) ? -1 : 1));

const placesOf = (order: readonly number[]): Int32Array => {
  const places = new Int32Array(order.length);
  order.forEach((number, place) => {
    places[number] = place;
  });
  return places;
};

const rangeStarts = (order: readonly number[], counts: readonly number[]): Int32Array => {
  const starts = sharedInts(order.length + 1);
  order.forEach((number, place) => {
    starts[place + 1] = (starts[place] as number) + (counts[number] ?? 0);
  });
  return starts;
};

/** Shorter runs are copied row by row, which is then faster. */
const shortRun = 16;

/** Copies a run of rows to where its ticker's rows go on; false where a day is before the one ahead of it. */
const copyRun = (block: RowBlock, from: number, end: number, to: SortedRange): boolean => {
  const { days, closes, row } = to;
  if (end - from > shortRun) {
    days.set(block.days.subarray(from, end), row);
    closes.set(block.closes.subarray(from, end), row);
  }
  let isOrdered = true;
  let previous = row > to.start ? (days[row - 1] as number) : Number.NEGATIVE_INFINITY;
  for (let at = from; at < end; at += 1) {
    const day = block.days[at] as number;
    if (end - from <= shortRun) {
      days[row + at - from] = day;
      closes[row + at - from] = block.closes[at] as number;
    }
    if (day < previous) isOrdered = false;
    previous = day;
  }
  return isOrdered;
};

/** Sorts one ticker's rows by day; rows of one day keep the order of the files. */
const sortRange = (days: Int32Array, closes: Float64Array): void => {
  const order = Array.from(days, (_, row) => row);
  order.sort((first, second) => (days[first] as number) - (days[second] as number) || first - second);
  const sortedDays = Int32Array.from(order, (row) => days[row] as number);
  closes.set(Float64Array.from(order, (row) => closes[row] as number));
  days.set(sortedDays);
};

/**
 * Columns in shared memory, by ticker and then by day. `names` are the tickers by their number in the rows. `onUnordered` is told of tickers whose days did not ascend.
 */
export const sortRows = async (
  names: readonly string[],
  rows: RowBlocks,
  onUnordered: (ticker: string) => void,
): Promise<SortedColumns> => {
  const order = orderOf(names);
  const places = placesOf(order);
  const starts = rangeStarts(order, rows.counts());
  const rowCount = starts[names.length] as number;
  const days = sharedInts(rowCount);
  const closes = sharedDoubles(rowCount);
  const next = Int32Array.from(starts);
  const unordered = new Set<number>();
  await rows.takeAll(async (block) => {
    for (let from = 0; from < block.count; ) {
      const end = endOfRun(block, from);
      const place = places[block.tickerNumbers[from] as number] as number;
      const row = next[place] as number;
      if (!copyRun(block, from, end, { days, closes, row, start: starts[place] as number }))
        unordered.add(place);
      next[place] = row + end - from;
      from = end;
    }
    await breathe();
  });
  const tickers = order.map((number) => names[number] as string);
  for (const place of unordered) {
    const from = starts[place] as number;
    const to = starts[place + 1] as number;
    sortRange(days.subarray(from, to), closes.subarray(from, to));
    onUnordered(tickers[place] as string);
    await breathe();
  }
  return { tickers, starts, days, closes };
};
