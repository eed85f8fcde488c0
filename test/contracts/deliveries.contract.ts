import { describe, expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import type { Saying } from '../../src/terms/delivery.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';

const sayingOf = (key: string, more: Partial<Saying> = {}): Saying => ({
  key,
  team: 'T1',
  channel: 'C1',
  threadTs: '1.5',
  content: { text: `text of ${key}`, blocks: [{ type: 'divider' }] },
  urgent: false,
  expiresAtMs: null,
  ...more,
});
const leaseOf = (holder: string, untilMs = 100) => ({ holder, untilMs });

/** What every store of deliveries must do. `open` gives an empty store. */
export const deliveriesContract = (name: string, open: () => Promise<Store>): void => {
  describe(`deliveries ${name}`, () => {
    test('keep what is first given under a key', async () => {
      const { deliveries } = await open();
      const first = accepted(await deliveries.take(sayingOf('K'), 'id-1', leaseOf('ann'), 10));
      expect(first).toEqual({
        ...sayingOf('K'),
        deliveryId: 'id-1',
        createdAtMs: 10,
        firstAttemptMs: null,
        lastAttemptMs: null,
        unsure: false,
        lease: leaseOf('ann'),
        outcome: null,
      });
      const other = sayingOf('K', { channel: 'C2', threadTs: null, urgent: true, expiresAtMs: 5 });
      expect(accepted(await deliveries.take(other, 'id-2', leaseOf('ben', 300), 20))).toEqual(first);
      expect(refusalCode(await deliveries.take(sayingOf('L'), 'id-1', leaseOf('ann'), 10))).toBe(
        'storeUnavailable',
      );
    });

    test('keep what a saying says to the last character', async () => {
      const { deliveries } = await open();
      const saying = sayingOf('K', {
        content: { text: 'ES 3.1 % – “Ünïcode” \u2028 😀', blocks: [] },
        urgent: true,
        expiresAtMs: 1_796_114_400_000,
        threadTs: null,
      });
      expect(
        accepted(await deliveries.take(saying, 'id-1', leaseOf('ann'), 1_796_114_399_999)),
      ).toMatchObject({ ...saying, createdAtMs: 1_796_114_399_999 });
    });

    test('note each attempt before it is made, and only for the one who holds them', async () => {
      const { deliveries } = await open();
      accepted(await deliveries.take(sayingOf('K'), 'id-1', leaseOf('ann'), 10));
      expect(accepted(await deliveries.begin('K', leaseOf('ben'), 20))).toBe(false);
      expect(accepted(await deliveries.begin('K', leaseOf('ann'), 20))).toBe(true);
      const begun = { firstAttemptMs: 20, lastAttemptMs: 20, unsure: true };
      expect(accepted(await deliveries.find(['K', 'nothing']))).toMatchObject([begun]);
      accepted(await deliveries.undone('K', 'ben'));
      expect(accepted(await deliveries.find(['K']))).toMatchObject([begun]);
      accepted(await deliveries.undone('K', 'ann'));
      expect(accepted(await deliveries.begin('K', leaseOf('ann', 400), 30))).toBe(true);
      expect(accepted(await deliveries.find(['K']))).toMatchObject([
        { firstAttemptMs: 20, lastAttemptMs: 30, unsure: true, lease: leaseOf('ann', 400) },
      ]);
    });

    test('are settled once and for all', async () => {
      const { deliveries } = await open();
      accepted(await deliveries.take(sayingOf('K'), 'id-1', leaseOf('ann'), 10));
      accepted(await deliveries.settle('K', { kind: 'said', ts: '7.7' }, 20));
      accepted(await deliveries.settle('K', { kind: 'refused', code: 'is_archived' }, 30));
      const outcome = { kind: 'said', ts: '7.7' };
      expect(accepted(await deliveries.take(sayingOf('K'), 'id-2', leaseOf('ben'), 900))).toMatchObject({
        outcome,
      });
      expect(accepted(await deliveries.begin('K', leaseOf('ann'), 40))).toBe(false);
      expect(accepted(await deliveries.takeOver(leaseOf('ben'), 900, [], 9))).toEqual([]);
    });

    test('go to another once nobody holds them, what a person waits for first', async () => {
      const { deliveries } = await open();
      accepted(await deliveries.take(sayingOf('K1'), 'id-1', leaseOf('ann'), 1));
      accepted(await deliveries.take(sayingOf('K2'), 'id-2', leaseOf('ann'), 2));
      accepted(await deliveries.take(sayingOf('K3', { urgent: true }), 'id-3', leaseOf('ann'), 3));
      accepted(await deliveries.take(sayingOf('K4'), 'id-4', leaseOf('ann'), 4));
      accepted(await deliveries.renew(['K4'], leaseOf('ann', 500)));
      expect(accepted(await deliveries.takeOver(leaseOf('ben'), 100, [], 9))).toEqual([]);
      const first = accepted(await deliveries.takeOver(leaseOf('ben', 300), 101, [], 1));
      expect(first.map(({ key }) => key)).toEqual(['K3']);
      const others = accepted(await deliveries.takeOver(leaseOf('ben', 300), 101, ['K3'], 9));
      expect(others.map(({ key }) => key).sort()).toEqual(['K1', 'K2']);
      expect(accepted(await deliveries.begin('K1', leaseOf('ann'), 102))).toBe(false);
      accepted(await deliveries.release('ben'));
      expect(accepted(await deliveries.takeOver(leaseOf('cem'), 102, [], 9))).toHaveLength(3);
    });

    test('are taken back by key where the lease of another has run out', async () => {
      const { deliveries } = await open();
      accepted(await deliveries.take(sayingOf('K'), 'id-1', leaseOf('ann'), 1));
      const lease = leaseOf('ben', 300);
      expect(accepted(await deliveries.take(sayingOf('K'), 'id-2', lease, 100)).lease?.holder).toBe('ann');
      expect(accepted(await deliveries.take(sayingOf('K'), 'id-2', lease, 101)).lease).toEqual(lease);
    });

    test('lose their content some time after they are settled, and their key much later', async () => {
      const { deliveries } = await open();
      accepted(await deliveries.take(sayingOf('K'), 'id-1', leaseOf('ann'), 1));
      accepted(await deliveries.take(sayingOf('L'), 'id-2', leaseOf('ann'), 1));
      accepted(await deliveries.settle('K', { kind: 'expired' }, 20));
      accepted(await deliveries.tidy(20, 20));
      expect(accepted(await deliveries.find(['K']))).toMatchObject([{ content: sayingOf('K').content }]);
      accepted(await deliveries.tidy(21, 20));
      expect(accepted(await deliveries.find(['K']))).toMatchObject([
        { content: { text: '', blocks: [] }, outcome: { kind: 'expired' } },
      ]);
      accepted(await deliveries.tidy(999, 999));
      const left = accepted(await deliveries.find(['K', 'L']));
      expect(left).toMatchObject([{ key: 'L', content: sayingOf('L').content }]);
    });
  });
};
