/**
 * How long a large price file takes from the disk to the first answer, and how much memory: `npm run build`, then
 * `node test/bench/bigFeed.mjs [TICKERS] [DAYS]`. The files are made anew in a temporary folder and removed at the end.
 * Each reading runs in a process of its own, in the reading thread that the bot uses.
 */
import { execFileSync } from 'node:child_process';
import { createWriteStream, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { DuckDBInstance } from '@duckdb/node-api';

const millisecondsPerDay = 86_400_000;
const megabyte = 1e6;

/** Marsaglia's xorshift on 32 bits (2003). */
const makeUniform = () => {
  let state = 12_345;
  return () => {
    state ^= state << 13;
    state >>>= 0;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 4_294_967_296;
  };
};

const writeCsv = async (path, tickerCount, dayCount) => {
  const uniform = makeUniform();
  const file = createWriteStream(path);
  file.write('date,ticker,close\n');
  const dates = [];
  for (let day = 0; dates.length < dayCount; day += 1) {
    const date = new Date(day * millisecondsPerDay);
    if (date.getUTCDay() !== 0 && date.getUTCDay() !== 6) dates.push(date.toISOString().slice(0, 10));
  }
  for (let ticker = 0; ticker < tickerCount; ticker += 1) {
    const name = `T${String(ticker).padStart(5, '0')}`;
    let close = 100;
    const rows = dates.map((date) => {
      close *= 1 + 0.03 * (uniform() - 0.5);
      return `${date},${name},${close.toFixed(4)}\n`;
    });
    if (!file.write(rows.join(''))) await new Promise((resolve) => file.once('drain', resolve));
  }
  await new Promise((resolve) => file.end(resolve));
};

const writeOthers = async (csv, path) => {
  const instance = await DuckDBInstance.create();
  const connection = await instance.connect();
  const rows = `read_csv('${csv}', header = true, columns = {'date': 'DATE', 'ticker': 'VARCHAR', 'close': 'DOUBLE'})`;
  await connection.run(`COPY (SELECT * FROM ${rows}) TO '${path('parquet')}' (FORMAT parquet)`);
  await connection.run(
    `COPY (SELECT * FROM ${rows}) TO '${path('csv.zst')}' (FORMAT csv, HEADER, COMPRESSION zstd)`,
  );
  await connection.run(
    `COPY (SELECT * FROM ${rows}) TO '${path('csv.gz')}' (FORMAT csv, HEADER, COMPRESSION gzip)`,
  );
  await connection.run(
    `COPY (SELECT * FROM ${rows} ORDER BY date) TO '${path('byday.csv')}' (FORMAT csv, HEADER)`,
  );
  connection.closeSync();
  instance.closeSync();
};

const none = {
  priceAdjustment: 'unknown',
  currency: null,
  quoteUnit: null,
  closingTime: null,
  calendar: null,
};

const settingsFor = (path) => ({
  path,
  shape: 'long',
  columns: {
    date: 'date',
    ticker: 'ticker',
    close: 'close',
    adjustedClose: null,
    volume: null,
    currency: null,
  },
  format: { delimiter: 'comma', decimalMark: 'point', dateFormat: 'YYYY-MM-DD' },
  holidays: { path: null, columns: { date: 'date', calendar: null } },
  prices: none,
  tickers: {},
});

const peakBytes = () => 1024 * Number(/VmHWM:\s+(\d+)/.exec(readFileSync('/proc/self/status', 'utf8'))?.[1]);

/** Longest time, in milliseconds, for which a timer of this thread came too late. */
const watchLoop = () => {
  const every = 5;
  let [last, worst] = [performance.now(), 0];
  const timer = setInterval(() => {
    const now = performance.now();
    worst = Math.max(worst, now - last - every);
    last = now;
  }, every);
  return () => {
    clearInterval(timer);
    return worst;
  };
};

const lookups = (snapshot) => {
  const rounds = 200_000;
  let sum = 0;
  const started = performance.now();
  for (let round = 0; round < rounds; round += 1) {
    const ticker = snapshot.tickers[(round * 7_919) % snapshot.tickers.length];
    const { closes } = snapshot.series(ticker);
    sum += closes.subarray(closes.length - 61).length;
  }
  return { microseconds: (1000 * (performance.now() - started)) / rounds, sum };
};

const readOne = async (path) => {
  const { openInThread } = await import('../../dist/feed/thread/openInThread.js');
  const { listPriceFiles } = await import('../../dist/feed/priceFiles.js');
  const before = process.memoryUsage().rss;
  const stopWatching = watchLoop();
  const [started, cpu] = [performance.now(), process.cpuUsage()];
  const opened = await openInThread(await listPriceFiles(path), settingsFor(path), Date.now());
  const wallMs = performance.now() - started;
  const used = process.cpuUsage(cpu);
  const blockedMs = stopWatching();
  if (!opened.ok) throw new Error(opened.problem.message);
  const { days, closes } = opened.value.columns;
  const columnBytes = days.byteLength + closes.byteLength;
  const peak = peakBytes();
  const figures = {
    wallMs: Math.round(wallMs),
    cpuMs: Math.round((used.user + used.system) / 1000),
    blockedMs: Math.round(blockedMs),
    columnsMB: Math.round(columnBytes / megabyte),
    startMB: Math.round(before / megabyte),
    peakMB: Math.round(peak / megabyte),
    growthPerColumns: Number(((peak - before) / columnBytes).toFixed(2)),
    lookupMicroseconds: Number(lookups(opened.value).microseconds.toFixed(2)),
    fingerprint: opened.value.fingerprint.slice(0, 12),
  };
  process.stdout.write(`${JSON.stringify(figures)}\n`);
};

const measureAll = async (tickerCount, dayCount) => {
  const folder = mkdtempSync(join(tmpdir(), 'big-feed-'));
  const path = (ending) => join(folder, `prices.${ending}`);
  try {
    await writeCsv(path('csv'), tickerCount, dayCount);
    await writeOthers(path('csv'), path);
    for (const ending of ['csv', 'byday.csv', 'csv.gz', 'csv.zst', 'parquet']) {
      const size = Math.round(statSync(path(ending)).size / megabyte);
      const figures = execFileSync(process.execPath, [
        fileURLToPath(import.meta.url),
        '--read',
        path(ending),
      ]);
      process.stdout.write(`${ending.padEnd(10)} ${String(size).padStart(5)} MB  ${figures}`);
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
};

const [first = '1000', second = '5000'] = process.argv.slice(2);
if (first === '--read') await readOne(second);
else await measureAll(Number(first), Number(second));
