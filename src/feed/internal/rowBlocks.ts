/** Rows in the order of the file: a ticker's number, a day and a close each. Grows by blocks, so nothing is copied to grow. */
export type RowBlock = {
  readonly tickerNumbers: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
  count: number;
};

const rowsPerBlock = 262_144;

const newBlock = (): RowBlock => ({
  tickerNumbers: new Int32Array(rowsPerBlock),
  days: new Int32Array(rowsPerBlock),
  closes: new Float64Array(rowsPerBlock),
  count: 0,
});

export type RowBlocks = {
  readonly blocks: RowBlock[];
  readonly add: (tickerNumber: number, day: number, close: number) => void;
  /** The same for many rows at once, of which every one is to be kept. */
  readonly addAll: (tickerNumbers: Int32Array, days: Int32Array, closes: Float64Array) => void;
};

export const makeRowBlocks = (): RowBlocks => {
  const blocks: RowBlock[] = [];
  let last = newBlock();
  const withRoom = (): RowBlock => {
    if (last.count === rowsPerBlock) last = newBlock();
    if (last.count === 0) blocks.push(last);
    return last;
  };
  const add: RowBlocks['add'] = (tickerNumber, day, close) => {
    const block = withRoom();
    const at = block.count;
    block.tickerNumbers[at] = tickerNumber;
    block.days[at] = day;
    block.closes[at] = close;
    block.count = at + 1;
  };
  const addAll: RowBlocks['addAll'] = (tickerNumbers, days, closes) => {
    for (let start = 0; start < days.length; ) {
      const block = withRoom();
      const end = Math.min(start + rowsPerBlock - block.count, days.length);
      block.tickerNumbers.set(tickerNumbers.subarray(start, end), block.count);
      block.days.set(days.subarray(start, end), block.count);
      block.closes.set(closes.subarray(start, end), block.count);
      block.count += end - start;
      start = end;
    }
  };
  return { blocks, add, addAll };
};
