import type { RowBlock } from './rowBlocks.ts';

export type SortedColumns = {
  readonly tickers: readonly string[];
  readonly starts: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
};

/** Places of the tickers in ascending order of their code units: `rank[number]` is the place of a ticker's number. */
const rankOf = (names: readonly string[]): Int32Array => {
  const order = names.map((_, number) => number);
  order.sort((first, second) => ((names[first] as string) < (names[second] as string) ? -1 : 1));
  const rank = new Int32Array(names.length);
  order.forEach((number, place) => {
    rank[number] = place;
  });
  return rank;
};

const ascends = (days: Int32Array, start: number, end: number): boolean => {
  for (let row = start + 1; row < end; row += 1) {
    if ((days[row] as number) < (days[row - 1] as number)) return false;
  }
  return true;
};

/** Sorts one ticker's rows by day; rows of one day keep the order of the file. */
const sortRange = (days: Int32Array, closes: Float64Array, start: number, end: number): void => {
  const order = Array.from({ length: end - start }, (_, place) => start + place);
  order.sort((first, second) => (days[first] as number) - (days[second] as number) || first - second);
  const sortedDays = Int32Array.from(order, (row) => days[row] as number);
  const sortedCloses = Float64Array.from(order, (row) => closes[row] as number);
  days.set(sortedDays, start);
  closes.set(sortedCloses, start);
};

/** Columns in shared memory, by ticker and then by day. `names` are the tickers by their number in the blocks. */
export const sortRows = (names: readonly string[], blocks: readonly RowBlock[]): SortedColumns => {
  const rank = rankOf(names);
  const starts = new Int32Array(new SharedArrayBuffer(4 * (names.length + 1)));
  for (const { tickerNumbers, count } of blocks) {
    for (let at = 0; at < count; at += 1) {
      const place = rank[tickerNumbers[at] as number] as number;
      starts[place + 1] = (starts[place + 1] as number) + 1;
    }
  }
  for (let place = 0; place < names.length; place += 1) {
    starts[place + 1] = (starts[place + 1] as number) + (starts[place] as number);
  }
  const rowCount = starts[names.length] as number;
  const days = new Int32Array(new SharedArrayBuffer(4 * rowCount));
  const closes = new Float64Array(new SharedArrayBuffer(8 * rowCount));
  const next = starts.slice();
  for (const block of blocks) {
    for (let at = 0; at < block.count; at += 1) {
      const place = rank[block.tickerNumbers[at] as number] as number;
      const row = next[place] as number;
      days[row] = block.days[at] as number;
      closes[row] = block.closes[at] as number;
      next[place] = row + 1;
    }
  }
  for (let place = 0; place < names.length; place += 1) {
    const start = starts[place] as number;
    const end = starts[place + 1] as number;
    if (!ascends(days, start, end)) sortRange(days, closes, start, end);
  }
  return { tickers: [...names].sort((first, second) => (first < second ? -1 : 1)), starts, days, closes };
};
