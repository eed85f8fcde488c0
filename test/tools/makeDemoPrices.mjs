/**
 * Writes config/demo-prices.csv: three years of closes of twelve invented firms on an invented coast.
 * The figures come from whole-number steps, the four operations and square roots alone, so that every machine
 * writes the same bytes. `--print` writes to standard output instead.
 */
import { writeFileSync } from 'node:fs';

const firstDay = Date.UTC(2023, 10, 27);
const lastDay = Date.UTC(2026, 10, 27);
const millisecondsPerDay = 86_400_000;
const seed = 20_261_127;

/** One line per firm: starting close, daily drift, share of the common swing, own daily swing. */
const firms = [
  { ticker: 'KELP', close: 48.2, drift: 0.0003, common: 0.7, own: 0.0085 },
  { ticker: 'TARN', close: 131.4, drift: 0.0002, common: 0.9, own: 0.011 },
  { ticker: 'SKERRY', close: 22.75, drift: 0.0001, common: 1.2, own: 0.014 },
  { ticker: 'DULSE', close: 7.318, drift: 0.0004, common: 0.5, own: 0.016 },
  { ticker: 'BRINE', close: 64.9, drift: 0.0002, common: 0.4, own: 0.007 },
  { ticker: 'GANNET', close: 310.5, drift: 0.0003, common: 1.0, own: 0.01 },
  { ticker: 'GANNET.B', close: 288.25, drift: 0.0003, common: 1.0, own: 0.003, follows: 'GANNET' },
  { ticker: 'LIMPET', close: 1.842, drift: 0, common: 0.3, own: 0.02 },
  {
    ticker: 'HAAR',
    close: 95.6,
    drift: 0.0002,
    common: 0.6,
    own: 0.006,
    stormFrom: Date.UTC(2025, 9, 1),
    storm: 3.2,
  },
  { ticker: 'WRACK', close: 15.07, drift: -0.0003, common: 1.1, own: 0.018 },
  { ticker: 'CURLEW', close: 203.8, drift: 0.0004, common: 0.8, own: 0.009 },
  { ticker: 'PETREL', close: 34.6, drift: 0.0005, common: 0.9, own: 0.02, closes: 16 },
];

/** Marsaglia's xorshift on 32 bits (2003): a small generator is enough for a demonstration. */
const makeUniform = (start) => {
  let state = start >>> 0;
  return () => {
    state ^= state << 13;
    state >>>= 0;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 4_294_967_296;
  };
};

/** Twelve uniforms less six: mean 0, variance 1, close to the bell curve, and the same bits everywhere. */
const makeNormal = (uniform) => () => {
  let sum = -6;
  for (let count = 0; count < 12; count += 1) sum += uniform();
  return sum;
};

/** Student's t with five degrees of freedom, scaled to variance 1. */
const makeFatTailed = (normal) => () => {
  let squares = 0;
  for (let count = 0; count < 5; count += 1) squares += normal() ** 2;
  return (normal() / Math.sqrt(squares / 5)) * Math.sqrt(3 / 5);
};

/** Shocks of variance 1 in the long run whose size clusters. */
const makeClustered = (shock) => {
  let variance = 1;
  let last = 1;
  return () => {
    variance = 0.05 + 0.08 * last + 0.87 * variance;
    const value = Math.sqrt(variance) * shock();
    last = Math.min(value * value, 25);
    return value;
  };
};

const weekdays = () => {
  const days = [];
  for (let instant = firstDay; instant <= lastDay; instant += millisecondsPerDay) {
    const weekday = new Date(instant).getUTCDay();
    if (weekday !== 0 && weekday !== 6) days.push(instant);
  }
  return days;
};

const decimalsOf = (firm) => (firm.close >= 100 ? 2 : firm.close >= 10 ? 3 : 4);

const demoPrices = () => {
  const days = weekdays();
  const source = () => makeClustered(makeFatTailed(makeNormal(makeUniform(nextSeed()))));
  let seeds = seed;
  const nextSeed = () => {
    seeds = (seeds * 1_664_525 + 1_013_904_223) % 4_294_967_296;
    return seeds || 1;
  };
  const commonShock = source();
  const common = days.map(() => 0.007 * commonShock());
  const rows = [];
  const movesOf = new Map();
  for (const firm of firms) {
    const shock = source();
    const base = firm.follows === undefined ? null : movesOf.get(firm.follows);
    const moves = days.map((day, index) => {
      const storm = firm.stormFrom !== undefined && day >= firm.stormFrom ? firm.storm : 1;
      const shared = base === null ? firm.common * common[index] : base[index];
      return firm.drift + shared + firm.own * storm * shock();
    });
    movesOf.set(firm.ticker, moves);
    const from = days.length - (firm.closes ?? days.length);
    let close = firm.close;
    for (let index = from; index < days.length; index += 1) {
      if (index > from) close *= 1 + moves[index];
      rows.push(
        `${new Date(days[index]).toISOString().slice(0, 10)},${firm.ticker},${close.toFixed(decimalsOf(firm))}`,
      );
    }
  }
  return `date,ticker,close\n${rows.join('\n')}\n`;
};

if (process.argv.includes('--print')) process.stdout.write(demoPrices());
else writeFileSync(new URL('../../config/demo-prices.csv', import.meta.url), demoPrices());
