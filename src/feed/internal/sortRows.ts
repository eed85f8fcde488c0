import { breathe } from './breathe.ts';
import type { RowBlock } from './rowBlocks.ts';

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

const rangeStarts = (places: Int32Array, blocks: readonly RowBlock[]): Int32Array => {
  const starts = sharedInts(places.length + 1);
  for (const { tickerNumbers, count } of blocks) {
    for (let at = 0; at < count; at += 1) {
      const next = (places[tickerNumbers[at] as number] as number) + 1;
      starts[next] = (starts[next] as number) + 1;
    }
  }
  for (let place = 1; place < starts.length; place += 1) {
    starts[place] = (starts[place] as number) + (starts[place - 1] as number);
  }
  return starts;
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
 * Columns in shared memory, by ticker and then by day. `names` are the tickers by their number in the blocks; the
 * blocks are let go one by one, so that rows are never held twice. `onUnordered` is told of tickers whose days did not ascend.
 */
export const sortRows = async (
  names: readonly string[],
  blocks: RowBlock[],
  onUnordered: (ticker: string) => void,
): Promise<SortedColumns> => {
  const order = orderOf(names);
  const places = placesOf(order);
  const starts = rangeStarts(places, blocks);
  const rowCount = starts[names.length] as number;
  const days = sharedInts(rowCount);
  const closes = sharedDoubles(rowCount);
  const next = Int32Array.from(starts);
  const unordered = new Set<number>();
  for (let block = blocks.shift(); block !== undefined; block = blocks.shift()) {
    for (let at = 0; at < block.count; at += 1) {
      const place = places[block.tickerNumbers[at] as number] as number;
      const row = next[place] as number;
      const day = block.days[at] as number;
      days[row] = day;
      closes[row] = block.closes[at] as number;
      next[place] = row + 1;
      if (row > (starts[place] as number) && day < (days[row - 1] as number)) unordered.add(place);
    }
    await breathe();
  }
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
