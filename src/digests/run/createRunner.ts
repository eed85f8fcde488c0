import type { InstantMs } from '../../terms/clock.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import { readDigestBody } from '../body.ts';
import { change, planned } from './changing.ts';
import type { Calendars, RunParts } from './parts.ts';
import { runDigest } from './runDigest.ts';
import { runFresh } from './runFresh.ts';
import { runWatch } from './runWatch.ts';

/** Does what falls due. `tick` starts it and `idle` waits for what was started. */
export type DigestRunner = {
  readonly tick: () => Promise<void>;
  readonly idle: () => Promise<void>;
};

const mostAtOnce = 20_000;
const hourMs = 3_600_000;
const dayMs = 24 * hourMs;
const keepSettledMs = 30 * dayMs;

/** What was looked at last, so that nothing is looked at anew at every tick. */
type Seen = {
  calendars: Calendars | null;
  fingerprint: string | null;
  watchedAtMs: InstantMs;
  tidiedAtMs: InstantMs;
};

/** What is under way is not begun again: delivering may take as long as the platform is away. */
const tasks = (tell: (message: string) => void) => {
  const underWay = new Map<string, Promise<void>>();
  return {
    begin: (key: string, run: () => Promise<void>): void => {
      if (underWay.has(key)) return;
      const task = run()
        .catch((error: unknown) => {
          const reason = error instanceof Error ? (error.stack ?? error.message) : String(error);
          tell(`${key} failed: ${reason}`);
        })
        .finally(() => underWay.delete(key));
      underWay.set(key, task);
    },
    idle: async (): Promise<void> => {
      while (underWay.size > 0) await Promise.all(underWay.values());
    },
  };
};

/** Other holidays move what is planned: every digest is planned anew where that changes it. */
const planAnew = async (parts: RunParts, calendars: Calendars): Promise<boolean> => {
  const { store, team, tell } = parts;
  const all = await store.list({ team, kind: 'digest', states: ['active', 'paused'] });
  if (!all.ok) {
    tell(`Digests could not be planned: ${all.problem.message}`);
    return false;
  }
  for (const subscription of all.value) {
    const body = readDigestBody(subscription);
    if (!body.ok) continue;
    const calendar = calendars.of(body.value.tickers);
    if (planned(subscription, calendar).nextDueMs !== subscription.nextDueMs)
      await change(parts, subscription, (current) => planned(current, calendar));
  }
  return true;
};

const watchable = ({ state, pausedWhy }: Subscription): boolean =>
  state === 'active' || pausedWhy === 'place';

export const createRunner = (parts: RunParts): DigestRunner => {
  const { store, team, clock, tell } = parts;
  const { begin, idle } = tasks(tell);
  const seen: Seen = { calendars: null, fingerprint: null, watchedAtMs: 0, tidiedAtMs: 0 };

  const lookAtDue = async (): Promise<void> => {
    const due = await store.dueBefore(team, clock.nowMs(), mostAtOnce);
    if (!due.ok) return tell(`What is due cannot be read: ${due.problem.message}`);
    for (const subscription of due.value) begin(subscription.id, () => runDigest(parts, subscription));
    const awaiting = await store.awaitingPrices(team, clock.nowMs());
    if (!awaiting.ok) return;
    for (const subscription of awaiting.value)
      begin(`${subscription.id} fresh`, () => runFresh(parts, subscription));
  };

  /** Prices bring what watches look at; that none come is noticed by the hour. */
  const lookAtWatches = async (): Promise<void> => {
    const prices = parts.prices();
    if (!prices.ok) return;
    const nowMs = clock.nowMs();
    const { fingerprint } = prices.value;
    const same = fingerprint === seen.fingerprint && Math.abs(nowMs - seen.watchedAtMs) < hourMs;
    if (same) return;
    const watches = await store.list({ team, kind: 'watch', states: ['active', 'paused'] });
    if (!watches.ok) return tell(`Watches cannot be read: ${watches.problem.message}`);
    seen.fingerprint = fingerprint;
    seen.watchedAtMs = nowMs;
    for (const subscription of watches.value.filter(watchable))
      begin(subscription.id, () => runWatch(parts, prices.value, subscription));
  };

  const tidy = async (): Promise<void> => {
    const nowMs = clock.nowMs();
    if (nowMs - seen.tidiedAtMs < dayMs) return;
    seen.tidiedAtMs = nowMs;
    await store.forgetSettled(nowMs - keepSettledMs);
  };

  return {
    tick: async () => {
      const calendars = parts.calendars();
      if (calendars !== seen.calendars && (await planAnew(parts, calendars))) seen.calendars = calendars;
      await lookAtDue();
      await lookAtWatches();
      await tidy();
    },
    idle,
  };
};
