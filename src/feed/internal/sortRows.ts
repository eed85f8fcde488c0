import { breathe } from './breathe.ts';
import type { GroupedRows, RowRange } from './groupedRows.ts';
import { endOfRun, type RowBlock, type RowBlocks } from './rowBlocks.ts';
import type { StoredRows } from './rowStore.ts';
import { rowsOf, type SortedColumns, sharedDoubles, sharedInts } from './sortedColumns.ts';

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

type Ranges = Pick<SortedColumns, 'starts' | 'ends'>;

/** The range that each ticker of the order has, by its number. */
const rangesBy = (order: readonly number[], rangeOf: (number: number) => RowRange): Ranges => {
  const ranges = order.map(rangeOf);
  const starts = sharedInts(order.length);
  const ends = sharedInts(order.length);
  starts.set(ranges.map(({ start }) => start));
  ends.set(ranges.map(({ end }) => end));
  return { starts, ends };
};

/** Ranges one after the other. */
const rangesInOrder = (order: readonly number[], counts: readonly number[]): Ranges => {
  let row = 0;
  return rangesBy(order, (number) => {
    const start = row;
    row += counts[number] ?? 0;
    return { start, end: row };
  });
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

type Unsorted = Omit<SortedColumns, 'tickers'>;

/** Copies scattered rows to where they belong. The places of tickers whose days do not ascend are added to `unordered`. */
const gather = async (
  order: readonly number[],
  blocks: RowBlocks,
  unordered: Set<number>,
): Promise<Unsorted> => {
  const places = placesOf(order);
  const { starts, ends } = rangesInOrder(order, blocks.counts());
  const rowCount = ends.at(-1) ?? 0;
  const days = sharedInts(rowCount);
  const closes = sharedDoubles(rowCount);
  const next = Int32Array.from(starts);
  await blocks.takeAll(async (block) => {
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
  return { starts, ends, days, closes };
};

const ascends = (days: Int32Array): boolean => {
  for (let row = 1; row < days.length; row += 1) {
    if ((days[row] as number) < (days[row - 1] as number)) return false;
  }
  return true;
};

const tickersPerBreath = 64;

/** Leaves grouped rows where they are. */
const leave = async (
  order: readonly number[],
  { ranges, columns }: GroupedRows,
  unordered: Set<number>,
): Promise<Unsorted> => {
  const left = { ...rangesBy(order, (number) => ranges[number] ?? noRows), ...columns() };
  for (const place of order.keys()) {
    if (!ascends(rowsOf(left, place).days)) unordered.add(place);
    if (place % tickersPerBreath === 0) await breathe();
  }
  return left;
};

const noRows: RowRange = { start: 0, end: 0 };

/**
 * Columns in shared memory, every ticker's rows by day. `names` are the tickers by their number in the rows.
 * `onUnordered` is told of tickers whose days did not ascend.
 */
export const sortRows = async (
  names: readonly string[],
  stored: StoredRows,
  onUnordered: (ticker: string) => void,
): Promise<SortedColumns> => {
  const order = orderOf(names);
  const unordered = new Set<number>();
  const columns =
    stored.kind === 'grouped'
      ? await leave(order, stored.rows, unordered)
      : await gather(order, stored.blocks, unordered);
  const tickers = order.map((number) => names[number] as string);
  for (const place of unordered) {
    const { days, closes } = rowsOf(columns, place);
    sortRange(days, closes);
    onUnordered(tickers[place] as string);
    await breathe();
  }
  return { tickers, ...columns };
};
