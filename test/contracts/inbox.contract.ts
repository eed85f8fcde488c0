import { describe, expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import type { InboxEvent } from '../../src/terms/inbox.ts';
import { accepted } from '../laws/outcomes.ts';

const eventOf = (key: string, more: Partial<InboxEvent> = {}): InboxEvent => ({
  key,
  messageKey: `message of ${key}`,
  kind: 'question',
  askedAtMs: 1_000,
  body: `{"text":"${key}"}`,
  ...more,
});
const leaseOf = (holder: string, untilMs = 100) => ({ holder, untilMs });

/** What every inbox must do. `open` gives an empty store. */
export const inboxContract = (name: string, open: () => Promise<Store>): void => {
  describe(`the inbox ${name}`, () => {
    test('gives an event to the one who keeps it first, and to nobody beside them', async () => {
      const { inbox } = await open();
      const first = accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 10));
      expect(first).toEqual({ ...eventOf('E1'), tries: 1, editing: null, settled: false });
      expect(accepted(await inbox.keep(eventOf('E1', { body: 'other' }), leaseOf('ben'), 20))).toBe(null);
      expect(accepted(await inbox.takeOver(leaseOf('ben'), 20, [], 9))).toEqual([]);
    });

    test('lets another take an event over once its lease has run out, the oldest first', async () => {
      const { inbox } = await open();
      for (const [key, askedAtMs] of [
        ['E1', 30],
        ['E2', 20],
        ['E3', 40],
      ] as const)
        accepted(await inbox.keep(eventOf(key, { askedAtMs }), leaseOf('ann'), 10));
      accepted(await inbox.renew(['E3'], leaseOf('ann', 500)));
      expect(accepted(await inbox.takeOver(leaseOf('ben', 200), 100, [], 9))).toEqual([]);
      expect(accepted(await inbox.takeOver(leaseOf('ben', 200), 101, [], 1))).toMatchObject([
        { key: 'E2', tries: 2 },
      ]);
      expect(accepted(await inbox.takeOver(leaseOf('cem', 200), 101, [], 9))).toMatchObject([{ key: 'E1' }]);
      accepted(await inbox.renew(['E1', 'E2'], leaseOf('ann', 900)));
      expect(accepted(await inbox.takeOver(leaseOf('ben', 300), 201, ['E2'], 9))).toMatchObject([
        { key: 'E1', tries: 3 },
      ]);
    });

    test('gives what was released to whoever asks next', async () => {
      const { inbox } = await open();
      accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 10));
      accepted(await inbox.release('ben'));
      expect(accepted(await inbox.takeOver(leaseOf('ben'), 20, [], 9))).toEqual([]);
      accepted(await inbox.release('ann'));
      expect(accepted(await inbox.takeOver(leaseOf('ben'), 20, [], 9))).toHaveLength(1);
    });

    test('never gives again what was dealt with, however often it arrives', async () => {
      const { inbox } = await open();
      accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 10));
      accepted(await inbox.settle('E1', 15));
      accepted(await inbox.release('ann'));
      expect(accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 20))).toBe(null);
      expect(accepted(await inbox.takeOver(leaseOf('ben'), 9_999, [], 9))).toEqual([]);
      accepted(await inbox.tidy(15));
      expect(accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 20))).toBe(null);
      accepted(await inbox.tidy(16));
      expect(accepted(await inbox.keep(eventOf('E1'), leaseOf('ann'), 20))).not.toBe(null);
    });

    test('remembers the message that was to become the answer, and finds the events of a message', async () => {
      const { inbox } = await open();
      accepted(await inbox.keep(eventOf('E2', { messageKey: 'M', askedAtMs: 2 }), leaseOf('ann'), 10));
      accepted(await inbox.keep(eventOf('E1', { messageKey: 'M', askedAtMs: 1 }), leaseOf('ann'), 10));
      accepted(await inbox.keep(eventOf('E3', { messageKey: null }), leaseOf('ann'), 10));
      const at = { channel: 'C1', ts: '5.5', content: { text: 'so', blocks: [{ type: 'divider' }] } };
      accepted(await inbox.willEdit('E2', at));
      accepted(await inbox.settle('E1', 12));
      expect(accepted(await inbox.ofMessage('M'))).toMatchObject([
        { key: 'E1', editing: null, settled: true },
        { key: 'E2', editing: at, settled: false },
      ]);
    });

    test('gives each of many events to one of several takers', async () => {
      const { inbox } = await open();
      const keys = Array.from({ length: 12 }, (_, index) => `E${index}`);
      for (const key of keys) accepted(await inbox.keep(eventOf(key), leaseOf('ann', 20), 10));
      const taken = await Promise.all(
        ['ben', 'cem', 'dot'].map(async (holder) =>
          accepted(await inbox.takeOver(leaseOf(holder, 200), 50, [], 12)),
        ),
      );
      expect(taken.flatMap((events) => events.map(({ key }) => key)).sort()).toEqual([...keys].sort());
    });
  });
};
