import { createHash } from 'node:crypto';
import { breathe, rowsPerBreath } from './breathe.ts';
import { rowsOf, type SortedColumns } from './sortedColumns.ts';

/** Where each ticker's rows start, and the last one's end, were they one after the other in the order of the tickers. */
const startsInOrder = ({ tickers, starts, ends }: SortedColumns): Int32Array => {
  const inOrder = new Int32Array(tickers.length + 1);
  for (const place of tickers.keys()) {
    const count = (ends[place] as number) - (starts[place] as number);
    inOrder[place + 1] = (inOrder[place] as number) + count;
  }
  return inOrder;
};

/**
 * Hex SHA-256 of the values in their sorted order, whatever file they came from and wherever its rows lie: the
 * tickers as JSON, then the row ranges, the days and the closes as little-endian bytes.
 */
export const fingerprintOf = async (columns: SortedColumns): Promise<string> => {
  const { tickers } = columns;
  const hash = createHash('sha256').update(JSON.stringify(tickers)).update(startsInOrder(columns));
  for (const column of ['days', 'closes'] as const) {
    let sinceBreath = 0;
    for (const place of tickers.keys()) {
      const rows = rowsOf(columns, place)[column];
      hash.update(rows);
      sinceBreath += rows.length;
      if (sinceBreath < rowsPerBreath) continue;
      sinceBreath = 0;
      await breathe();
    }
  }
  return hash.digest('hex');
};
