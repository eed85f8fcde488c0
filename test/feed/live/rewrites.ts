import {
  appendFileSync,
  closeSync,
  ftruncateSync,
  openSync,
  renameSync,
  rmSync,
  utimesSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import { expect } from 'vitest';
import type { Database } from '../../../src/feed/internal/read/database.ts';
import { type LiveFeed, startLiveFeed } from '../../../src/feed/live/liveFeed.ts';
import { openFiles } from '../../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../../src/feed/priceFiles.ts';
import { isoFromDay } from '../../../src/terms/day.ts';
import { type Chance, makeChance } from '../fuzz/edits.ts';
import { head, longCsv } from '../settingsForTests.ts';

const tickers = ['ARCH', 'BRAE', 'CAIRN', 'DUNE', 'EYOT', 'FELL', 'GLEN', 'HOLM'];
const firstDay = 20_000;
const firstLength = 20;

/** The whole file of a version: every version has one day more, and all its closes carry its number. */
const rowsOf = (version: number, by: 'ticker' | 'day'): string[] => {
  const days = Array.from({ length: firstLength + version }, (_, at) => firstDay + at);
  const row = (ticker: string, day: number): string =>
    `${isoFromDay(day)},${ticker},${(100 + version / 1000).toFixed(3)}\n`;
  return by === 'ticker'
    ? tickers.flatMap((ticker) => days.map((day) => row(ticker, day)))
    : days.flatMap((day) => tickers.map((ticker) => row(ticker, day)));
};

/** The version that a live feed serves; fails where it serves parts of two or less than the whole of one. */
const servedVersion = (feed: LiveFeed): number => {
  const snapshot = feed.snapshot();
  if (!snapshot.ok) throw new Error(snapshot.problem.message);
  expect(snapshot.value.tickers).toEqual(tickers);
  const versions = new Set<number>();
  for (const ticker of tickers) {
    const series = snapshot.value.series(ticker);
    for (const close of series?.closes ?? []) versions.add(Math.round((close - 100) * 1000));
    versions.add((series?.days.length ?? 0) - firstLength);
  }
  expect([...versions]).toHaveLength(1);
  return [...versions][0] ?? -1;
};

/** Pieces of a text, cut anywhere. */
const pieces = (text: string, chance: Chance): string[] => {
  const cuts = Array.from({ length: 1 + chance.below(4) }, () => chance.below(text.length)).sort(
    (a, b) => a - b,
  );
  return [...cuts, text.length].map((cut, at) => text.slice(at === 0 ? 0 : cuts[at - 1], cut));
};

let writes = 0;

/** No time passes between two looks of this test, so every write gets a time of its own, as it would have by then. */
const stamp = (path: string): void => {
  writes += 1;
  utimesSync(path, 1_700_000_000 + writes, 1_700_000_000 + writes);
};

type Pause = (looks: number, waits?: boolean) => Promise<void>;
type Way = (path: string, text: string, chance: Chance, pause: Pause) => Promise<void>;

const inPieces: Way = async (path, text, chance, pause) => {
  const file = openSync(path, 'w');
  for (const piece of pieces(text, chance)) {
    writeSync(file, piece);
    stamp(path);
    // a truncated file is known for one even if its writer rests
    await pause(chance.below(4));
  }
  closeSync(file);
};

/** Ways of writing. Where a half-written file cannot be told from a whole one, the writer rests for one look at most. */
const ways: Readonly<Record<string, Way>> = {
  inPieces,
  atOnce: async (path, text) => {
    writeFileSync(path, text);
    stamp(path);
  },
  renameOver: async (path, text, chance, pause) => {
    await inPieces(`${path}.new`, text, chance, pause);
    renameSync(`${path}.new`, path);
  },
  deleteAndCreate: async (path, text, chance, pause) => {
    rmSync(path);
    await pause(chance.below(4));
    await inPieces(path, text, chance, pause);
  },
  overTheOldText: async (path, text, chance, pause) => {
    const file = openSync(path, 'r+');
    for (const piece of pieces(text, chance)) {
      writeSync(file, piece);
      stamp(path);
      await pause(chance.below(2), true);
    }
    ftruncateSync(file, Buffer.byteLength(text));
    stamp(path);
    closeSync(file);
  },
  appended: async (path, text, chance, pause) => {
    writeFileSync(path, '');
    for (const piece of pieces(text, chance)) {
      appendFileSync(path, piece);
      stamp(path);
      await pause(chance.below(4));
    }
  },
  emptyFirst: async (path, text, chance, pause) => {
    writeFileSync(path, chance.one(['', head, 'busy\n']));
    stamp(path);
    await pause(2);
    writeFileSync(path, text);
    stamp(path);
  },
};

const wayNames = Object.keys(ways);

/** Rewrites a file many times in every way while a live feed looks at it, and holds every snapshot to be a whole one. */
export const rewriteWhileReading = async (path: string, times: number, database: Database): Promise<void> => {
  writeFileSync(path, head + rowsOf(0, 'ticker').join(''));
  const feed = await startLiveFeed(
    { path, deskTimeZone: 'UTC', checkEverySeconds: 5 },
    {
      look: async () => ({ files: await listPriceFiles(path), beside: [] }),
      open: (files) => openFiles(files, longCsv(path), null, database),
      nowMs: () => 0,
      later: () => ({ cancel: () => undefined }),
      watch: () => ({ close: () => undefined }),
      tell: () => undefined,
    },
  );
  const chance = makeChance(times);
  for (let version = 1; version <= times; version += 1) {
    const started: Promise<void>[] = [];
    const pause: Pause = async (looks, waits = false) => {
      for (let look = 0; look < looks; look += 1) {
        const looking = feed.look();
        // half of the looks are still reading while the writer goes on
        if (waits || chance.below(2) === 0) await looking;
        else started.push(looking);
        expect([version - 1, version]).toContain(servedVersion(feed));
      }
    };
    const text = head + rowsOf(version, chance.one(['ticker', 'day'])).join('');
    const name = chance.one(wayNames);
    await ways[name]?.(path, text, chance, pause);
    await Promise.all(started);
    await feed.look();
    await feed.look();
    expect(servedVersion(feed), name).toBe(version);
  }
  feed.close();
};
