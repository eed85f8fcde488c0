import { readFileSync } from 'node:fs';
import { gzipSync } from 'node:zlib';
import type { Database } from '../../src/feed/internal/read/database.ts';

/** The same prices as a long CSV file in every other form; `path` makes the name of each. */
export const writeFormats = async (
  database: Database,
  longCsvPath: string,
  path: (name: string) => string,
  write: (name: string, content: string | Uint8Array) => string,
): Promise<void> => {
  write('gz/prices.csv.gz', gzipSync(readFileSync(longCsvPath)));
  const rows = `read_csv('${longCsvPath}', header = true, columns = {'date': 'DATE', 'ticker': 'VARCHAR', 'close': 'DOUBLE'})`;
  const wide = `(PIVOT ${rows} ON ticker USING first(close) ORDER BY date)`;
  await database(async (connection) => {
    const copy = (from: string, name: string, how: string) =>
      connection.run(`COPY (SELECT * FROM ${from}) TO '${path(name)}' (${how})`);
    await copy(rows, 'zst/prices.csv.zst', 'FORMAT csv, HEADER, COMPRESSION zstd');
    await copy(rows, 'parquet/prices.parquet', 'FORMAT parquet');
    await copy(wide, 'wide/prices.csv', 'FORMAT csv, HEADER');
    await copy(wide, 'widezst/prices.csv.zst', 'FORMAT csv, HEADER, COMPRESSION zstd');
    await copy(wide, 'wideparquet/prices.parquet', 'FORMAT parquet');
    for (const year of [2023, 2024, 2025, 2026]) {
      const ofYear = `(SELECT * FROM ${rows} WHERE year(date) = ${year})`;
      const how = year % 2 === 0 ? 'FORMAT parquet' : 'FORMAT csv, HEADER';
      await copy(ofYear, `years/prices-${year}.${year % 2 === 0 ? 'parquet' : 'csv'}`, how);
    }
  });
};
