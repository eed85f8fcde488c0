import { describe, expect, test } from 'vitest';
import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { generalTopic } from '../../src/questions/help/topics.ts';
import { createVocabulary } from '../../src/questions/vocabulary.ts';
import type { FeedStatus } from '../../src/terms/feedReport.ts';
import type { PriceSeries, PriceSnapshot } from '../../src/terms/prices.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse, succeed } from '../../src/terms/result.ts';
import { type Converse, createConverse, type Desk } from '../../src/workspaces/converse.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { context } from '../questions/asking.ts';

const noStatus: FeedStatus = {
  report: null,
  freshness: null,
  swappedAt: null,
  restatements: [],
  problem: null,
  problemAt: null,
};

const snapshotOf = (all: readonly PriceSeries[]): PriceSnapshot => ({
  fingerprint: 'ab'.repeat(32),
  tickers: all.map(({ ticker }) => ticker),
  lastDay: 20784,
  series: (ticker) => all.find((each) => each.ticker === ticker) ?? null,
  quarantined: new Map([['MURK', 'MURK has two different closes on 2026-11-02.']]),
});

const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

const deskOn = (snapshot: Desk['snapshot'], more: Partial<Desk> = {}): Desk => ({
  snapshot,
  contextFor: (live) => ({
    ...context,
    vocabulary: createVocabulary(live === null ? [] : [...live.tickers, ...live.quarantined.keys()]),
  }),
  compute: async (job) => answerQuestion({ ...job, policy }),
  feedStatus: () => noStatus,
  timeZone: 'UTC',
  helpPage: () => generalTopic(['interval']),
  ...more,
});

const closes = wobbling(300);
const live = succeed(snapshotOf([seriesOf('KELP', closes), seriesOf('TARN', [...closes].reverse())]));

const say = async (converse: Converse, text: string) =>
  (await converse.ask({ text, place: 'channel' })).map(({ reply }) => reply);

describe('a conversation', () => {
  test('answers each ticker of a question, and each of up to three lines, in order', async () => {
    const converse = createConverse(deskOn(() => live));
    const replies = await say(converse, 'interval KELP TARN 60d\ninterval vol KELP');
    expect(replies.map(({ sentence }) => sentence.slice(0, 12))).toEqual([
      'KELP’s mean ',
      'TARN’s mean ',
      'KELP’s daily',
    ]);
  });

  test('says nothing where nothing is asked', async () => {
    expect(await say(createConverse(deskOn(() => live)), 'thanks')).toEqual([]);
  });

  test('a ticker that is held back is refused with the reason', async () => {
    const [reply] = await say(createConverse(deskOn(() => live)), 'interval MURK');
    expect([reply?.kind, reply?.sentence]).toEqual([
      'refusal',
      'MURK has two different closes on 2026-11-02.',
    ]);
  });

  test('without a feed a question gets the feed’s problem, once, and help still works', async () => {
    const converse = createConverse(deskOn(() => refuse(problem('feedMissing', 'No file.'))));
    expect((await say(converse, 'interval KELP\ninterval TARN')).map(({ sentence }) => sentence)).toEqual([
      'No file.',
    ]);
    expect((await say(converse, 'help')).map(({ kind }) => kind)).toEqual(['help']);
  });

  test('old prices are said before every other caution', async () => {
    const freshness = { lastDay: 20784, expectedDay: 20786, sessionsBehind: 2, counted: 'weekdays' } as const;
    const converse = createConverse(deskOn(() => live, { feedStatus: () => ({ ...noStatus, freshness }) }));
    const [reply] = await say(converse, 'interval KELP');
    expect(reply?.warnings[0]).toContain('2 sessions old');
  });

  test('a question that began on one snapshot ends on it', async () => {
    let current = live;
    const desk = deskOn(() => current, {
      compute: async (job) => {
        current = succeed(snapshotOf([seriesOf('KELP', wobbling(100))]));
        return answerQuestion({ ...job, policy });
      },
    });
    const replies = await say(createConverse(desk), 'interval KELP 250d\ninterval KELP 250d');
    expect(replies.map(({ kind }) => kind)).toEqual(['answer', 'answer']);
  });
});

describe('the button under a reply', () => {
  test('shows the working of the very answer it stands under', async () => {
    const converse = createConverse(deskOn(() => live));
    const [answer] = await say(converse, 'interval KELP');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const [working] = await converse.press(button);
    expect(working?.sentence).toBe(`The working of ${button.answerId}: ${button.question}.`);
    expect(working?.passages[0]?.lines.length).toBeGreaterThan(8);
  });

  test('after a restart on the same prices it is worked out again', async () => {
    const [answer] = await say(createConverse(deskOn(() => live)), 'interval KELP');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const replies = await createConverse(deskOn(() => live)).press(button);
    expect(replies.map(({ kind }) => kind)).toEqual(['working']);
  });

  test('after a restart on other prices it says that the prices have changed', async () => {
    const [answer] = await say(createConverse(deskOn(() => live)), 'interval KELP');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const moved = succeed(snapshotOf([seriesOf('KELP', wobbling(301))]));
    const replies = await createConverse(deskOn(() => moved)).press(button);
    expect(replies.map(({ kind }) => kind)).toEqual(['refusal', 'working']);
    expect(replies[0]?.sentence).toContain(button.answerId);
  });

  test('what cannot be worked out any more is said so', async () => {
    const replies = await createConverse(deskOn(() => live)).press({
      action: 'working',
      answerId: 'R-0000000000',
      question: 'interval GONE 60d at 95%',
    });
    expect(replies.map(({ kind }) => kind)).toEqual(['refusal']);
  });
});
