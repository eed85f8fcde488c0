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
};

export const makeRowBlocks = (): RowBlocks => {
  const blocks: RowBlock[] = [];
  let last: RowBlock | null = null;
  const add = (tickerNumber: number, day: number, close: number): void => {
    if (last === null || last.count === rowsPerBlock) {
      last = newBlock();
      blocks.push(last);
    }
    const at = last.count;
    last.tickerNumbers[at] = tickerNumber;
    last.days[at] = day;
    last.closes[at] = close;
    last.count = at + 1;
  };
  return { blocks, add };
};
