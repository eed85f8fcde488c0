import { type GroupedRows, makeGroupedRows } from './groupedRows.ts';
import { makeBlock, makeRowBlocks, type RowBlock, type RowBlocks } from './rowBlocks.ts';

/** Rows as they were gathered: in place where every ticker has its rows together, else to be brought together. */
export type StoredRows =
  | { readonly kind: 'grouped'; readonly rows: GroupedRows }
  | { readonly kind: 'scattered'; readonly blocks: RowBlocks };

export type LastRow = { readonly tickerNumber: number; readonly day: number; readonly close: number };

export type RowStore = {
  readonly add: (tickerNumber: number, day: number, close: number) => void;
  /** The same for many rows at once, of which every one is to be kept. */
  readonly addAll: (tickerNumbers: Int32Array, days: Int32Array, closes: Float64Array) => void;
  /** The row that was added last. */
  readonly last: () => LastRow | null;
  /** All rows. None may be added afterwards. */
  readonly rows: () => StoredRows;
};

/** The same rows in blocks, in the same order. */
const scatter = ({ ranges, columns }: GroupedRows): RowBlocks => {
  const blocks = makeRowBlocks();
  const { days, closes } = columns();
  const inOrder = ranges
    .flatMap((range, number) => (range === undefined ? [] : [{ ...range, number }]))
    .sort((first, second) => first.start - second.start);
  for (const { number, start, end } of inOrder) {
    const numbers = new Int32Array(end - start).fill(number);
    blocks.addAll(numbers, days.subarray(start, end), closes.subarray(start, end));
  }
  return blocks;
};

const lastOf = ({ tickerNumbers, days, closes, count }: RowBlock): LastRow => ({
  tickerNumber: tickerNumbers[count - 1] as number,
  day: days[count - 1] as number,
  close: closes[count - 1] as number,
});

const rowsWaiting = 4096;

/** Takes rows for grouped for as long as they are. */
export const makeRowStore = (): RowStore => {
  let grouped = makeGroupedRows();
  let blocks = makeRowBlocks();
  const waiting = makeBlock(rowsWaiting);
  let lastRow: LastRow | null = null;

  const addBlock = (block: RowBlock): void => {
    const { tickerNumbers, days, closes, count } = block;
    if (count === 0) return;
    lastRow = lastOf(block);
    if (grouped?.append(block) === true) return;
    if (grouped !== null) {
      blocks = scatter(grouped);
      grouped = null;
    }
    blocks.addAll(tickerNumbers.subarray(0, count), days.subarray(0, count), closes.subarray(0, count));
  };
  const addWaiting = (): void => {
    addBlock(waiting);
    waiting.count = 0;
  };
  const add: RowStore['add'] = (tickerNumber, day, close) => {
    if (waiting.count === rowsWaiting) addWaiting();
    const at = waiting.count;
    waiting.tickerNumbers[at] = tickerNumber;
    waiting.days[at] = day;
    waiting.closes[at] = close;
    waiting.count = at + 1;
  };
  return {
    add,
    addAll: (tickerNumbers, days, closes) => {
      addWaiting();
      addBlock({ tickerNumbers, days, closes, count: days.length });
    },
    last: () => {
      addWaiting();
      return lastRow;
    },
    rows: () => {
      addWaiting();
      return grouped === null ? { kind: 'scattered', blocks } : { kind: 'grouped', rows: grouped };
    },
  };
};
