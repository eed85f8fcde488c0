import { renameSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { afterAll, beforeEach, expect, test } from 'vitest';
import { openDatabase } from '../../../src/feed/internal/read/database.ts';
import {
  doubtfulRestMs,
  type LiveFeed,
  longestUnsettledMs,
  startLiveFeed,
} from '../../../src/feed/live/liveFeed.ts';
import type { FeedEvent, LiveFeedPorts } from '../../../src/feed/live/ports.ts';
import { openFiles } from '../../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../../src/feed/priceFiles.ts';
import { head, longCsv, pricesOf, temporaryFolder } from '../settingsForTests.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

const path = folder.path('prices.csv');
const settings = longCsv(path);
const liveSettings = { path, deskTimeZone: 'UTC', checkEverySeconds: 5 };

const first = `${head}2026-01-05,KELP,1\n2026-01-05,TARN,5\n2026-01-06,KELP,1.1\n2026-01-06,TARN,5.1\n`;
const nextDay = '2026-01-07,KELP,1.2\n2026-01-07,TARN,5.2\n';

let nowMs = 0;
let writes = 0;
let told: FeedEvent[] = [];
let calls: { delayMs: number; call: () => void; cancelled: boolean }[] = [];
let onChange: () => void = () => undefined;

beforeEach(() => {
  nowMs = Date.UTC(2026, 0, 9, 12);
  told = [];
  calls = [];
  rmSync(path, { force: true });
});

const ports = (): LiveFeedPorts => ({
  look: async () => ({ files: await listPriceFiles(path), beside: [] }),
  open: (files, now) => openFiles(files, settings, now, database),
  nowMs: () => nowMs,
  later: (delayMs, call) => {
    const entry = { delayMs, call, cancelled: false };
    calls.push(entry);
    return {
      cancel: () => {
        entry.cancelled = true;
      },
    };
  },
  watch: (call) => {
    onChange = call;
    return { close: () => undefined };
  },
  tell: (event) => told.push(event),
});

/** Writes with a time of its own, as no two writes on a real disk have the same one. */
const write = (text: string, to = path): void => {
  writeFileSync(to, text);
  writes += 1;
  utimesSync(to, 1_800_000_000, 1_800_000_000 + writes);
};

const start = () => startLiveFeed(liveSettings, ports());
const waiting = () => calls.filter(({ cancelled }) => !cancelled);
const lines = (feed: LiveFeed): readonly string[] => {
  const snapshot = feed.snapshot();
  return snapshot.ok ? pricesOf(snapshot.value) : [];
};
/** Two looks: one that sees the change and one that finds it settled. */
const settle = async (feed: LiveFeed): Promise<void> => {
  await feed.look();
  await feed.look();
};
/** The same, and the rest that a doubtful file must keep. */
const rest = async (feed: LiveFeed): Promise<void> => {
  await settle(feed);
  nowMs += doubtfulRestMs;
  await feed.look();
};
const kinds = () => told.map((event) => (event.kind === 'refused' ? event.problem.code : event.kind));

test('the first reading is served, told, and followed by a look every few seconds', async () => {
  write(first);
  const feed = await start();
  expect(lines(feed)).toHaveLength(4);
  expect(kinds()).toEqual(['swapped']);
  expect(waiting().map(({ delayMs }) => delayMs)).toEqual([5000]);
  await feed.look();
  expect(kinds()).toEqual(['swapped']);
  expect(feed.status()).toMatchObject({ swappedAt: nowMs, problem: null, restatements: [] });
});

test('a change is read only once the file stands still between two looks', async () => {
  write(first);
  const feed = await start();
  write(first + nextDay.slice(0, 20));
  await feed.look();
  expect(waiting().map(({ delayMs }) => delayMs)).toEqual([500]);
  write(first + nextDay);
  await feed.look();
  expect(lines(feed)).toHaveLength(4);
  await feed.look();
  expect(lines(feed)).toHaveLength(6);
  expect(kinds()).toEqual(['swapped', 'swapped']);
  expect(waiting().map(({ delayMs }) => delayMs)).toEqual([5000]);
});

test('a notice of the file system brings the next look forward and never puts it off', async () => {
  write(first);
  await start();
  onChange();
  onChange();
  onChange();
  expect(calls.map(({ delayMs }) => delayMs)).toEqual([5000, 500]);
  expect(waiting()).toHaveLength(1);
});

test('a question that began on one snapshot ends on it', async () => {
  write(first);
  const feed = await start();
  const before = feed.snapshot();
  write(first.replace('1.1', '1.3') + nextDay);
  await settle(feed);
  expect(before.ok && [...(before.value.series('KELP')?.closes ?? [])]).toEqual([1, 1.1]);
  expect(lines(feed)).toContain('KELP 20459 1.3');
  expect(feed.status().restatements).toEqual([{ ticker: 'KELP', from: 20459, dayCount: 1, kind: 'changed' }]);
});

test.each([
  ['empty', '', 'fileEmpty'],
  ['the row of names alone', head, 'fileEmpty'],
  ['cut in a row', first + nextDay.slice(0, 24), 'fileUnreadable'],
  ['cut in the last number', (first + nextDay).slice(0, -2), 'fileChanging'],
  ['cut after a row', first.slice(0, first.lastIndexOf('2026')), 'pricesLost'],
  ['another kind of file', '<html></html>\n', 'columnMissing'],
  ['all prices of a ticker gone', `${head}2026-01-05,KELP,1\n2026-01-06,KELP,1.1\n`, 'pricesLost'],
  ['every ticker contradicting itself', `${first}2026-01-06,KELP,9\n2026-01-06,TARN,9\n`, 'valueUnreadable'],
])('a new file that is %s does not replace the live prices, and that is told once', async (_, text, code) => {
  write(first);
  const feed = await start();
  const before = feed.snapshot();
  write(text);
  await settle(feed);
  expect(kinds()).toEqual(['swapped']);
  await rest(feed);
  await rest(feed);
  expect(feed.snapshot()).toEqual(before);
  expect(kinds()).toEqual(['swapped', code]);
  expect(feed.status().problem?.code).toBe(code);
  write(text);
  await rest(feed);
  expect(kinds()).toEqual(['swapped', code]);
  write(first);
  await settle(feed);
  expect(kinds()).toEqual(['swapped', code, 'recovered']);
  write(first + nextDay);
  await settle(feed);
  expect(lines(feed)).toHaveLength(6);
});

test('rename-over, delete and re-create, and a touch without a change', async () => {
  write(first);
  const feed = await start();
  write(first + nextDay, folder.path('prices.csv.new'));
  renameSync(folder.path('prices.csv.new'), path);
  await settle(feed);
  expect(lines(feed)).toHaveLength(6);
  rmSync(path);
  await rest(feed);
  expect(lines(feed)).toHaveLength(6);
  expect(kinds()).toEqual(['swapped', 'swapped', 'fileUnreadable']);
  write(first + nextDay);
  await settle(feed);
  expect(kinds()).toEqual(['swapped', 'swapped', 'fileUnreadable', 'recovered']);
  write(first + nextDay);
  await settle(feed);
  expect(kinds()).toHaveLength(4);
});

test('a desk without prices hears why, and gets them as soon as they are there', async () => {
  const feed = await start();
  const refusal = feed.snapshot();
  expect(refusal.ok ? null : refusal.problem.code).toBe('fileUnreadable');
  expect(told).toMatchObject([{ kind: 'refused', hasPrices: false }]);
  write(first);
  await settle(feed);
  expect(lines(feed)).toHaveLength(4);
  expect(kinds()).toEqual(['fileUnreadable', 'swapped']);
});

test('a file that never stands still is told of after a minute, once', async () => {
  write(first);
  const feed = await start();
  for (let look = 0; look < 20; look += 1) {
    write(`${first}2026-01-07,KELP,${look}\n`);
    nowMs += longestUnsettledMs / 10;
    await feed.look();
  }
  expect(kinds()).toEqual(['swapped', 'fileChanging']);
  expect(lines(feed)).toHaveLength(4);
});

test('a reader that breaks leaves the live prices and the looking alive', async () => {
  write(first);
  const broken = { ...ports() };
  const feed = await startLiveFeed(liveSettings, {
    ...broken,
    open: (files, now) =>
      told.length === 0 ? broken.open(files, now) : Promise.reject(new Error('out of thread')),
  });
  write(first + nextDay);
  await rest(feed);
  expect(lines(feed)).toHaveLength(4);
  expect(feed.status().problem?.message).toContain('out of thread');
  expect(waiting()).toHaveLength(1);
});

test('after it is closed nothing is looked at any more', async () => {
  write(first);
  const feed = await start();
  feed.close();
  expect(waiting()).toEqual([]);
  await feed.look();
  expect(waiting()).toEqual([]);
});

test('a file that may end in the middle of its newest day has to rest for longer before it is taken', async () => {
  write(first);
  const feed = await start();
  write(`${first}2026-01-07,KELP,1.2\n`);
  await settle(feed);
  nowMs += doubtfulRestMs - 1;
  await feed.look();
  expect(lines(feed)).toHaveLength(4);
  expect(waiting().map(({ delayMs }) => delayMs)).toEqual([500]);
  nowMs += 1;
  await feed.look();
  expect(lines(feed)).toHaveLength(5);
  expect(kinds()).toEqual(['swapped', 'swapped']);
  write(`${first}2026-01-07,KELP,1.2\n2026-01-08,KELP,1.3\n`);
  await settle(feed);
  expect(lines(feed)).toHaveLength(6);
});

test('a file that is completed while it is held back is taken at once', async () => {
  write(first);
  const feed = await start();
  write(`${first}2026-01-07,KELP,1.2\n`);
  await settle(feed);
  write(first + nextDay);
  await settle(feed);
  expect(lines(feed)).toHaveLength(6);
});
