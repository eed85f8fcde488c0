import { expect, test } from 'vitest';
import { makeRowBlocks } from '../../src/feed/internal/rowBlocks.ts';

type Row = readonly [tickerNumber: number, day: number, close: number];

const take = async (rows: ReturnType<typeof makeRowBlocks>): Promise<Row[]> => {
  const taken: Row[] = [];
  await rows.takeAll(async ({ tickerNumbers, days, closes, count }) => {
    for (let at = 0; at < count; at += 1)
      taken.push([tickerNumbers[at] ?? 0, days[at] ?? 0, closes[at] ?? 0]);
  });
  return taken;
};

// a block holds 262,144 rows, so that 600,000 fill two and begin a third
const manyRows = (tickerOf: (at: number) => number): Row[] =>
  Array.from({ length: 600_000 }, (_, at) => [tickerOf(at), at, at / 7]);

test.each<[string, (at: number) => number]>([
  ['in long runs of a ticker', (at) => Math.floor(at / 5000)],
  ['with another ticker in every row', (at) => at % 1000],
  ['with tickers of large numbers', (at) => 65_500 + (at % 1000)],
  ['in runs of all lengths', (at) => Math.floor(Math.sqrt(at))],
])('rows %s come back as they were added, and are counted by ticker', async (_, tickerOf) => {
  const added = manyRows(tickerOf);
  const rows = makeRowBlocks();
  for (const [number, day, close] of added) rows.add(number, day, close);
  const counts: number[] = [];
  for (const [number] of added) counts[number] = (counts[number] ?? 0) + 1;
  expect(rows.counts()).toEqual(counts);
  expect(rows.last()).toEqual({ tickerNumber: tickerOf(599_999), day: 599_999, close: 599_999 / 7 });
  const taken = await take(rows);
  expect(taken.length).toBe(added.length);
  expect(taken.every((row, at) => row.every((value, place) => value === added[at]?.[place]))).toBe(true);
});

test('rows added many at once are the same as one by one', async () => {
  const rows = makeRowBlocks();
  rows.add(9, 9, 9);
  const numbers = Int32Array.from({ length: 300_000 }, (_, at) => at % 3);
  const days = Int32Array.from(numbers.keys());
  const closes = Float64Array.from(days, (day) => day / 3);
  rows.addAll(numbers, days, closes);
  const taken = await take(rows);
  expect(taken).toHaveLength(300_001);
  expect([taken[0], taken[1], taken.at(-1)]).toEqual([
    [9, 9, 9],
    [0, 0, 0],
    [2, 299_999, 299_999 / 3],
  ]);
  expect(await take(makeRowBlocks())).toEqual([]);
  expect(makeRowBlocks().last()).toBe(null);
});
