/**
 * How long a large price file takes from the disk to the first answer, and how much memory, with the goal beside each
 * figure: `npm run build`, then `node test/bench/bigFeed.mjs [TICKERS] [DAYS] [ROUNDS]`. The files are made anew in a
 * temporary folder and removed at the end. Each reading runs in a process of its own, in the reading thread that the
 * bot uses. Every round reads every file once, so that all meet the same load of the machine; the best round counts.
 * Where `python3` (or the program named by PYTHON) has pandas, it reads and sorts the same CSV file in every round.
 */
import { execFileSync } from 'node:child_process';
import { createWriteStream, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { loadavg, tmpdir } from 'node:os';
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

const pandasProgram = `
import sys, time
import pandas
start, worked = time.perf_counter(), time.process_time()
frame = pandas.read_csv(sys.argv[1], parse_dates=['date']).sort_values(['ticker', 'date'])
print(pandas.__version__, time.perf_counter() - start, time.process_time() - worked)
`;

/** The version, and the time from the start of the reading; null where there is no pandas. */
const readWithPandas = (path) => {
  try {
    const python = process.env.PYTHON ?? 'python3';
    const told = execFileSync(python, ['-c', pandasProgram, path], { stdio: ['ignore', 'pipe', 'ignore'] });
    const [version, seconds, worked] = String(told).split(' ');
    return { version, wallMs: 1000 * Number(seconds), cpuMs: 1000 * Number(worked) };
  } catch {
    return null;
  }
};

const readApart = (path) =>
  JSON.parse(String(execFileSync(process.execPath, [fileURLToPath(import.meta.url), '--read', path])));

const endings = ['csv', 'byday.csv', 'csv.gz', 'csv.zst', 'parquet'];

const line = (name, figure, goal) => process.stdout.write(`${name.padEnd(52)} ${figure}${goal}\n`);

const ratio = (first, second) => `${(first / second).toFixed(2)}`;

/** On a busy machine the processor time tells more than the wall time, which is the goal’s. */
const tellRatio = (name, first, second, goal) => {
  line(`${name}, wall time`, ratio(first.wallMs, second.wallMs), ` (goal: at most ${goal})`);
  line(`${name}, processor time`, ratio(first.cpuMs, second.cpuMs), '');
};

const tellGoals = (bestOf, pandas, rowCount) => {
  const { csv, parquet } = bestOf;
  if (pandas === null) line('CSV to pandas', 'no pandas at hand', '');
  else {
    line(`pandas ${pandas.version}, CSV read and sorted, ms`, Math.round(pandas.wallMs), '');
    tellRatio('CSV to pandas', csv, pandas, '0.60');
  }
  tellRatio('Parquet to CSV', parquet, csv, '0.50');
  line(
    'CSV, ms for a million rows',
    Math.round((1e6 * csv.wallMs) / rowCount),
    ' (goal: the same for 20 million)',
  );
  for (const ending of endings) {
    line(`${ending}, peak memory to columns`, bestOf[ending].growthPerColumns, ' (goal: at most 2.5)');
    line(`${ending}, loop blocked, ms`, bestOf[ending].blockedMs, ' (goal: at most 50)');
  }
  line('lookup of 60 returns, µs', csv.lookupMicroseconds, ' (goal: below 2)');
};

const lowerOf = (first, second) => (first === undefined || second.wallMs < first.wallMs ? second : first);

const measureAll = async (tickerCount, dayCount, rounds) => {
  const folder = mkdtempSync(join(tmpdir(), 'big-feed-'));
  const path = (ending) => join(folder, `prices.${ending}`);
  const bestOf = {};
  let pandas = null;
  try {
    await writeCsv(path('csv'), tickerCount, dayCount);
    await writeOthers(path('csv'), path);
    for (let round = 1; round <= rounds; round += 1) {
      line(`round ${round}, load of the machine`, loadavg()[0].toFixed(1), '');
      const told = readWithPandas(path('csv'));
      if (told !== null) pandas = lowerOf(pandas ?? undefined, told);
      for (const ending of endings) {
        const size = Math.round(statSync(path(ending)).size / megabyte);
        const figures = readApart(path(ending));
        bestOf[ending] = lowerOf(bestOf[ending], figures);
        line(`${ending}, ${size} MB`, JSON.stringify(figures), '');
      }
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
  tellGoals(bestOf, pandas, tickerCount * dayCount);
};

const [first = '1000', second = '5000', third = '3'] = process.argv.slice(2);
if (first === '--read') await readOne(second);
else await measureAll(Number(first), Number(second), Number(third));
