/// <reference lib="es2024.arraybuffer" />

/** Rows in the order of the files: the number of a ticker, a day and a close each. Only the first `count` rows count. */
export type RowBlock = {
  readonly tickerNumbers: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
  count: number;
};

const rowsPerBlock = 262_144;

export const makeBlock = (rows: number): RowBlock => ({
  tickerNumbers: new Int32Array(rows),
  days: new Int32Array(rows),
  closes: new Float64Array(rows),
  count: 0,
});

/** Where the run of rows of one ticker that starts at `from` ends. Files by ticker have long runs, files by day short ones. */
export const endOfRun = ({ tickerNumbers, count }: RowBlock, from: number): number => {
  const number = tickerNumbers[from];
  let end = from + 1;
  while (end < count && tickerNumbers[end] === number) end += 1;
  return end;
};

/** A run of rows of one ticker, by the row after its last. */
type Run = { readonly number: number; readonly end: number };

/** The runs of a block; null where there are more than `most`. */
const runsOf = (block: RowBlock, most: number): Run[] | null => {
  const runs: Run[] = [];
  for (let from = 0; from < block.count; ) {
    if (runs.length >= most) return null;
    const end = endOfRun(block, from);
    runs.push({ number: block.tickerNumbers[from] as number, end });
    from = end;
  }
  return runs;
};

type Numbers = Uint16Array | Int32Array | readonly Run[];

/** A block that was put away. Its ticker numbers are kept as runs where those are few, as in files by ticker. */
type PutAway = {
  readonly buffers: readonly ArrayBuffer[];
  readonly closes: Float64Array;
  readonly days: Int32Array;
  readonly numbers: Numbers;
};

/** Above this share of runs the numbers themselves take less room. */
const mostRuns = 1 / 64;
const mostShortNumbers = 65_536;

/** A buffer that can be given back at once, filled with what `source` holds. */
const bufferOf = (source: Int32Array | Uint16Array | Float64Array): ArrayBuffer => {
  const buffer = new ArrayBuffer(source.byteLength, { maxByteLength: source.byteLength });
  new Uint8Array(buffer).set(new Uint8Array(source.buffer, source.byteOffset, source.byteLength));
  return buffer;
};

const putAwayFrom = (block: RowBlock): PutAway => {
  const { count } = block;
  const closes = bufferOf(block.closes.subarray(0, count));
  const days = bufferOf(block.days.subarray(0, count));
  const views = { closes: new Float64Array(closes, 0, count), days: new Int32Array(days, 0, count) };
  const runs = runsOf(block, mostRuns * count);
  if (runs !== null) return { ...views, numbers: runs, buffers: [closes, days] };
  const numbers = block.tickerNumbers.subarray(0, count);
  if (numbers.every((number) => number < mostShortNumbers)) {
    const short = bufferOf(Uint16Array.from(numbers));
    return { ...views, numbers: new Uint16Array(short, 0, count), buffers: [closes, days, short] };
  }
  const whole = bufferOf(numbers);
  return { ...views, numbers: new Int32Array(whole, 0, count), buffers: [closes, days, whole] };
};

/** Brings a block back into `block` and gives its buffer up. */
const takeOut = ({ buffers, closes, days, numbers }: PutAway, block: RowBlock): void => {
  block.count = days.length;
  block.closes.set(closes);
  block.days.set(days);
  if (numbers instanceof Uint16Array || numbers instanceof Int32Array) block.tickerNumbers.set(numbers);
  else {
    let from = 0;
    for (const { number, end } of numbers) {
      block.tickerNumbers.fill(number, from, end);
      from = end;
    }
  }
  for (const buffer of buffers) buffer.resize(0);
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
  readonly addAll: (tickerNumbers: Int32Array, days: Int32Array, closes: Float64Array) => void;
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
  const current = makeBlock(rowsPerBlock);
  const putAway: PutAway[] = [];
  const countsPutAway: number[] = [];

  const makeRoom = (): void => {
    if (current.count < rowsPerBlock) return;
    putAway.push(putAwayFrom(current));
    addCounts(current, countsPutAway);
    current.count = 0;
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
  const counts: RowBlocks['counts'] = () => {
    const all = [...countsPutAway];
    addCounts(current, all);
    return all;
  };
  const takeAll: RowBlocks['takeAll'] = async (work) => {
    const scratch = makeBlock(rowsPerBlock);
    for (const block of putAway.splice(0)) {
      takeOut(block, scratch);
      await work(scratch);
    }
    await work(current);
    current.count = 0;
  };
  return { addAll, counts, takeAll };
};
