import type { Day } from '../terms/day.ts';
import type { PriceFlag, PriceMeaning, PriceSeries, PriceSnapshot } from '../terms/prices.ts';
import { rowsOf, type SortedColumns } from './internal/sortedColumns.ts';

/**
 * Everything a snapshot is made of, as plain data: it can be posted to a worker thread, which then sees the same
 * memory without a copy. Every ticker's days ascend strictly.
 */
export type SnapshotColumns = SortedColumns & {
  readonly fingerprint: string;
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
  const { tickers, meanings, flags } = columns;
  const series = (ticker: string): PriceSeries | null => {
    const place = placeOf(tickers, ticker);
    const meaning = meanings[place];
    if (meaning === undefined) return null;
    return { ticker, ...rowsOf(columns, place), meaning, flags: flags[place] ?? [] };
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
