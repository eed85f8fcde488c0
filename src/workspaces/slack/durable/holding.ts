import type { InstantMs } from '../../../terms/clock.ts';
import type { Lease } from '../../../terms/delivery.ts';
import type { Result } from '../../../terms/result.ts';
import type { Time } from '../ports.ts';
import type { LeasedStore } from './ports.ts';

/** How long somebody else waits before they take what this process does not renew any more. */
const leaseMs = 25_000;
const roundMs = 7_000;
const mostAtOnce = 200;

export type Holding = {
  readonly lease: () => Lease;
  /** Holds something for as long as the work on it takes; later callers for the same key get the same work. */
  readonly hold: <T>(key: string, work: () => Promise<T>) => Promise<T>;
  readonly holds: (key: string) => boolean;
  /** Renews what is held and takes over what nobody holds, now and every few seconds. */
  readonly start: () => void;
  /** Takes nothing over any more; what is held is renewed until the work on it ends. */
  readonly close: () => void;
  /** Lets others have what is left. */
  readonly stop: () => Promise<void>;
  /** Since when the store has failed at every turn; null where it works. */
  readonly failingSinceMs: () => InstantMs | null;
  /** Takes notice of how the store did. */
  readonly note: <T>(outcome: Result<T>) => Result<T>;
};

/** The leases of one process on one kind of thing. `takeUp` deals with what another has left behind. */
export const makeHolding = <Item extends { readonly key: string }>(
  holder: string,
  store: LeasedStore<Item>,
  time: Time,
  takeUp: (item: Item) => void,
): Holding => {
  const held = new Map<string, Promise<unknown>>();
  let closed = false;
  let stopped = false;
  let failingSinceMs: InstantMs | null = null;
  let callOff = () => {};
  const lease = (): Lease => ({ holder, untilMs: time.nowMs() + leaseMs });

  const note = <T>(outcome: Result<T>): Result<T> => {
    failingSinceMs = outcome.ok ? null : (failingSinceMs ?? time.nowMs());
    return outcome;
  };

  const round = async (): Promise<void> => {
    const keys = [...held.keys()];
    note(await store.renew(keys, lease()));
    const room = mostAtOnce - keys.length;
    if (closed || room <= 0) return;
    const left = note(await store.takeOver(lease(), time.nowMs(), keys, room));
    // what came in by itself while the store was asked is under way already
    if (left.ok) for (const item of left.value) if (!held.has(item.key)) takeUp(item);
  };

  const goOn = async (): Promise<void> => {
    await round();
    if (!stopped) callOff = time.after(roundMs, () => void goOn());
  };

  return {
    lease,
    hold: async (key, work) => {
      const task = work();
      held.set(key, task);
      try {
        return await task;
      } finally {
        // the work may have left something to be done under the same key
        if (held.get(key) === task) held.delete(key);
      }
    },
    holds: (key) => held.has(key),
    start: () => void goOn(),
    close: () => {
      closed = true;
    },
    stop: async () => {
      closed = true;
      stopped = true;
      callOff();
      await store.release(holder);
    },
    failingSinceMs: () => failingSinceMs,
    note,
  };
};
