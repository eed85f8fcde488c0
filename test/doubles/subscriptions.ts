import type { SubscriptionStore } from '../../src/records/subscriptions.ts';
import { type Result, succeed } from '../../src/terms/result.ts';
import type { Subscription } from '../../src/terms/subscriptions.ts';

type Held = { holder: string | null; untilMs: number; settledAtMs: number | null };

const given = <T>(value: T): Promise<Result<T>> => Promise.resolve(succeed(value));

/** Digests and watches in memory, for simulations of many ticks. It keeps what the contract of the store asks. */
export const subscriptionsInMemory = (): SubscriptionStore => {
  const kept = new Map<string, Subscription>();
  const counted = new Map<string, number>();
  const claims = new Map<string, Held>();
  const keyOf = (team: string, id: string): string => `${team} ${id}`;
  const all = (team: string): Subscription[] => [...kept.values()].filter((each) => each.team === team);
  const put = (subscription: Subscription): Subscription => {
    kept.set(keyOf(subscription.team, subscription.id), subscription);
    return subscription;
  };

  return {
    add: (made) => {
      const counter = `${made.team} ${made.kind}`;
      const number = (counted.get(counter) ?? 0) + 1;
      counted.set(counter, number);
      return given(put({ ...made, id: `${made.kind === 'digest' ? 'D' : 'W'}-${number}`, revision: 1 }));
    },
    find: (team, id) => given(kept.get(keyOf(team, id)) ?? null),
    list: ({ team, kind, channel, owner, states }) =>
      given(
        all(team).filter(
          (each) =>
            (kind === undefined || each.kind === kind) &&
            (channel === undefined || each.channel === channel) &&
            (owner === undefined || each.owner === owner) &&
            (states === undefined || states.includes(each.state)),
        ),
      ),
    save: (changed) => {
      const current = kept.get(keyOf(changed.team, changed.id));
      if (current?.revision !== changed.revision) return given(null);
      return given(put({ ...changed, revision: changed.revision + 1 }));
    },
    dueBefore: (team, nowMs, most) =>
      given(
        all(team)
          .filter(({ nextDueMs }) => nextDueMs !== null && nextDueMs <= nowMs)
          .sort((first, second) => (first.nextDueMs ?? 0) - (second.nextDueMs ?? 0))
          .slice(0, most),
      ),
    awaitingPrices: (team, nowMs) =>
      given(all(team).filter(({ awaitingUntilMs }) => awaitingUntilMs !== null && awaitingUntilMs >= nowMs)),
    moveChannel: (team, from, to) => {
      const moved = all(team).filter(({ channel }) => channel === from);
      for (const each of moved) put({ ...each, channel: to, revision: each.revision + 1 });
      return given(moved.length);
    },
    claim: ({ key, holder, nowMs, leaseMs }) => {
      const held = claims.get(key);
      const free =
        held === undefined ||
        (held.settledAtMs === null &&
          (held.holder === null || held.holder === holder || held.untilMs < nowMs));
      if (free) claims.set(key, { holder, untilMs: nowMs + leaseMs, settledAtMs: null });
      return given(free);
    },
    settle: (key, nowMs) => {
      const held = claims.get(key);
      if (held !== undefined) held.settledAtMs ??= nowMs;
      return given(null);
    },
    release: (key, holder) => {
      const held = claims.get(key);
      if (held?.holder === holder) Object.assign(held, { holder: null, untilMs: 0 });
      return given(null);
    },
    forgetSettled: (beforeMs) => {
      const old = [...claims].filter(([, { settledAtMs }]) => settledAtMs !== null && settledAtMs < beforeMs);
      for (const [key] of old) claims.delete(key);
      return given(old.length);
    },
  };
};
