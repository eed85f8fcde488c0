import { describe, expect, test } from 'vitest';
import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse, succeed } from '../../src/terms/result.ts';
import { type Converse, createConverse } from '../../src/workspaces/converse.ts';
import type { DeskRecords } from '../../src/workspaces/records/ports.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { brokenStore, recordsInMemory } from '../doubles/records.ts';
import { deskOn, noStatus, snapshotOf } from './madeDesk.ts';

const closes = wobbling(300);
const records = await recordsInMemory();
const live = succeed(snapshotOf([seriesOf('KELP', closes), seriesOf('TARN', [...closes].reverse())]));

const say = async (converse: Converse, text: string) =>
  (await converse.ask({ text, place: 'channel' })).map(({ reply }) => reply);

describe('a conversation', () => {
  test('answers each ticker of a question, and each of up to three lines, in order', async () => {
    const converse = createConverse(deskOn(records, () => live));
    const replies = await say(converse, 'interval KELP TARN 60d\ninterval vol KELP');
    expect(replies.map(({ sentence }) => sentence.slice(0, 12))).toEqual([
      'KELP’s mean ',
      'TARN’s mean ',
      'KELP’s daily',
    ]);
  });

  test('says nothing where nothing is asked', async () => {
    expect(await say(createConverse(deskOn(records, () => live)), 'thanks')).toEqual([]);
  });

  test('a ticker that is held back is refused with the reason', async () => {
    const [reply] = await say(createConverse(deskOn(records, () => live)), 'interval MURK');
    expect([reply?.kind, reply?.sentence]).toEqual([
      'refusal',
      'MURK has two different closes on 2026-11-02.',
    ]);
  });

  test('without a feed a question gets the feed’s problem, once, and help still works', async () => {
    const converse = createConverse(deskOn(records, () => refuse(problem('feedMissing', 'No file.'))));
    expect((await say(converse, 'interval KELP\ninterval TARN')).map(({ sentence }) => sentence)).toEqual([
      'No file.',
    ]);
    expect((await say(converse, 'help')).map(({ kind }) => kind)).toEqual(['help']);
  });

  test('old prices are said before every other caution', async () => {
    const freshness = { lastDay: 20784, expectedDay: 20786, sessionsBehind: 2, counted: 'weekdays' } as const;
    const converse = createConverse(
      deskOn(records, () => live, { feedStatus: () => ({ ...noStatus, freshness }) }),
    );
    const [reply] = await say(converse, 'interval KELP');
    expect(reply?.warnings[0]).toContain('2 sessions old');
  });

  test('a question that began on one snapshot ends on it', async () => {
    let current = live;
    const desk = deskOn(records, () => current, {
      compute: async (job) => {
        current = succeed(snapshotOf([seriesOf('KELP', wobbling(100))]));
        return answerQuestion(job);
      },
    });
    const replies = await say(createConverse(desk), 'interval KELP 250d\ninterval KELP 250d');
    expect(replies.map(({ kind }) => kind)).toEqual(['answer', 'answer']);
  });
});

describe('the button under a reply', () => {
  test('shows the working of the very answer it stands under', async () => {
    const converse = createConverse(deskOn(records, () => live));
    const [answer] = await say(converse, 'interval KELP');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const [working] = await converse.press({ ...button, place: 'channel' });
    expect(working?.reply.sentence).toBe(`The working of ${button.answerId}: ${button.question}.`);
    expect(working?.reply.passages[0]?.lines.length).toBeGreaterThan(8);
  });

  test('after a restart, and on other prices, it is found on record', async () => {
    const own = await recordsInMemory();
    const [answer] = await say(createConverse(deskOn(own, () => live)), 'interval KELP 50d');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const moved = succeed(snapshotOf([seriesOf('KELP', wobbling(301))]));
    const spoken = await createConverse(deskOn(own, () => moved)).press({ ...button, place: 'channel' });
    expect(spoken.map(({ reply: { kind, sentence } }) => [kind, sentence])).toEqual([
      ['working', `The working of ${button.answerId}: ${button.question}.`],
    ]);
  });

  /** Presses the button of an answer on a desk where records are in this state. */
  const pressAfter = async (state: Partial<DeskRecords>, snapshot: typeof live) => {
    const [answer] = await say(createConverse(deskOn(records, () => live)), 'interval KELP');
    const [button] = answer?.buttons ?? [];
    if (button === undefined) throw new Error('the answer has no button');
    const desk = deskOn({ ...(await recordsInMemory()), ...state }, () => snapshot);
    const spoken = await createConverse(desk).press({ ...button, place: 'channel' });
    return { button, spoken, kinds: spoken.map(({ reply }) => reply.kind) };
  };
  const moved = succeed(snapshotOf([seriesOf('KELP', wobbling(301))]));

  test('whose record was deleted it dies with the words of an id that never was', async () => {
    const { button, spoken } = await pressAfter({}, live);
    const never = await createConverse(deskOn(await recordsInMemory(), () => live)).press({
      ...button,
      answerId: 'R-0000000000',
      place: 'channel',
    });
    expect(spoken[0]?.outcome).toMatchObject({ ok: false, problem: { code: 'unknownRecord' } });
    const wordsOf = (all: typeof spoken) => all[0]?.reply.sentence.replaceAll(/R-\w+/g, 'R-…');
    expect(wordsOf(spoken)).toBe(wordsOf(never));
  });

  test.each([
    ['nothing is kept', { keeps: false }],
    ['the store is in trouble', { store: brokenStore }],
  ])('where %s it is worked out again on the same prices', async (_, state) => {
    expect((await pressAfter(state, live)).kinds).toEqual(['working']);
  });

  test('where nothing is kept and prices are new it says that the prices have changed', async () => {
    const { button, spoken, kinds } = await pressAfter({ keeps: false }, moved);
    expect(kinds).toEqual(['refusal', 'working']);
    expect(spoken[0]?.reply.sentence).toContain(button.answerId);
  });

  test('what cannot be worked out any more is said so', async () => {
    const desk = deskOn(await recordsInMemory({ keeps: false }), () => live);
    const [spoken] = await createConverse(desk).press({
      action: 'working',
      place: 'channel',
      answerId: 'R-0000000000',
      question: 'interval GONE 60d at 95%',
    });
    expect(spoken?.outcome).toMatchObject({ ok: false, problem: { code: 'unknownRecord' } });
  });

  test('of a digest is refused where none can be kept', async () => {
    const [spoken] = await createConverse(deskOn(records, () => live)).press({
      action: 'resumeSubscription',
      place: 'channel',
      answerId: 'D-1',
      question: '',
    });
    expect(spoken?.outcome).toMatchObject({ ok: false, problem: { code: 'storeUnavailable' } });
  });
});

describe('tickers that hardly move', () => {
  test('are compared without a fault: their differences may all be the same', async () => {
    const [up, down] = [0.00010000000000010001, 0.0000999999999999];
    const alike = succeed(
      snapshotOf([
        seriesOf('KELP', [0.0001, up, up, up]),
        seriesOf('TARN', [0.0001, 0.0001, 0.0001, 0.0001, 0.0001]),
        seriesOf('FLAT', [0.0001, down, down, down, down]),
      ]),
    );
    expect(await say(createConverse(deskOn(records, () => alike)), 'compare KELP TARN FLAT')).toHaveLength(1);
  });
});
