import fc from 'fast-check';
import { expect, test } from 'vitest';
import { restatementsBetween } from '../../../src/feed/live/restatements.ts';
import { snapshotFromColumns } from '../../../src/feed/snapshot.ts';

type Prices = readonly (readonly [number, number])[];

const meaning = {
  priceAdjustment: 'unknown',
  currency: null,
  quoteUnit: null,
  closingTime: null,
  calendar: null,
} as const;

const snapshot = (table: Readonly<Record<string, Prices>>, quarantined: readonly string[] = []) => {
  const tickers = Object.keys(table).sort();
  const rows = tickers.flatMap((ticker) => table[ticker] ?? []);
  const starts = [0];
  for (const ticker of tickers) starts.push((starts.at(-1) ?? 0) + (table[ticker]?.length ?? 0));
  return snapshotFromColumns({
    fingerprint: '',
    tickers,
    starts: Int32Array.from(starts.slice(0, -1)),
    ends: Int32Array.from(starts.slice(1)),
    days: Int32Array.from(rows, ([day]) => day),
    closes: Float64Array.from(rows, ([, close]) => close),
    meanings: tickers.map(() => meaning),
    flags: tickers.map(() => []),
    quarantined: new Map(quarantined.map((ticker) => [ticker, 'reason'])),
    lastDay: Math.max(...rows.map(([day]) => day)),
  });
};

const before: Prices = [
  [1, 10],
  [2, 11],
  [3, 12],
  [4, 13],
];
const between = (after: Prices) => restatementsBetween(snapshot({ KELP: before }), snapshot({ KELP: after }));

test.each<[string, Prices, object[]]>([
  ['the same', before, []],
  ['a new day', [...before, [5, 14]], []],
  ['a window that moved on', [...before.slice(2), [5, 14]], []],
  ['history that reaches further back', [[0, 9], ...before], []],
  [
    'one close restated',
    [
      [1, 10],
      [2, 11.5],
      [3, 12],
      [4, 13],
    ],
    [{ from: 2, dayCount: 1, kind: 'changed' }],
  ],
  [
    'two closes restated apart',
    [
      [1, 10.5],
      [2, 11],
      [3, 12.5],
      [4, 13],
    ],
    [{ from: 1, dayCount: 2, kind: 'changed' }],
  ],
  [
    'a day taken away',
    [
      [1, 10],
      [3, 12],
      [4, 13],
    ],
    [{ from: 2, dayCount: 1, kind: 'changed' }],
  ],
  ['the last day taken away', before.slice(0, 3), [{ from: 4, dayCount: 1, kind: 'changed' }]],
  [
    'the past halved',
    [
      [1, 5],
      [2, 5.5],
      [3, 12],
      [4, 13],
    ],
    [{ from: 1, dayCount: 2, kind: 'rescaled' }],
  ],
  [
    'everything halved and a new day',
    [
      [1, 5],
      [2, 5.5],
      [3, 6],
      [4, 6.5],
      [5, 7],
    ],
    [{ from: 1, dayCount: 4, kind: 'rescaled' }],
  ],
  [
    'the past changed by different ratios',
    [
      [1, 5],
      [2, 6],
      [3, 12],
      [4, 13],
    ],
    [{ from: 1, dayCount: 2, kind: 'changed' }],
  ],
  [
    'nothing in common',
    [
      [8, 10],
      [9, 11],
    ],
    [],
  ],
])('%s', async (_, after, restated) => {
  expect(await between(after)).toEqual(restated.map((one) => ({ ticker: 'KELP', ...one })));
});

test('a day put between two others', async () => {
  const old: Prices = [
    [1, 10],
    [2, 11],
    [4, 12],
  ];
  const now: Prices = [
    [1, 10],
    [2, 11],
    [3, 11.5],
    [4, 12],
  ];
  const found = await restatementsBetween(snapshot({ KELP: old }), snapshot({ KELP: now }));
  expect(found).toEqual([{ ticker: 'KELP', from: 3, dayCount: 1, kind: 'changed' }]);
});

test('a ticker that is gone is told, one that is held back is told elsewhere', async () => {
  const live = snapshot({ KELP: before, TARN: before });
  expect(await restatementsBetween(live, snapshot({ KELP: before }))).toEqual([
    { ticker: 'TARN', from: 1, dayCount: 4, kind: 'gone' },
  ]);
  expect(await restatementsBetween(live, snapshot({ KELP: before }, ['TARN']))).toEqual([]);
});

test('the number of differing days and the first of them are those of a plain comparison', async () => {
  const series = fc.uniqueArray(fc.tuple(fc.integer({ min: 0, max: 30 }), fc.integer({ min: 1, max: 3 })), {
    minLength: 1,
    maxLength: 30,
    selector: ([day]) => day,
  });
  await fc.assert(
    fc.asyncProperty(series, series, async (first, second) => {
      const sorted = (rows: Prices): Prices => [...rows].sort(([a], [b]) => a - b);
      const [old, now] = [sorted(first), sorted(second)];
      const start = Math.max(old[0]?.[0] ?? 0, now[0]?.[0] ?? 0);
      const end = old.at(-1)?.[0] ?? 0;
      const differing = Array.from({ length: 31 }, (_, day) => day).filter((day) => {
        const of = (rows: Prices) => rows.find(([one]) => one === day)?.[1];
        return day >= start && day <= end && of(old) !== of(now);
      });
      const found = await restatementsBetween(snapshot({ KELP: old }), snapshot({ KELP: now }));
      const plain = differing.length === 0 ? [] : [{ from: differing[0], dayCount: differing.length }];
      expect(found.map(({ from, dayCount }) => ({ from, dayCount }))).toEqual(plain);
    }),
    { seed: 2, numRuns: 500 },
  );
});
