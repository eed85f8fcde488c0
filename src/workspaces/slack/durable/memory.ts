import type { KeptSaying } from '../../../terms/delivery.ts';
import { placeholderKey, replyKey } from '../keys.ts';
import type { EventMemory, Recalled, Time } from '../ports.ts';
import { wait } from '../wait.ts';
import type { DurableInbox } from './inbox.ts';
import type { Outbox } from './outbox.ts';
import type { DeliveryStore } from './ports.ts';

const patienceMs = 30_000;
const storeRetryMs = 1_000;

const firstTime: Recalled = { again: false, standing: null, editing: null, replied: false };

/** What an earlier try at an answer has left in the workspace, from the records. */
export const makeMemory = (
  inbox: Pick<DurableInbox, 'underWay' | 'willEdit'>,
  outbox: Outbox,
  store: DeliveryStore,
  time: Time,
): EventMemory => {
  /** Without knowing what stands, the answer could be given twice: a store in trouble is waited for, for a while. */
  const left = async (keys: readonly string[]): Promise<readonly KeptSaying[]> => {
    for (const untilMs = time.nowMs() + patienceMs; ; ) {
      const found = await store.find(keys);
      if (found.ok) return found.value;
      if (time.nowMs() >= untilMs) return [];
      await wait(time, storeRetryMs);
    }
  };

  /** A placeholder of which it is not known whether it stands is cleared up first. */
  const standingOf = async (placeholder: KeptSaying | undefined) => {
    if (placeholder === undefined) return null;
    const outcome = placeholder.outcome ?? (await outbox.say(placeholder));
    return outcome.kind === 'said' ? { channel: placeholder.channel, ts: outcome.ts } : null;
  };

  return {
    recall: async (key) => {
      const event = inbox.underWay(key);
      if (event === null || event.tries <= 1) return firstTime;
      const kept = await left([placeholderKey(key), replyKey(key, 0)]);
      const placeholder = await standingOf(kept.find((saying) => saying.key === placeholderKey(key)));
      const replied = kept.some((saying) => saying.key === replyKey(key, 0));
      const editing = replied ? null : event.editing;
      const changed = editing === null ? null : { channel: editing.channel, ts: editing.ts };
      return { again: true, standing: placeholder ?? changed, editing, replied };
    },
    willEdit: inbox.willEdit,
  };
};
