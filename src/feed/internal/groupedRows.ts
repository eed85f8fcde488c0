/// <reference lib="es2024.sharedmemory" />
import { endOfRun, type RowBlock } from './rowBlocks.ts';
import type { Rows } from './sortedColumns.ts';

/** Room is reserved, not taken: memory is used as far as rows are written. Buffers of the engine cannot be much larger. */
const mostRows = 500_000_000;
const rowsPerStep = 1_048_576;

/** The rows of one ticker: from `start` to before `end`. */
export type RowRange = { readonly start: number; readonly end: number };

/** Rows of files that have all rows of a ticker together, written once, to where they stay. */
export type GroupedRows = {
  /** False, with nothing appended, where a ticker comes again after another one. */
  readonly append: (block: RowBlock) => boolean;
  readonly columns: () => Rows;
  /** Ranges by the number of the ticker; absent for one without a row. */
  readonly ranges: readonly (RowRange | undefined)[];
};

const reserve = () => {
  try {
    return {
      days: new SharedArrayBuffer(0, { maxByteLength: 4 * mostRows }),
      closes: new SharedArrayBuffer(0, { maxByteLength: 8 * mostRows }),
    };
  } catch {
    return null;
  }
};

/** null where the machine does not let so much room be reserved. */
export const makeGroupedRows = (): GroupedRows | null => {
  const room = reserve();
  if (room === null) return null;
  const ranges: (RowRange | undefined)[] = [];
  let count = 0;
  let lastNumber = -1;

  const viewOf = (start: number, end: number): Rows => ({
    days: new Int32Array(room.days, 4 * start, end - start),
    closes: new Float64Array(room.closes, 8 * start, end - start),
  });
  const makeRoomFor = (rowCount: number): void => {
    const rows = Math.ceil(rowCount / rowsPerStep) * rowsPerStep;
    if (8 * rows <= room.closes.byteLength) return;
    room.days.grow(4 * rows);
    room.closes.grow(8 * rows);
  };
  /** The ranges that a block’s rows come to; null where they are not grouped. */
  const rangesOf = (block: RowBlock): Map<number, RowRange> | null => {
    const added = new Map<number, RowRange>();
    let previous = lastNumber;
    for (let from = 0; from < block.count; ) {
      const end = endOfRun(block, from);
      const number = block.tickerNumbers[from] as number;
      const before = ranges[number];
      if (number !== previous && (before !== undefined || added.has(number))) return null;
      const start = number === previous ? (before?.start ?? count) : count + from;
      added.set(number, { start, end: count + end });
      previous = number;
      from = end;
    }
    return added;
  };
  const append: GroupedRows['append'] = (block) => {
    if (count + block.count > mostRows) return false;
    const added = rangesOf(block);
    if (added === null) return false;
    makeRoomFor(count + block.count);
    const { days, closes } = viewOf(count, count + block.count);
    days.set(block.days.subarray(0, block.count));
    closes.set(block.closes.subarray(0, block.count));
    for (const [number, range] of added) {
      ranges[number] = range;
      lastNumber = number;
    }
    count += block.count;
    return true;
  };
  return { append, columns: () => viewOf(0, count), ranges };
};
