import { expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import { accepted } from '../laws/outcomes.ts';
import { answerOf, askingAt } from '../records/madeRecords.ts';

const from = (more: object) => ({
  team: 'T1',
  channel: 'C1',
  person: 'U1',
  message: '1.5',
  thread: null,
  ...more,
});

/** What every store must find of the askings of a thread and of a person. `open` gives an empty one. */
export const conversationsContract = (open: () => Promise<Store>): void => {
  const filled = async (...askings: readonly (readonly [string, number, object])[]): Promise<Store> => {
    const store = await open();
    for (const [id, askedAtMs, more] of askings)
      accepted(await store.keep(answerOf(id), askingAt(askedAtMs, { from: from(more) })));
    return store;
  };
  const idsIn = async (store: Store, place: object, most = 5) =>
    accepted(
      await store.conversations.lastIn({ team: 'T1', channel: 'C1', thread: '1.5', ...place }, most),
    ).map(({ id }) => id);

  test('the thread that a question began holds it and what was asked in it, the newest first', async () => {
    const store = await filled(
      ['R-A', 1, {}],
      ['R-B', 3, { message: '2.5', thread: '1.5' }],
      ['R-C', 2, { message: '2.1', thread: '1.5' }],
      ['R-D', 4, { message: '3.5' }],
    );
    expect(await idsIn(store, {})).toEqual(['R-B', 'R-C', 'R-A']);
    expect(await idsIn(store, {}, 1)).toEqual(['R-B']);
  });

  test('threads of other channels and teams are others', async () => {
    const store = await filled(
      ['R-A', 1, { channel: 'C2' }],
      ['R-B', 2, { team: 'T2' }],
      ['R-C', 3, { team: null }],
    );
    expect(await idsIn(store, {})).toEqual([]);
    expect(await idsIn(store, { channel: 'C2' })).toEqual(['R-A']);
    expect(await idsIn(store, { team: null })).toEqual(['R-C']);
  });

  test('outside threads a direct conversation holds what was asked in none', async () => {
    const store = await filled(
      ['R-A', 1, { channel: 'D1' }],
      ['R-B', 2, { channel: 'D1', message: '2.5', thread: '1.5' }],
    );
    expect(await idsIn(store, { channel: 'D1', thread: null })).toEqual(['R-A']);
  });

  test('an entry carries the question as it is kept, and who asked', async () => {
    const store = await filled(['R-A', 7, {}]);
    const [entry] = accepted(
      await store.conversations.lastIn({ team: 'T1', channel: 'C1', thread: '1.5' }, 1),
    );
    const { verb, body } = answerOf('R-A');
    expect(entry).toEqual({ id: 'R-A', verb, body, askedAtMs: 7, place: 'channel', from: from({}) });
  });

  test('a person’s askings are found in their team alone, the newest first', async () => {
    const store = await filled(
      ['R-A', 1, {}],
      ['R-B', 2, { person: 'U2' }],
      ['R-C', 3, { channel: 'C2' }],
      ['R-D', 4, { team: 'T2' }],
    );
    const mine = accepted(await store.conversations.askedBy('T1', 'U1', 5));
    expect(mine.map(({ id, question }) => [id, question])).toEqual([
      ['R-C', 'interval KELP 60d at 95%'],
      ['R-A', 'interval KELP 60d at 95%'],
    ]);
    expect(accepted(await store.conversations.askedBy('T1', 'U1', 1))).toHaveLength(1);
  });
};
