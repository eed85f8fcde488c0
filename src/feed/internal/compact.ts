import { type Rows, rowsOf, type SortedColumns, sharedInts } from './sortedColumns.ts';

/** Moves a ticker's rows together so that no day stands twice; how many rows remain. */
const dropRepeatedDays = ({ days, closes }: Rows): number => {
  let to = 0;
  for (let from = 0; from < days.length; from += 1) {
    if (to > 0 && days[from] === days[to - 1]) continue;
    days[to] = days[from] as number;
    closes[to] = closes[from] as number;
    to += 1;
  }
  return to;
};

/** The columns without the tickers that are left out and without repeated days, in the same memory. */
export const compact = (
  columns: SortedColumns,
  leftOut: ReadonlySet<string>,
  withRepeatedDays: ReadonlySet<string>,
): SortedColumns => {
  const kept = [...columns.tickers.entries()].filter(([, ticker]) => !leftOut.has(ticker));
  const starts = sharedInts(kept.length);
  const ends = sharedInts(kept.length);
  for (const [at, [place, ticker]] of kept.entries()) {
    const start = columns.starts[place] as number;
    const rows = rowsOf(columns, place);
    starts[at] = start;
    ends[at] = start + (withRepeatedDays.has(ticker) ? dropRepeatedDays(rows) : rows.days.length);
  }
  return { ...columns, tickers: kept.map(([, ticker]) => ticker), starts, ends };
};
