import type { KeptEvent, PostedContent } from '../../../terms/inbox.ts';
import type { Result } from '../../../terms/result.ts';
import type { Self } from '../lookup.ts';
import type { Dealing, Inbox, Logger, Time } from '../ports.ts';
import { wait } from '../wait.ts';
import type { Work } from '../work.ts';
import { eventOf } from './eventOf.ts';
import { type Holding, makeHolding } from './holding.ts';
import type { InboxStore } from './ports.ts';

/** The platform waits three seconds to be told that something arrived; the store gets most of them. */
const mostTries = 4;
const tryAgainMs = 600;
/** A store that has failed for so long is not waited for: questions are answered without it. */
const patienceMs = 30_000;
const settleRetryMs = 1_000;
const mostRemembered = 2_000;

export type DurableInbox = Inbox &
  Pick<Holding, 'start' | 'close' | 'stop'> & {
    /** The event under this key, where it is under way here. */
    readonly underWay: (key: string) => KeptEvent | null;
    readonly willEdit: (key: string, into: PostedContent) => Promise<void>;
  };

export type InboxDesk = {
  readonly store: InboxStore;
  readonly holder: string;
  readonly self: Self;
  readonly time: Time;
  readonly log: Logger;
  readonly work: Work;
  /** Deals with an event that was left undone. */
  readonly takeUp: (event: KeptEvent) => Promise<void>;
};

const nothingToNote: Dealing = { kept: true, done: async () => {} };

/** What was answered while the store could not note it. */
const makeAnswered = () => {
  const keys = new Set<string>();
  return {
    has: (key: string): boolean => keys.has(key),
    add: (key: string): void => {
      keys.add(key);
      const [oldest] = keys;
      if (keys.size > mostRemembered && oldest !== undefined) keys.delete(oldest);
    },
  };
};

export const makeInbox = (desk: InboxDesk): DurableInbox => {
  const { store, holder, self, time, log, work } = desk;
  const events = new Map<string, KeptEvent>();
  const answered = makeAnswered();

  /** Goes on until the store has noted it: until then a crash has the event dealt with once more. */
  const settle = async (key: string): Promise<void> => {
    while (!holding.note(await store.settle(key, time.nowMs())).ok) await wait(time, settleRetryMs);
  };

  /** Holds the event until `done`; noting it then goes on behind, so that nobody waits for a store in trouble. */
  const begin = (event: KeptEvent): Dealing => {
    let end = () => {};
    const ended = new Promise<void>((resolve) => {
      end = resolve;
    });
    events.set(event.key, event);
    const held = holding.hold(event.key, async () => {
      await ended;
      await settle(event.key);
      events.delete(event.key);
    });
    return {
      kept: true,
      done: async () => {
        end();
        await held;
      },
    };
  };

  const beginUnkept = (key: string): Dealing => {
    log.error('A question is answered although the store cannot keep it: a crash now would lose it.');
    answered.add(key);
    return { kept: false, done: async () => {} };
  };

  const keepTrying = async (ask: () => Promise<Result<KeptEvent | null>>, tries: number) => {
    let kept = holding.note(await ask());
    for (let tried = 1; tried < tries && !kept.ok; tried += 1) {
      await wait(time, tryAgainMs);
      kept = holding.note(await ask());
    }
    return kept;
  };

  const takeUp = (event: KeptEvent): void => {
    const dealing = begin(event);
    work
      .track(() => desk.takeUp(event))
      .then(dealing.done, () => log.warn('A question that was left open still is.'));
  };

  const holding = makeHolding(holder, store, time, takeUp);

  return {
    keep: async ({ body }) => {
      const event = eventOf(body, self, time.nowMs());
      if (event === null) return nothingToNote;
      if (holding.holds(event.key) || answered.has(event.key)) return null;
      const comesAgain = event.kind === 'question';
      const ask = () => store.keep(event, holding.lease(), time.nowMs());
      const kept = await keepTrying(ask, comesAgain ? mostTries : 1);
      if (kept.ok) return kept.value === null || holding.holds(event.key) ? null : begin(kept.value);
      const failedForMs = time.nowMs() - (holding.failingSinceMs() ?? time.nowMs());
      if (!comesAgain || failedForMs >= patienceMs) return beginUnkept(event.key);
      throw new Error(kept.problem.message);
    },
    underWay: (key) => events.get(key) ?? null,
    willEdit: async (key, into) => {
      holding.note(await store.willEdit(key, into));
    },
    start: holding.start,
    close: holding.close,
    stop: holding.stop,
  };
};
