import { mkdirSync, readFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { openDatabase } from '../../src/feed/internal/read/database.ts';
import { openFiles } from '../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../src/feed/priceFiles.ts';
import type { FeedSettings } from '../../src/feed/settings.ts';
import type { DateFormat } from '../../src/terms/tableFormat.ts';
import { accepted, demoPath, longCsv, pricesOf, problemOf, temporaryFolder } from './settingsForTests.ts';
import { writeFormats } from './writeFormats.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

const open = async (settings: FeedSettings) =>
  openFiles(await listPriceFiles(settings.path), settings, null, database);

beforeAll(async () => {
  for (const name of ['gz', 'zst', 'parquet', 'wide', 'widezst', 'wideparquet', 'years'])
    mkdirSync(dirname(folder.path(`${name}/x`)), { recursive: true });
  await writeFormats(database, demoPath, folder.path, folder.write);
});

test.each<[string, Partial<FeedSettings>, number]>([
  ['gz/prices.csv.gz', {}, 1],
  ['zst/prices.csv.zst', {}, 1],
  ['parquet/prices.parquet', {}, 1],
  ['wide/prices.csv', { shape: 'wide' }, 1],
  ['widezst/prices.csv.zst', { shape: 'wide' }, 1],
  ['wideparquet/prices.parquet', { shape: 'wide' }, 1],
  ['years', {}, 4],
  ['years/prices-*.*', {}, 4],
  ['year?/prices-202?.*', {}, 4],
])('%s gives the same prices and the same fingerprint as the CSV file', async (name, more, files) => {
  const csv = accepted(await open(longCsv(demoPath)));
  const other = accepted(await open(longCsv(folder.path(name), more)));
  expect(other.fingerprint).toBe(csv.fingerprint);
  expect(pricesOf(other)).toEqual(pricesOf(csv));
  expect(other.report.files).toHaveLength(files);
  expect(other.lastDay).toBe(csv.lastDay);
});

test.each<[DateFormat, string, string]>([
  ['YYYY-MM-DD', '2026-01-05', '2026-11-27'],
  ['YYYY/MM/DD', '2026/01/05', '2026/11/27'],
  ['YYYYMMDD', '20260105', '20261127'],
  ['DD/MM/YYYY', '05/01/2026', '27/11/2026'],
  ['DD/MM/YYYY', '5/1/2026', '27/11/2026'],
  ['MM/DD/YYYY', '01/05/2026', '11/27/2026'],
  ['MM/DD/YYYY', '1/5/2026', '11/27/2026'],
  ['DD.MM.YYYY', '05.01.2026', '27.11.2026'],
  ['DD-MM-YYYY', '05-01-2026', '27-11-2026'],
  ['MM-DD-YYYY', '01-05-2026', '11-27-2026'],
  ['DD-MMM-YYYY', '05-Jan-2026', '27-Nov-2026'],
  ['DD MMM YYYY', '5 Jan 2026', '27 Nov 2026'],
  // a spreadsheet counts days from 1899-12-30 (Python 3.11: date(2026, 1, 5) - date(1899, 12, 30) is 46027 days)
  ['spreadsheet number', '46027', '46353'],
])('dates written %s such as %s are read when the settings say so', async (dateFormat, first, last) => {
  const path = folder.write('dates.csv', `date;ticker;close\n${first};KELP;1,5\n${last};KELP;1,75\n`);
  const settings = longCsv(path, { format: { dateFormat, delimiter: 'semicolon', decimalMark: 'comma' } });
  // 20458 and 20784 are 2026-01-05 and 2026-11-27 (Python 3.11: date(2026, 1, 5).toordinal() - 719163)
  expect(pricesOf(accepted(await open(settings)))).toEqual(['KELP 20458 1.5', 'KELP 20784 1.75']);
});

test('a Parquet file brings its own types, whatever text format is set', async () => {
  const path = folder.path('typed.parquet');
  await database((connection) =>
    connection.run(
      `COPY (SELECT TIMESTAMP '2026-01-05' AS date, 'KELP'::VARCHAR AS ticker, 1.25::DECIMAL(9,4) AS close
       UNION ALL SELECT TIMESTAMP '2026-01-06 00:00:00', 'KELP', 2) TO '${path}' (FORMAT parquet)`,
    ),
  );
  const format = { dateFormat: 'DD/MM/YYYY', delimiter: 'tab', decimalMark: 'comma' } as const;
  expect(pricesOf(accepted(await open(longCsv(path, { format }))))).toEqual([
    'KELP 20458 1.25',
    'KELP 20459 2',
  ]);
});

test('an instant within the day is no trading day', async () => {
  const path = folder.path('instants.parquet');
  await database((connection) =>
    connection.run(
      `COPY (SELECT TIMESTAMP '2026-01-05 17:30:00' AS date, 'KELP' AS ticker, 1.0 AS close) TO '${path}' (FORMAT parquet)`,
    ),
  );
  expect(problemOf(await open(longCsv(path))).message).toContain('2026-01-05 17:30:00');
});

test('adjusted closes are served where they are named, and a currency column tells the currency', async () => {
  const path = folder.write(
    'more.csv',
    'day\tname\tlast\tadjusted\tvolume\tcurrency\n2026-01-05\tKELP\t10\t9.5\t100\tGBP\n2026-01-06\tKELP\t10.1\t10.1\t90\tGBP\n',
  );
  const settings = longCsv(path, {
    columns: {
      date: 'day',
      ticker: 'name',
      close: 'last',
      adjustedClose: 'adjusted',
      volume: 'volume',
      currency: 'currency',
    },
    format: { delimiter: 'tab', decimalMark: 'point', dateFormat: 'YYYY-MM-DD' },
  });
  const snapshot = accepted(await open(settings));
  expect(pricesOf(snapshot)).toEqual(['KELP 20458 9.5', 'KELP 20459 10.1']);
  expect(snapshot.series('KELP')?.meaning.currency).toBe('GBP');
  expect(snapshot.report.findings).toEqual([]);
});

test('a Zstandard file that was cut anywhere is refused', async () => {
  const whole = readFileSync(folder.path('zst/prices.csv.zst'));
  for (const length of [5, 20, whole.length >> 1, whole.length - 100, whole.length - 1]) {
    const path = folder.write('cut.csv.zst', whole.subarray(0, length));
    expect(problemOf(await open(longCsv(path))).message).toContain('ends before its own end');
  }
});

test('a folder without price files and a pattern that fits nothing are refused', async () => {
  folder.write('empty/readme.txt', 'nothing here');
  for (const name of ['empty', 'empty/*.csv', 'absent/*.csv'])
    expect(problemOf(await open(longCsv(folder.path(name)))).message).toContain('There is no price file');
});

test('one wrong file of several is named', async () => {
  folder.write('two/a.csv', 'date,ticker,close\n2026-01-05,KELP,1\n');
  folder.write('two/b.csv', 'date,ticker,price\n2026-01-06,KELP,1\n');
  expect(problemOf(await open(longCsv(folder.path('two')))).message).toContain(folder.path('two/b.csv'));
});
