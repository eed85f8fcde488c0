import { describe, expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import type { SubscriptionFilter } from '../../src/terms/subscriptions.ts';
import { accepted } from '../laws/outcomes.ts';
import { newDigest, newWatch } from '../records/madeSubscriptions.ts';

const claimOf = (holder: string, nowMs: number, key = 'digest:T1:D-1:1') => ({
  key,
  holder,
  nowMs,
  leaseMs: 100,
});

/** What every store of digests and watches must do. `open` gives an empty store. */
export const subscriptionsContract = (
  name: string,
  open: () => Promise<Pick<Store, 'subscriptions'>>,
): void => {
  describe(`digests and watches ${name}`, () => {
    test('are given back as they were made', async () => {
      const { subscriptions } = await open();
      const made = accepted(await subscriptions.add(newDigest()));
      expect(made).toEqual({ ...newDigest(), id: 'D-1', revision: 1 });
      expect(accepted(await subscriptions.find('T1', 'D-1'))).toEqual(made);
      const watch = accepted(await subscriptions.add(newWatch()));
      expect(accepted(await subscriptions.find('T1', 'W-1'))).toEqual(watch);
    });

    test('are counted in each team and each kind, and not found elsewhere', async () => {
      const { subscriptions } = await open();
      const ids: string[] = [];
      for (const given of [newDigest(), newWatch(), newDigest(), newDigest({ team: 'T2' }), newWatch()])
        ids.push(accepted(await subscriptions.add(given)).id);
      expect(ids).toEqual(['D-1', 'W-1', 'D-2', 'D-1', 'W-2']);
      expect(accepted(await subscriptions.find('T2', 'D-2'))).toBe(null);
    });

    test('made at the same time get different ids', async () => {
      const { subscriptions } = await open();
      const made = await Promise.all(Array.from({ length: 12 }, () => subscriptions.add(newDigest())));
      expect(new Set(made.map((each) => accepted(each).id)).size).toBe(12);
    });

    test('are listed in the order of their making, by what is asked of them', async () => {
      const { subscriptions } = await open();
      for (let each = 1; each <= 11; each += 1) accepted(await subscriptions.add(newDigest()));
      accepted(await subscriptions.add(newWatch({ channel: 'C2', owner: 'U2' })));
      accepted(await subscriptions.add(newDigest({ state: 'stopped' })));
      const idsOf = async (filter: Omit<SubscriptionFilter, 'team'>) =>
        accepted(await subscriptions.list({ team: 'T1', ...filter })).map(({ id }) => id);
      expect((await idsOf({ kind: 'digest' })).slice(8)).toEqual(['D-9', 'D-10', 'D-11', 'D-12']);
      expect(await idsOf({ channel: 'C2' })).toEqual(['W-1']);
      expect(await idsOf({ owner: 'U2' })).toEqual(['W-1']);
      expect(await idsOf({ states: ['stopped', 'paused'] })).toEqual(['D-12']);
      expect(await idsOf({})).toHaveLength(13);
      expect(accepted(await subscriptions.list({ team: 'T9' }))).toEqual([]);
    });

    test('are changed by whoever read them last, and by nobody else', async () => {
      const { subscriptions } = await open();
      const made = accepted(await subscriptions.add(newDigest()));
      const paused = accepted(await subscriptions.save({ ...made, state: 'paused', pausedWhy: 'person' }));
      expect(paused).toEqual({ ...made, state: 'paused', pausedWhy: 'person', revision: 2 });
      expect(accepted(await subscriptions.save({ ...made, state: 'stopped' }))).toBe(null);
      expect(accepted(await subscriptions.find('T1', 'D-1'))).toEqual(paused);
      expect(accepted(await subscriptions.save({ ...made, id: 'D-9' }))).toBe(null);
    });

    test('fall due in the order of their instants, the last of them at its very instant', async () => {
      const { subscriptions } = await open();
      for (const nextDueMs of [300, 100, null, 200, 301])
        accepted(await subscriptions.add(newDigest({ nextDueMs })));
      accepted(await subscriptions.add(newDigest({ team: 'T2', nextDueMs: 1 })));
      const due = async (nowMs: number, most = 10) =>
        accepted(await subscriptions.dueBefore('T1', nowMs, most)).map(({ nextDueMs }) => nextDueMs);
      expect(await due(300)).toEqual([100, 200, 300]);
      expect(await due(300, 2)).toEqual([100, 200]);
      expect(await due(99)).toEqual([]);
    });

    test('wait for prices until an instant', async () => {
      const { subscriptions } = await open();
      for (const awaitingUntilMs of [null, 50, 60])
        accepted(await subscriptions.add(newDigest({ awaitingUntilMs })));
      const waiting = async (nowMs: number) =>
        accepted(await subscriptions.awaitingPrices('T1', nowMs)).map(({ id }) => id);
      expect(await waiting(50)).toEqual(['D-2', 'D-3']);
      expect(await waiting(61)).toEqual([]);
      expect(accepted(await subscriptions.awaitingPrices('T2', 1))).toEqual([]);
    });

    test('follow a channel that has got another id', async () => {
      const { subscriptions } = await open();
      const made = accepted(await subscriptions.add(newDigest()));
      accepted(await subscriptions.add(newDigest({ channel: 'C2' })));
      expect(accepted(await subscriptions.moveChannel('T1', 'C1', 'C9'))).toBe(1);
      expect(accepted(await subscriptions.find('T1', 'D-1'))).toEqual({
        ...made,
        channel: 'C9',
        revision: 2,
      });
      expect(accepted(await subscriptions.save(made))).toBe(null);
    });
  });

  describe(`claims ${name}`, () => {
    test('are held by one at a time, until the lease ends', async () => {
      const { subscriptions } = await open();
      expect(accepted(await subscriptions.claim(claimOf('ann', 0)))).toBe(true);
      expect(accepted(await subscriptions.claim(claimOf('ben', 50)))).toBe(false);
      expect(accepted(await subscriptions.claim(claimOf('ann', 50)))).toBe(true);
      expect(accepted(await subscriptions.claim(claimOf('ben', 150)))).toBe(false);
      expect(accepted(await subscriptions.claim(claimOf('ben', 151)))).toBe(true);
      expect(accepted(await subscriptions.claim(claimOf('ann', 152)))).toBe(false);
      expect(accepted(await subscriptions.claim(claimOf('ann', 152, 'digest:T1:D-2:1')))).toBe(true);
    });

    test('of several at once are won by one', async () => {
      const { subscriptions } = await open();
      const won = await Promise.all(
        ['ann', 'ben', 'cat', 'dan'].map((holder) => subscriptions.claim(claimOf(holder, 0))),
      );
      expect(won.map(accepted).filter(Boolean)).toHaveLength(1);
    });

    test('are given back by who holds them, and by nobody else', async () => {
      const { subscriptions } = await open();
      accepted(await subscriptions.claim(claimOf('ann', 0)));
      accepted(await subscriptions.release(claimOf('ben', 0).key, 'ben'));
      expect(accepted(await subscriptions.claim(claimOf('ben', 1)))).toBe(false);
      accepted(await subscriptions.release(claimOf('ann', 0).key, 'ann'));
      expect(accepted(await subscriptions.claim(claimOf('ben', 1)))).toBe(true);
    });

    test('that are settled are nobody’s any more, until they are forgotten', async () => {
      const { subscriptions } = await open();
      accepted(await subscriptions.claim(claimOf('ann', 0)));
      accepted(await subscriptions.settle(claimOf('ann', 0).key, 20));
      for (const holder of ['ann', 'ben'])
        expect(accepted(await subscriptions.claim(claimOf(holder, 1_000)))).toBe(false);
      accepted(await subscriptions.release(claimOf('ann', 0).key, 'ann'));
      expect(accepted(await subscriptions.claim(claimOf('ann', 1_000)))).toBe(false);
      expect(accepted(await subscriptions.forgetSettled(20))).toBe(0);
      expect(accepted(await subscriptions.forgetSettled(21))).toBe(1);
      expect(accepted(await subscriptions.claim(claimOf('ben', 1_000)))).toBe(true);
    });
  });
};
