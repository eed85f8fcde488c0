import { expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import type { PinnedCard } from '../../src/terms/pins.ts';
import { accepted } from '../laws/outcomes.ts';
import { answerOf, askingAt } from '../records/madeRecords.ts';

export const cardMade = (more: Partial<PinnedCard> = {}): PinnedCard => ({
  team: 'T1',
  channel: 'C1',
  thread: '1.5',
  answerId: 'R-A',
  question: 'interval KELP 60d at 95%',
  asOf: '2026-11-27',
  sentence: 'KELP’s mean …',
  person: 'U1',
  state: 'pinned',
  cardTs: '2.5',
  times: 1,
  pinnedAtMs: 1_796_000_000_000,
  toldMoved: false,
  toldRestated: false,
  ...more,
});

const place = { team: 'T1', channel: 'C1', thread: '1.5' };

/** What every store of pinned cards must do. `open` gives an empty one. */
export const pinsContract = (open: () => Promise<Store>): void => {
  const holding = async (...cards: readonly PinnedCard[]) => {
    const { pins } = await open();
    for (const card of cards) accepted(await pins.put(card));
    return pins;
  };

  test('a card is given back as it was kept, at the top of a channel too', async () => {
    const top = cardMade({ thread: null, cardTs: null, person: null, state: 'posting', toldMoved: true });
    const pins = await holding(cardMade(), top);
    expect(accepted(await pins.find(place, 'R-A'))).toEqual(cardMade());
    expect(accepted(await pins.find({ ...place, thread: null }, 'R-A'))).toEqual(top);
    expect(accepted(await pins.find(place, 'R-B'))).toBe(null);
    expect(accepted(await pins.find({ ...place, team: 'T2' }, 'R-A'))).toBe(null);
  });

  test('one result has one card in a thread, the last that was kept', async () => {
    const later = cardMade({ state: 'removed', cardTs: '9.5', times: 2, toldRestated: true });
    const pins = await holding(cardMade(), later);
    expect(accepted(await pins.find(place, 'R-A'))).toEqual(later);
    expect(accepted(await pins.list(['posting', 'pinned', 'standing', 'removed'], 9))).toEqual([later]);
  });

  test('a card is found by its message', async () => {
    const pins = await holding(cardMade(), cardMade({ answerId: 'R-B', cardTs: '3.5' }));
    expect(accepted(await pins.findCard('T1', 'C1', '3.5'))?.answerId).toBe('R-B');
    expect(accepted(await pins.findCard('T1', 'C2', '3.5'))).toBe(null);
  });

  test('those that stand are listed by thread and by channel, the newest first', async () => {
    const pins = await holding(
      cardMade({ answerId: 'R-A', pinnedAtMs: 1 }),
      cardMade({ answerId: 'R-B', pinnedAtMs: 2, state: 'standing' }),
      cardMade({ answerId: 'R-C', pinnedAtMs: 3, thread: '7.5' }),
      cardMade({ answerId: 'R-D', pinnedAtMs: 4, state: 'removed' }),
      cardMade({ answerId: 'R-E', pinnedAtMs: 5, channel: 'C2' }),
    );
    const ids = (cards: readonly PinnedCard[]) => cards.map(({ answerId }) => answerId);
    expect(ids(accepted(await pins.standingIn(place)))).toEqual(['R-B', 'R-A']);
    expect(ids(accepted(await pins.standingIn({ team: 'T1', channel: 'C1' })))).toEqual([
      'R-C',
      'R-B',
      'R-A',
    ]);
    expect(ids(accepted(await pins.list(['pinned'], 2)))).toEqual(['R-A', 'R-C']);
  });

  test('a channel with a new id takes its cards along, and every new id is known in order', async () => {
    const pins = await holding(cardMade(), cardMade({ channel: 'C2', answerId: 'R-B' }));
    accepted(await pins.moveChannel({ team: 'T1', from: 'C1', to: 'C9' }));
    accepted(await pins.moveChannel({ team: 'T1', from: 'C9', to: 'C8' }));
    expect(accepted(await pins.find({ ...place, channel: 'C8' }, 'R-A'))?.cardTs).toBe('2.5');
    expect(accepted(await pins.find({ ...place, channel: 'C2' }, 'R-B'))).not.toBe(null);
    expect(accepted(await pins.moves())).toEqual([
      { team: 'T1', from: 'C1', to: 'C8' },
      { team: 'T1', from: 'C9', to: 'C8' },
    ]);
  });

  test('what was asked under an id that a channel had before was asked in that channel', async () => {
    const store = await open();
    const from = { team: 'T1', channel: 'C1', person: 'U1', message: '1.5', thread: null };
    accepted(await store.keep(answerOf('R-A'), askingAt(1, { from })));
    const lastIn = async (channel: string) =>
      accepted(await store.conversations.lastIn({ team: 'T1', channel, thread: '1.5' }, 5)).map(
        ({ id }) => id,
      );
    expect(await lastIn('C8')).toEqual([]);
    accepted(await store.pins.moveChannel({ team: 'T1', from: 'C1', to: 'C9' }));
    accepted(await store.pins.moveChannel({ team: 'T1', from: 'C9', to: 'C8' }));
    expect(await lastIn('C8')).toEqual(['R-A']);
    expect(await lastIn('C7')).toEqual([]);
  });
};
