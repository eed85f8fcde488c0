import { type SortedColumns, sharedInts } from './sortRows.ts';

/**
 * The columns without the tickers that are left out and without repeated days, in the same memory: rows only move
 * towards the start. Nothing is moved where nothing is left out.
 */
export const compact = (columns: SortedColumns, leftOut: ReadonlySet<string>): SortedColumns => {
  const { days, closes } = columns;
  const tickers = columns.tickers.filter((ticker) => !leftOut.has(ticker));
  const starts = sharedInts(tickers.length + 1);
  let to = 0;
  let kept = 0;
  columns.tickers.forEach((ticker, place) => {
    if (leftOut.has(ticker)) return;
    const start = columns.starts[place] as number;
    const end = columns.starts[place + 1] as number;
    for (let from = start; from < end; from += 1) {
      if (from > start && days[from] === days[from - 1]) continue;
      if (to !== from) {
        days[to] = days[from] as number;
        closes[to] = closes[from] as number;
      }
      to += 1;
    }
    kept += 1;
    starts[kept] = to;
  });
  return { tickers, starts, days: days.subarray(0, to), closes: closes.subarray(0, to) };
};
