import { expect, test } from 'vitest';
import { makeRowStore, type RowStore } from '../../src/feed/internal/rowStore.ts';
import { rowsOf } from '../../src/feed/internal/sortedColumns.ts';
import { sortRows } from '../../src/feed/internal/sortRows.ts';

type Row = readonly [tickerNumber: number, day: number, close: number];
type Series = Readonly<Record<string, readonly (readonly [day: number, close: number])[]>>;

const nameOf = (number: number): string => `N${String(number).padStart(6, '0')}`;

/** The rows of each ticker by day, rows of one day in the order in which they were added. */
const expectedOf = (rows: readonly Row[]): Series => {
  const series: Record<string, [number, number][]> = {};
  for (const [number, day, close] of rows) {
    series[nameOf(number)] ??= [];
    series[nameOf(number)]?.push([day, close]);
  }
  for (const own of Object.values(series)) own.sort(([first], [second]) => first - second);
  return series;
};

const sortedFrom = async (store: RowStore, numberCount: number): Promise<[Series, readonly string[]]> => {
  const unordered: string[] = [];
  const names = Array.from({ length: numberCount }, (_, number) => nameOf(number));
  const columns = await sortRows(names, store.rows(), (ticker) => unordered.push(ticker));
  const series: Record<string, [number, number][]> = {};
  for (const [place, ticker] of columns.tickers.entries()) {
    const { days, closes } = rowsOf(columns, place);
    if (days.length > 0) series[ticker] = Array.from(days, (day, row) => [day, closes[row] ?? 0]);
  }
  return [series, unordered];
};

const addEach = (store: RowStore, rows: readonly Row[]): void => {
  for (const row of rows) store.add(...row);
};
const addTogether = (store: RowStore, rows: readonly Row[]): void =>
  store.addAll(
    Int32Array.from(rows, ([number]) => number),
    Int32Array.from(rows, ([, day]) => day),
    Float64Array.from(rows, ([, , close]) => close),
  );

// 300,000 rows fill a block of 262,144 and begin another
const rowCount = 300_000;
const manyRows = (tickerOf: (at: number) => number): Row[] =>
  Array.from({ length: rowCount }, (_, at) => [tickerOf(at), at, at / 7]);

const inRuns = (at: number): number => Math.floor(at / 5000);

test.each<[string, 'grouped' | 'scattered', (at: number) => number, typeof addEach]>([
  ['in long runs of a ticker', 'grouped', inRuns, addEach],
  ['in long runs of a ticker', 'grouped', inRuns, addTogether],
  ['in runs of all lengths', 'grouped', (at) => Math.floor(Math.sqrt(at)), addTogether],
  ['in runs whose names come in descending order', 'grouped', (at) => 60 - inRuns(at), addTogether],
  ['with another ticker in every row', 'scattered', (at) => at % 1000, addEach],
  ['with tickers of large numbers', 'scattered', (at) => 65_500 + (at % 1000), addTogether],
  ['in runs until one ticker comes again', 'scattered', (at) => inRuns(at) % 55, addTogether],
])('rows %s are brought together', async (_, kind, tickerOf, add) => {
  const added = manyRows(tickerOf);
  const store = makeRowStore();
  for (let from = 0; from < rowCount; from += 2048) add(store, added.slice(from, from + 2048));
  const last = rowCount - 1;
  expect(store.last()).toEqual({ tickerNumber: tickerOf(last), day: last, close: last / 7 });
  expect(store.rows().kind).toBe(kind);
  const [series, unordered] = await sortedFrom(store, 66_500);
  const expected = expectedOf(added);
  expect(Object.keys(series)).toEqual(Object.keys(expected).sort());
  const same = Object.entries(series).every(([ticker, own]) => String(own) === String(expected[ticker]));
  expect(same).toBe(true);
  expect(unordered).toEqual([]);
});

test.each([
  ['grouped', 1],
  ['scattered', 2],
])('days out of order are sorted and told of: %s rows', async (kind, rounds) => {
  const oneRound: Row[] = [
    [1, 9, 90],
    [1, 7, 70],
    [1, 9, 91],
    [0, 1, 10],
    [0, 2, 20],
  ];
  const rows = Array.from({ length: rounds }, (_, round) =>
    oneRound.map(([number, day, close]): Row => [number, day + 10 * round, close]),
  ).flat();
  const store = makeRowStore();
  addTogether(store, rows);
  expect(store.rows().kind).toBe(kind);
  expect(await sortedFrom(store, 2)).toEqual([expectedOf(rows), [nameOf(1)]]);
});

test('rows added alone and together keep their order', async () => {
  const store = makeRowStore();
  store.add(0, 1, 1);
  addTogether(store, [
    [0, 1, 2],
    [0, 1, 3],
  ]);
  store.add(0, 1, 4);
  expect(store.last()).toEqual({ tickerNumber: 0, day: 1, close: 4 });
  const [series] = await sortedFrom(store, 1);
  expect(series[nameOf(0)]?.map(([, close]) => close)).toEqual([1, 2, 3, 4]);
});

test('a store without rows gives none, and a ticker without rows an empty range', async () => {
  expect(makeRowStore().last()).toBe(null);
  const columns = await sortRows([nameOf(0)], makeRowStore().rows(), () => undefined);
  expect(columns.tickers).toEqual([nameOf(0)]);
  expect(rowsOf(columns, 0).days).toHaveLength(0);
});
