import { gzipSync } from 'node:zlib';
import fc from 'fast-check';
import { afterAll, expect, test } from 'vitest';
import { makeCollected, type ReadFiles } from '../../../src/feed/internal/read/collected.ts';
import { openDatabase } from '../../../src/feed/internal/read/database.ts';
import { mayBePlain, readPlainFile } from '../../../src/feed/internal/read/plainFile.ts';
import { readQueriedFiles } from '../../../src/feed/internal/read/queriedFiles.ts';
import { rowsOf } from '../../../src/feed/internal/sortedColumns.ts';
import { sortRows } from '../../../src/feed/internal/sortRows.ts';
import { listPriceFiles } from '../../../src/feed/priceFiles.ts';
import type { FeedSettings } from '../../../src/feed/settings.ts';
import { accepted, head, longCsv, temporaryFolder } from '../settingsForTests.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

const readPlain = async (settings: FeedSettings): Promise<ReadFiles | null> => {
  const [file] = await listPriceFiles(settings.path);
  if (file === undefined) throw new Error('the test has no file');
  const collected = makeCollected();
  const report = await readPlainFile(file, settings, collected);
  return report === null ? null : { files: [report], collected };
};

/** Everything a reading came to: reports, findings and every row by its ticker. */
const contentOf = async ({ files, collected }: ReadFiles) => {
  const unordered: string[] = [];
  const columns = await sortRows(collected.names, collected.rows(), (ticker) => unordered.push(ticker));
  const rows = columns.tickers.map((ticker, place) => {
    const { days, closes } = rowsOf(columns, place);
    return [ticker, [...days], [...closes]];
  });
  return { files, rows, unordered: unordered.sort(), findings: collected.findings.list() };
};

const plainOf = async (content: string | Uint8Array, more: Partial<FeedSettings> = {}, name = 'prices.csv') =>
  readPlain(longCsv(folder.write(name, content), more));

const cell = fc.oneof(
  { weight: 25, arbitrary: fc.constantFrom('KELP', 'BRK B', 'a.very-long.name', ' X ') },
  { weight: 1, arbitrary: fc.constantFrom('ÅKER', 'N"A', '') },
  { weight: 1, arbitrary: fc.string({ maxLength: 5 }) },
);
const date = fc.oneof(
  { weight: 20, arbitrary: fc.constantFrom('2026-01-05', '2026-01-06', '1999-12-31') },
  { weight: 1, arbitrary: fc.constantFrom('2026-02-30', '2026-1-05', '', 'x', '2026-01-05 ') },
);
const price = fc.oneof(
  { weight: 20, arbitrary: fc.constantFrom('1', '2.5', '103.0004', '0.000001') },
  {
    weight: 1,
    arbitrary: fc.constantFrom('0', '-1', '', '1e3', '1_0', '07', '5.', '1234567890.1234567', 'nan'),
  },
);
const line = fc.tuple(date, cell, price).map((cells) => cells.join(','));

test('where our own reader takes a file, the other reader finds the same in it, to the last bit', async () => {
  let taken = 0;
  await fc.assert(
    fc.asyncProperty(fc.array(line, { maxLength: 5 }), fc.nat(9), async (lines, lineEnd) => {
      const settings = longCsv(
        folder.write('prices.csv', `${head}${lines.join('\n')}${lineEnd > 0 ? '\n' : ''}`),
      );
      const plain = await readPlain(settings);
      if (plain === null) return;
      taken += 1;
      const files = await listPriceFiles(settings.path);
      const queried = accepted(await readQueriedFiles(files, settings, database));
      expect(await contentOf(plain)).toEqual(await contentOf(queried));
    }),
    { seed: 20_261_201, numRuns: 80 },
  );
  expect(taken).toBeGreaterThan(20);
}, 120_000);

test('rows that cross the pieces of a file are whole, in text and in gzip', async () => {
  // 40,000 rows of 20 bytes and more are three pieces of 262,144 bytes and a part
  const rows = Array.from(
    { length: 40_000 },
    (_, at) => `2026-01-05,T${at % 7},${at + 1}.${'5'.repeat(at % 9)}1`,
  );
  const text = `${head}${rows.join('\n')}\n`;
  for (const [name, content] of [
    ['prices.csv', text],
    ['prices.csv.gz', gzipSync(text)],
  ] as const) {
    const plain = await plainOf(content, {}, name);
    expect(plain?.files[0]?.rowCount).toBe(40_000);
    const { rows: byTicker } = await contentOf(plain ?? { files: [], collected: makeCollected() });
    const closes = byTicker.map(([, , own]) => String(own));
    const expected = Array.from({ length: 7 }, (_, ticker) =>
      String(rows.filter((_row, at) => at % 7 === ticker).map((row) => Number(row.split(',')[2]))),
    );
    expect(closes).toEqual(expected);
  }
});

const row = '2026-01-05,KELP,1.5\n';

test.each<[string, string | Uint8Array]>([
  ['nothing', ''],
  ['no row', head],
  ['a row without a line end', `${head}${row}2026-01-06,KELP,1.5`],
  ['a line end of two bytes', `${head}${row.replace('\n', '\r\n')}`],
  ['a mark of the byte order', `\uFEFF${head}${row}`],
  ['a quotation mark', `${head}2026-01-05,"KELP",1.5\n`],
  ['a quotation mark in the first line', `"date",ticker,close\n${row}`],
  ['a blank line', `${head}\n${row}`],
  ['a cell too few', `${head}2026-01-05,KELP\n`],
  ['a cell too many', `${head}2026-01-05,KELP,1.5,\n`],
  ['a letter beyond ASCII', `${head}2026-01-05,ÅKER,1.5\n`],
  ['a zero byte', `${head}2026-01-05,KE\0LP,1.5\n`],
  ['no ticker', `${head}2026-01-05, ,1.5\n`],
  ['a ticker too long', `${head}2026-01-05,${'K'.repeat(41)},1.5\n`],
  ['a price of zero', `${head}2026-01-05,KELP,0.00\n`],
  ['a column that is not there', `date,ticker,price\n${row}`],
  ['a column twice', `date,ticker,close,close\n2026-01-05,KELP,1.5,1.5\n`],
  ['a row longer than a piece', `date,ticker,close,note\n2026-01-05,KELP,1.5,${'n'.repeat(600_000)}\n`],
])('a file with %s is left to the other reader', async (_, content) => {
  expect(await plainOf(content)).toBe(null);
});

test('a damaged gzip file and a file of another kind are left to the other reader', async () => {
  const zipped = gzipSync(`${head}${row.repeat(3)}`);
  expect(await plainOf(zipped.subarray(0, -4), {}, 'prices.csv.gz')).toBe(null);
  expect(await plainOf(`${head}${row}`, {}, 'prices.csv.zst')).toBe(null);
});

test.each<[string, Partial<FeedSettings>]>([
  ['wide files', { shape: 'wide' }],
  ['adjusted closes', { columns: { ...longCsv('').columns, adjustedClose: 'adjusted' } }],
  ['volumes', { columns: { ...longCsv('').columns, volume: 'volume' } }],
  ['currencies', { columns: { ...longCsv('').columns, currency: 'currency' } }],
  ['another date format', { format: { ...longCsv('').format, dateFormat: 'DD/MM/YYYY' } }],
  ['decimal commas', { format: { ...longCsv('').format, decimalMark: 'comma' } }],
])('%s are not plain', (_, more) => {
  expect(mayBePlain(longCsv('', more))).toBe(false);
  expect(mayBePlain(longCsv(''))).toBe(true);
});

test('other columns, another order of them and another delimiter are plain', async () => {
  const text = 'note\tclose\tdate\tticker\n, .\t7.25\t2026-01-05\tBRK B\n\t8\t2026-01-06\t BRK B\n';
  const format = { ...longCsv('').format, delimiter: 'tab' } as const;
  const plain = await plainOf(text, { format });
  expect(await contentOf(plain ?? { files: [], collected: makeCollected() })).toMatchObject({
    rows: [['BRK B', [20_458, 20_459], [7.25, 8]]],
    findings: [],
  });
});
