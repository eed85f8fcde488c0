/**
 * The figures of a digest over a thousand tickers, worked out in two threads (goal: under 2 s).
 * `npm run build && node test/bench/manyTickers.mjs [tickers] [model]`
 */
import { Piscina } from 'piscina';
import { backtestOf, digestBody, tailOf } from '../../dist/digests/body.js';
import { canonicalText } from '../../dist/questions/canonicalText.js';
import { nextStudentT } from '../../dist/stats/random/studentDraw.js';
import { createStreams } from '../../dist/stats/random/xoshiro128.js';

const tickers = Number(process.argv[2] ?? 1000);
const model = process.argv[3] ?? 'student';
const prices = 784;
const firstDay = 19_700;

const streams = createStreams(new Uint8Array(32).fill(3));
const shared = (Type, length) => new Type(new SharedArrayBuffer(length * Type.BYTES_PER_ELEMENT));
const seriesOf = (number) => {
  const random = streams.stream(number);
  const days = shared(Int32Array, prices);
  const closes = shared(Float64Array, prices);
  let close = 100;
  for (let at = 0; at < prices; at += 1) {
    days[at] = firstDay + at;
    closes[at] = close;
    close *= 1 + 0.01 * nextStudentT(random, 4);
  }
  const meaning = {
    priceAdjustment: 'splits',
    currency: 'USD',
    quoteUnit: null,
    closingTime: null,
    calendar: null,
  };
  return { ticker: `T${number}`, days, closes, meaning, flags: [] };
};

const level = (digits) => ({ digits, places: 2 });
const body = digestBody({
  tickers: [],
  window: { kind: 'returns', count: 500 },
  tailLevel: level(99),
  confidence: level(95),
  model,
  estimationReturns: 250,
});
const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };
const jobOf = (series, question) => {
  const canonical = canonicalText(question);
  const read = {
    question,
    canonical,
    assumed: [],
    wishes: [],
    position: { start: 0, end: canonical.length },
  };
  return { job: { read, series: [series], policy }, progress: null };
};

const pool = new Piscina({
  filename: new URL('../../dist/start/compute/worker.js', import.meta.url).href,
  minThreads: 2,
  maxThreads: 2,
});
const all = Array.from({ length: tickers }, (_, number) => seriesOf(number));
const timed = async (name, questionsOf) => {
  const started = performance.now();
  const outcomes = await Promise.all(
    all.flatMap((series) => questionsOf(series.ticker).map((question) => pool.run(jobOf(series, question)))),
  );
  const refused = outcomes.filter(({ ok }) => !ok).length;
  const seconds = (performance.now() - started) / 1000;
  process.stdout.write(
    `${name}, ${tickers} tickers by ${model}: ${seconds.toFixed(2)} s, ${refused} refused\n`,
  );
};

for (let warmUp = 0; warmUp < 2; warmUp += 1)
  await Promise.all(
    all
      .slice(0, 40)
      .flatMap((series) =>
        [tailOf, backtestOf].map((of) => pool.run(jobOf(series, of(body, series.ticker)))),
      ),
  );
await timed('VaR and ES with intervals', (ticker) => [tailOf(body, ticker)]);
await timed('exceedances of 250 sessions', (ticker) => [backtestOf(body, ticker)]);
await timed('both', (ticker) => [tailOf(body, ticker), backtestOf(body, ticker)]);
await pool.close();
