import { createHash } from 'node:crypto';
import { breathe, rowsPerBreath } from './breathe.ts';
import type { SortedColumns } from './sortRows.ts';

/**
 * Hex SHA-256 of the values in their sorted order, whatever file they came from: the tickers as JSON, then the row
 * ranges, the days and the closes as little-endian bytes.
 */
export const fingerprintOf = async ({ tickers, starts, days, closes }: SortedColumns): Promise<string> => {
  const hash = createHash('sha256').update(JSON.stringify(tickers)).update(starts);
  for (const column of [days, closes]) {
    for (let start = 0; start < column.length; start += rowsPerBreath) {
      hash.update(column.subarray(start, start + rowsPerBreath));
      await breathe();
    }
  }
  return hash.digest('hex');
};
