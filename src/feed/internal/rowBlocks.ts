/// <reference lib="es2024.arraybuffer" />

/** Rows in the order of the files: the number of a ticker, a day and a close each. Only the first `count` rows count. */
export type RowBlock = {
  readonly tickerNumbers: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
  count: number;
};

const rowsPerBlock = 262_144;
const bytesPerRow = 16;

const blockOn = (buffer: ArrayBuffer, rowCount: number): RowBlock => ({
  closes: new Float64Array(buffer, 0, rowCount),
  days: new Int32Array(buffer, 8 * rowCount, rowCount),
  tickerNumbers: new Int32Array(buffer, 12 * rowCount, rowCount),
  count: rowCount,
});

const copyRows = (from: RowBlock, to: RowBlock, rowCount: number): void => {
  to.closes.set(from.closes.subarray(0, rowCount));
  to.days.set(from.days.subarray(0, rowCount));
  to.tickerNumbers.set(from.tickerNumbers.subarray(0, rowCount));
  to.count = rowCount;
};

/** Where the run of rows of one ticker that starts at `from` ends. Files by ticker have long runs, files by day short ones. */
export const endOfRun = ({ tickerNumbers, count }: RowBlock, from: number): number => {
  const number = tickerNumbers[from];
  let end = from + 1;
  while (end < count && tickerNumbers[end] === number) end += 1;
  return end;
};

const addCounts = (block: RowBlock, counts: number[]): void => {
  for (let from = 0; from < block.count; ) {
    const end = endOfRun(block, from);
    const number = block.tickerNumbers[from] as number;
    counts[number] = (counts[number] ?? 0) + end - from;
    from = end;
  }
};

export type RowBlocks = {
  readonly add: (tickerNumber: number, day: number, close: number) => void;
  /** The same for many rows at once, of which every one is to be kept. */
  readonly addAll: (tickerNumbers: Int32Array, days: Int32Array, closes: Float64Array) => void;
  /** The row that was added last. */
  readonly last: () => { readonly tickerNumber: number; readonly day: number; readonly close: number } | null;
  /** How many rows each ticker has, by its number; absent for one without a row. */
  readonly counts: () => readonly number[];
  /** Every block in the order of the files, each given up as soon as it has been worked through. */
  readonly takeAll: (work: (block: RowBlock) => Promise<void>) => Promise<void>;
};

/**
 * Grows by blocks, so that nothing is copied to grow. A full block is put away in a buffer that can be given back at
 * once: the engine frees an ordinary one whenever it likes, and rows must not be held twice while they are sorted.
 */
export const makeRowBlocks = (): RowBlocks => {
  const current = blockOn(new ArrayBuffer(bytesPerRow * rowsPerBlock), rowsPerBlock);
  current.count = 0;
  const putAway: ArrayBuffer[] = [];
  const countsPutAway: number[] = [];

  const makeRoom = (): void => {
    if (current.count < rowsPerBlock) return;
    const byteLength = bytesPerRow * current.count;
    const buffer = new ArrayBuffer(byteLength, { maxByteLength: byteLength });
    copyRows(current, blockOn(buffer, current.count), current.count);
    putAway.push(buffer);
    addCounts(current, countsPutAway);
    current.count = 0;
  };
  const add: RowBlocks['add'] = (tickerNumber, day, close) => {
    makeRoom();
    const at = current.count;
    current.tickerNumbers[at] = tickerNumber;
    current.days[at] = day;
    current.closes[at] = close;
    current.count = at + 1;
  };
  const addAll: RowBlocks['addAll'] = (tickerNumbers, days, closes) => {
    for (let start = 0; start < days.length; ) {
      makeRoom();
      const end = Math.min(start + rowsPerBlock - current.count, days.length);
      current.tickerNumbers.set(tickerNumbers.subarray(start, end), current.count);
      current.days.set(days.subarray(start, end), current.count);
      current.closes.set(closes.subarray(start, end), current.count);
      current.count += end - start;
      start = end;
    }
  };
  const last: RowBlocks['last'] = () => {
    const at = current.count - 1;
    if (at < 0) return null;
    return {
      tickerNumber: current.tickerNumbers[at] as number,
      day: current.days[at] as number,
      close: current.closes[at] as number,
    };
  };
  const counts: RowBlocks['counts'] = () => {
    const all = [...countsPutAway];
    addCounts(current, all);
    return all;
  };
  const takeAll: RowBlocks['takeAll'] = async (work) => {
    const scratch = blockOn(new ArrayBuffer(bytesPerRow * rowsPerBlock), rowsPerBlock);
    for (const buffer of putAway.splice(0)) {
      copyRows(blockOn(buffer, buffer.byteLength / bytesPerRow), scratch, buffer.byteLength / bytesPerRow);
      buffer.resize(0);
      await work(scratch);
    }
    await work(current);
    current.count = 0;
  };
  return { add, addAll, last, counts, takeAll };
};
