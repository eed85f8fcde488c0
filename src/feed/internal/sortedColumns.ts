/** Rows by ticker: ticker i owns rows `starts[i]` to `ends[i]`. The ranges may lie in any order, with gaps between them. */
export type SortedColumns = {
  /** In ascending order of their UTF-16 code units. */
  readonly tickers: readonly string[];
  readonly starts: Int32Array;
  readonly ends: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
};

export const sharedInts = (length: number): Int32Array => new Int32Array(new SharedArrayBuffer(4 * length));
export const sharedDoubles = (length: number): Float64Array =>
  new Float64Array(new SharedArrayBuffer(8 * length));

export type Rows = { readonly days: Int32Array; readonly closes: Float64Array };

/** The days and closes of one ticker, in the same memory. */
export const rowsOf = (
  { starts, ends, days, closes }: Omit<SortedColumns, 'tickers'>,
  place: number,
): Rows => {
  const start = starts[place] as number;
  const end = ends[place] as number;
  return { days: days.subarray(start, end), closes: closes.subarray(start, end) };
};
