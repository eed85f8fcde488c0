import type { Day } from '../terms/day.ts';
import type { PriceFlag, PriceMeaning, PriceSeries, PriceSnapshot } from '../terms/prices.ts';

/**
 * Everything a snapshot is made of, as plain data: it can be posted to a worker thread, which then sees the same
 * memory without a copy. Row ranges: ticker i owns rows `starts[i]` to `starts[i + 1]`, its days ascend strictly.
 */
export type SnapshotColumns = {
  readonly fingerprint: string;
  /** In ascending order of their UTF-16 code units. */
  readonly tickers: readonly string[];
  readonly starts: Int32Array;
  readonly days: Int32Array;
  readonly closes: Float64Array;
  readonly meanings: readonly PriceMeaning[];
  readonly flags: readonly (readonly PriceFlag[])[];
  readonly quarantined: ReadonlyMap<string, string>;
  readonly lastDay: Day;
};

const placeOf = (tickers: readonly string[], ticker: string): number => {
  let low = 0;
  let high = tickers.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((tickers[middle] as string) < ticker) low = middle + 1;
    else high = middle;
  }
  return tickers[low] === ticker ? low : -1;
};

/** The snapshot over columns, in whichever thread they have arrived; it knows them, so that it can be handed on. */
export const snapshotFromColumns = (
  columns: SnapshotColumns,
): PriceSnapshot & { readonly columns: SnapshotColumns } => {
  const { tickers, starts, days, closes, meanings, flags } = columns;
  const series = (ticker: string): PriceSeries | null => {
    const place = placeOf(tickers, ticker);
    const meaning = meanings[place];
    if (meaning === undefined) return null;
    const start = starts[place] as number;
    const end = starts[place + 1] as number;
    return {
      ticker,
      days: days.subarray(start, end),
      closes: closes.subarray(start, end),
      meaning,
      flags: flags[place] ?? [],
    };
  };
  return {
    fingerprint: columns.fingerprint,
    tickers,
    lastDay: columns.lastDay,
    series,
    quarantined: columns.quarantined,
    columns,
  };
};
