import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { generalTopic } from '../../src/questions/help/topics.ts';
import { createVocabulary } from '../../src/questions/vocabulary.ts';
import type { FeedStatus } from '../../src/terms/feedReport.ts';
import type { PriceSeries, PriceSnapshot } from '../../src/terms/prices.ts';
import type { Desk } from '../../src/workspaces/desk.ts';
import { everythingAllowed } from '../../src/workspaces/permissions.ts';
import type { DeskRecords } from '../../src/workspaces/records/ports.ts';
import { layingOut } from '../doubles/drawing.ts';
import { context } from '../questions/asking.ts';

export const noStatus: FeedStatus = {
  report: null,
  freshness: null,
  swappedAt: null,
  restatements: [],
  problem: null,
  problemAt: null,
};

export const snapshotOf = (all: readonly PriceSeries[]): PriceSnapshot => ({
  fingerprint: 'ab'.repeat(32),
  tickers: all.map(({ ticker }) => ticker),
  lastDay: 20784,
  series: (ticker) => all.find((each) => each.ticker === ticker) ?? null,
  quarantined: new Map([['MURK', 'MURK has two different closes on 2026-11-02.']]),
});

export const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

/** The morning after the made prices end, in UTC. */
export const morningMs = Date.parse('2026-11-28T08:00:00Z');

const millisecondsPerDay = 86_400_000;

/** A desk in UTC on made prices, that answers on the calling thread. */
export const deskOn = (records: DeskRecords, snapshot: Desk['snapshot'], more: Partial<Desk> = {}): Desk => ({
  snapshot,
  contextFor: (live) => ({
    ...context,
    vocabulary: createVocabulary(live === null ? [] : [...live.tickers, ...live.quarantined.keys()]),
  }),
  compute: async (job) => answerQuestion(job),
  policy,
  clock: { nowMs: () => morningMs },
  feedStatus: () => noStatus,
  timeZone: 'UTC',
  dayStartMs: (day) => day * millisecondsPerDay,
  helpPage: () => generalTopic(['interval']),
  records,
  drawing: layingOut,
  permissions: everythingAllowed,
  subscriptions: null,
  pins: { store: records.store.pins, wall: () => null },
  ...more,
});
