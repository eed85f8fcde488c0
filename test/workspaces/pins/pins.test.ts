import { describe, expect, test } from 'vitest';
import { fullCaution } from '../../../src/present/compose/help.ts';
import type { Reply } from '../../../src/present/reply.ts';
import { inWords } from '../../../src/present/words.ts';
import type { PriceSeries, PriceSnapshot } from '../../../src/terms/prices.ts';
import { succeed } from '../../../src/terms/result.ts';
import type { Asking } from '../../../src/workspaces/conversation.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import { everythingAllowed, type PlaceVerdict } from '../../../src/workspaces/permissions.ts';
import { cardsAtTerminal, finishCards, takenOff, tellOfChanges } from '../../../src/workspaces/pins/notes.ts';
import type { PinOutcome, Posted, Wall } from '../../../src/workspaces/pins/ports.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { recordsInMemory } from '../../doubles/records.ts';
import { accepted } from '../../laws/outcomes.ts';
import { deskOn, snapshotOf } from '../madeDesk.ts';

const closes = wobbling(300);
const now = (...all: readonly PriceSeries[]): PriceSnapshot => snapshotOf(all);
const asKept = now(seriesOf('KELP', closes), seriesOf('TARN', wobbling(300)));

/** A wall that says each key once, as deliveries do, and does with pins as it is told. */
const madeWall = () => {
  const posted = new Map<
    string,
    { readonly ts: string; readonly thread: string | null; readonly content: Reply }
  >();
  const pins = new Set<string>();
  const answers: { pin: PinOutcome; unpin: PinOutcome; say: Posted | null } = {
    pin: { kind: 'done' },
    unpin: { kind: 'done' },
    say: null,
  };
  const wall: Wall = {
    say: async (key, { thread }, content) => {
      if (answers.say !== null) return answers.say;
      const known = posted.get(key) ?? { ts: `9.${posted.size}`, thread, content };
      posted.set(key, known);
      return { kind: 'said', ts: known.ts };
    },
    pin: async (channel, ts) => {
      if (answers.pin.kind === 'done') pins.add(`${channel} ${ts}`);
      return answers.pin;
    },
    unpin: async (channel, ts) => {
      pins.delete(`${channel} ${ts}`);
      return answers.unpin;
    },
  };
  return {
    wall,
    posted,
    pins,
    answers,
    cards: () => [...posted.values()].map(({ content }) => content.sentence),
  };
};

const inThread = (thread: string | null, message = '7.5') => ({
  team: 'T1',
  channel: 'C1',
  person: 'U1',
  message,
  thread,
});

const setUp = async () => {
  const records = await recordsInMemory({ tell: () => {} });
  const made = madeWall();
  const desk = deskOn(records, () => succeed(asKept), {
    pins: { store: records.store.pins, wall: () => made.wall },
  });
  const converse = createConverse(desk);
  const ask = async (
    text: string,
    from: Asking['from'] | null = inThread('1.5'),
    place: Asking['place'] = 'channel',
  ) => converse.ask({ text, place, ...(from === null ? {} : { from }) });
  const idOf = async (text: string, from?: Asking['from']) => {
    const [spoken] = await ask(text, from);
    if (spoken?.outcome?.ok !== true) throw new Error('no answer');
    return spoken.outcome.value[0].id;
  };
  const said = async (...args: Parameters<typeof ask>) =>
    (await ask(...args)).map(({ reply: { kind, sentence } }) => `${kind}: ${sentence}`);
  return { ...made, records, desk, converse, ask, idOf, said };
};

describe('pin', () => {
  test('puts a card with the last result of the thread up, once, with its id, data date and the whole caution', async () => {
    const { said, idOf, pins, ...made } = await setUp();
    await idOf('interval TARN 60d');
    const id = await idOf('interval KELP 60d');
    expect(await said('pin')).toEqual([]);
    const [[key, card] = []] = [...made.posted];
    expect(key).toBe(`card:T1:C1:1.5:${id}:1`);
    expect(card?.thread).toBe('1.5');
    const words = card === undefined ? '' : inWords(card.content);
    expect(words).toMatch(/^KELP’s mean daily return over 60 days is /);
    expect(words).toContain(id);
    expect(words).toContain('Data to ');
    expect(card?.content.caution).toBe(fullCaution);
    expect([...pins]).toEqual(['C1 9.0']);
    expect(await said('pin')).toEqual([`refusal: ${id} is pinned here already.`]);
    expect(made.posted.size).toBe(1);
  });

  test('takes the result that an id names, into the thread that its own message begins too', async () => {
    const { said, idOf, ...made } = await setUp();
    const id = await idOf('interval KELP 60d', inThread('3.5'));
    expect(await said(`pin ${id}`, inThread(null, '8.5'))).toEqual([]);
    expect([...made.posted.values()][0]?.thread).toBe('8.5');
  });

  test('refuses where there is no result, where none is known by that id, and in a private reply', async () => {
    const { said, ask } = await setUp();
    expect((await said('pin'))[0]).toContain('There is no result in this thread to pin.');
    expect((await ask('pin R-0000000000'))[0]?.outcome).toMatchObject({ problem: { code: 'unknownRecord' } });
    expect((await said('pin', inThread(null), 'command'))[0]).toContain('A private reply cannot be pinned.');
  });

  test.each([
    ['not_pinnable', 'does not let this message be pinned'],
    ['permission_denied', 'does not let me pin here'],
    ['too_many_pins', 'as many pins as it can hold'],
    ['strange_code', 'it says strange_code'],
  ])('leaves the card and says so where the platform refuses with %s', async (code, says) => {
    const { said, idOf, answers, records } = await setUp();
    answers.pin = { kind: 'refused', code };
    await idOf('interval KELP 60d');
    const [reply] = await said('pin');
    expect(reply).toContain('refusal: The card stands in the thread, but the platform has not pinned it');
    expect(reply).toContain(says);
    answers.pin = { kind: 'done' };
    expect(await said('pin')).toEqual([]);
    expect(accepted(await records.store.pins.list(['pinned'], 9))).toHaveLength(1);
  });

  test('says that nothing is pinned where no card can be posted', async () => {
    const { said, idOf, answers, records } = await setUp();
    await idOf('interval KELP 60d');
    answers.say = { kind: 'refused', code: 'restricted_action' };
    expect((await said('pin'))[0]).toContain('(restricted_action), so nothing is pinned');
    answers.say = null;
    expect(await said('pin')).toEqual([]);
    expect(accepted(await records.store.pins.list(['pinned'], 9))).toHaveLength(1);
  });

  test('that was wanted when the bot ended is put up when it begins', async () => {
    const { idOf, desk, records, answers, pins, said } = await setUp();
    await idOf('interval KELP 60d');
    answers.say = { kind: 'expired' };
    await said('pin');
    const [card] = accepted(await records.store.pins.list(['removed'], 9));
    if (card === undefined) throw new Error('no card');
    accepted(await records.store.pins.put({ ...card, state: 'posting' }));
    answers.say = null;
    await finishCards(desk);
    await finishCards(desk);
    expect([...pins]).toEqual(['C1 9.0']);
  });

  test('the button pins the result that it stands under, in the thread of that reply', async () => {
    const { converse, idOf, ...made } = await setUp();
    const answerId = await idOf('interval KELP 60d');
    const from = inThread(null, '4.5');
    const pressed = {
      action: 'pin',
      answerId,
      question: 'interval KELP 60d',
      place: 'channel',
      from,
    } as const;
    expect(await converse.press(pressed)).toEqual([]);
    expect([...made.posted.values()][0]?.thread).toBe('4.5');
    const [again] = await converse.press(pressed);
    expect(again?.reply.sentence).toContain('pinned here already');
  });
});

describe('unpin', () => {
  test('takes the last card of the thread off, and a card that is pinned again is posted anew', async () => {
    const { said, idOf, pins, ...made } = await setUp();
    const id = await idOf('interval KELP 60d');
    await said('pin');
    expect(await said('unpin')).toEqual([`record: ${id} is no longer pinned here.`]);
    expect([...pins]).toEqual([]);
    expect((await said('unpin'))[0]).toContain('Nothing is pinned in this thread.');
    expect((await said(`unpin ${id}`))[0]).toContain(`${id} is not pinned in this thread.`);
    expect(await said('pin')).toEqual([]);
    expect([...made.posted.keys()]).toEqual([`card:T1:C1:1.5:${id}:1`, `card:T1:C1:1.5:${id}:2`]);
    expect([...pins]).toEqual(['C1 9.1']);
  });

  test('that the platform refuses leaves the card pinned', async () => {
    const { said, idOf, answers, records } = await setUp();
    await idOf('interval KELP 60d');
    await said('pin');
    answers.unpin = { kind: 'refused', code: 'permission_denied' };
    expect((await said('unpin'))[0]).toContain('(permission_denied)');
    expect(accepted(await records.store.pins.list(['pinned'], 9))).toHaveLength(1);
  });
});

describe('the thread of a card', () => {
  const pinned = async () => {
    const made = await setUp();
    const id = await made.idOf('interval KELP 60d');
    await made.said('pin');
    return { ...made, id };
  };
  const oneMore = now(seriesOf('KELP', [...closes, 101], '2026-11-30'), seriesOf('TARN', wobbling(300)));
  const restated = now(
    seriesOf(
      'KELP',
      closes.map((close) => close * 0.5),
    ),
    seriesOf('TARN', wobbling(300)),
  );

  test('is told nothing while the prices are the same', async () => {
    const { desk, cards } = await pinned();
    await tellOfChanges(desk, asKept);
    expect(cards()).toHaveLength(1);
  });

  test('is told once that there are new days, and once that prices were restated', async () => {
    const { desk, id, cards } = await pinned();
    for (const snapshot of [oneMore, oneMore, restated, oneMore, restated])
      await tellOfChanges(desk, snapshot);
    expect(cards().slice(1)).toEqual([
      expect.stringContaining(`The pinned ${id} rests on prices to `),
      expect.stringContaining(`Prices behind the pinned ${id} were restated: those of KELP`),
    ]);
  });

  test('is told nothing of tickers that it does not rest on', async () => {
    const { desk, cards } = await pinned();
    await tellOfChanges(desk, now(seriesOf('KELP', closes), seriesOf('TARN', wobbling(300), '2026-11-30')));
    expect(cards()).toHaveLength(1);
  });

  test('is told nothing any more once a person has taken the pin off', async () => {
    const { desk, cards } = await pinned();
    await takenOff(desk, 'T1', 'C1', '9.0');
    await tellOfChanges(desk, oneMore);
    expect(cards()).toHaveLength(1);
  });

  test('is told nothing where others can read along by now, and is told where its owner has left', async () => {
    const { desk, cards } = await pinned();
    const under = (verdict: PlaceVerdict) => ({
      ...desk,
      permissions: { ...everythingAllowed, placeVerdict: async () => verdict },
    });
    await tellOfChanges(under({ kind: 'stopped', why: 'shared' }), oneMore);
    await tellOfChanges(under({ kind: 'paused', why: 'archived' }), oneMore);
    expect(cards()).toHaveLength(1);
    await tellOfChanges(under({ kind: 'paused', why: 'ownerLeft' }), oneMore);
    expect(cards()).toHaveLength(2);
  });

  test('is told later where it could not be told', async () => {
    const { desk, cards, answers } = await pinned();
    answers.say = { kind: 'refused', code: 'is_archived' };
    await tellOfChanges(desk, oneMore);
    answers.say = null;
    await tellOfChanges(desk, oneMore);
    expect(cards()).toHaveLength(2);
  });
});

describe('in a terminal', () => {
  test('the card is the reply, and it can be taken off again', async () => {
    const { ask, idOf, said, records, desk } = await setUp();
    const nowhere = { ...inThread(null), team: null, channel: '#desk', message: null };
    const id = await idOf('interval KELP 60d', nowhere);
    const [card] = await ask('pin', nowhere);
    expect(card?.reply).toMatchObject({ kind: 'record', caution: fullCaution });
    expect((await said('pin', nowhere))[0]).toContain('pinned here already');
    expect((await cardsAtTerminal(desk)).passages).toMatchObject([{ lines: [expect.stringContaining(id)] }]);
    expect(accepted(await records.store.pins.standingIn({ team: '', channel: '#desk' }))).toHaveLength(1);
    const inIts = (thread: string | null, message: string) => ({ ...nowhere, thread, message });
    await idOf('interval TARN 60d', inIts(null, '3'));
    expect((await said('pin', inIts('3', '4')))[0]).toContain('TARN’s mean');
    expect((await said('pin', inIts('9', '10')))[0]).toContain('There is no result in this thread');
    expect(await said('unpin', nowhere)).toEqual([`record: ${id} is no longer pinned here.`]);
  });
});
