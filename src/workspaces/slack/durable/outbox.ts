import { createHash } from 'node:crypto';
import type { KeptSaying, Saying, SayingOutcome } from '../../../terms/delivery.ts';
import type { Result } from '../../../terms/result.ts';
import type { Deliveries } from '../../deliveries.ts';
import type { Content } from '../content.ts';
import type { Destination, Earlier, Sending, Sent } from '../deliver.ts';
import { inWords } from '../log.ts';
import type { Logger, Time } from '../ports.ts';
import { wait } from '../wait.ts';
import type { Work } from '../work.ts';
import { type Holding, makeHolding } from './holding.ts';
import type { DeliveryStore } from './ports.ts';

const storeRetryMs = 1_000;
/** So long a person's answer waits for the store; then it goes out without. */
const patienceMs = 30_000;
/** How long ago an answer that went out without the store may have been sent. */
const unkeptReachMs = 900_000;
const lookAtOtherMs = 1_000;

export type Outbox = Deliveries &
  Pick<Holding, 'start' | 'close' | 'stop'> & {
    /** As `say`, where somebody whose trace is lost may have said it before. */
    readonly sayAgain: Deliveries['say'];
  };

export type OutboxDesk = {
  readonly store: DeliveryStore;
  readonly holder: string;
  readonly send: (to: Destination, content: Content, sending: Sending) => Promise<Sent>;
  readonly time: Time;
  readonly log: Logger;
  readonly work: Work;
};

/** The same for the same key in every process, so that a post can be found without the store; it says nothing. */
export const deliveryIdOf = (key: string): string =>
  createHash('sha256').update(`leadsman ${key}`).digest('hex').slice(0, 32);

const earlierOf = (kept: KeptSaying | null, again: boolean): Earlier => {
  if (kept === null || (again && kept.firstAttemptMs === null)) return { kind: 'possible' };
  return kept.unsure ? { kind: 'unsure', attemptedMs: kept.lastAttemptMs ?? 0 } : { kind: 'none' };
};

type Insist = <T>(urgent: boolean, ask: () => Promise<Result<T>>) => Promise<T | null>;

/** Tries until the store does it; null where somebody waits and the store has used up the patience. */
const insisting =
  (time: Time, holding: Pick<Holding, 'note' | 'failingSinceMs'>): Insist =>
  async (urgent, ask) => {
    for (;;) {
      const done = holding.note(await ask());
      if (done.ok) return done.value;
      const sinceMs = holding.failingSinceMs() ?? time.nowMs();
      if (urgent && time.nowMs() - sinceMs >= patienceMs) return null;
      await wait(time, storeRetryMs);
    }
  };

export const makeOutbox = (desk: OutboxDesk): Outbox => {
  const { store, holder, time, log, work } = desk;
  const underWay = new Map<string, Promise<SayingOutcome>>();

  const sendingOf = (saying: Saying, kept: KeptSaying | null, again: boolean): Sending => ({
    deliveryId: kept?.deliveryId ?? deliveryIdOf(saying.key),
    urgent: saying.urgent,
    expiresAtMs: saying.expiresAtMs,
    sinceMs: kept?.firstAttemptMs ?? time.nowMs() - unkeptReachMs,
    earlier: earlierOf(kept, again),
    begin: async () =>
      kept === null ||
      ((await insist(saying.urgent, () => store.begin(saying.key, holding.lease(), time.nowMs()))) ?? true),
    undone: async () => {
      // should this get lost, the post is looked for once more than it had to be
      if (kept !== null) await store.undone(saying.key, holder);
    },
  });

  const noteSettled = (key: string, outcome: SayingOutcome): void => {
    const note = () => insist(false, () => store.settle(key, outcome, time.nowMs()));
    void work.track(() => holding.hold(key, note)).catch(() => {});
  };

  /** Says what is kept and held here; null where somebody else has it by now. */
  const settle = async (
    saying: Saying,
    kept: KeptSaying | null,
    again: boolean,
  ): Promise<SayingOutcome | null> => {
    const sent = await desk.send(saying, saying.content, sendingOf(saying, kept, again));
    if (sent.kind === 'taken') return null;
    if (kept !== null) {
      const noted = await store.settle(saying.key, sent, time.nowMs());
      if (!noted.ok) noteSettled(saying.key, sent);
    }
    return sent;
  };

  const take = (saying: Saying) =>
    insist(saying.urgent, () => store.take(saying, deliveryIdOf(saying.key), holding.lease(), time.nowMs()));

  const deliver = async (saying: Saying, again: boolean): Promise<SayingOutcome> => {
    for (;;) {
      const kept = await take(saying);
      if (kept !== null && kept.outcome !== null) return kept.outcome;
      if (kept === null || kept.lease?.holder === holder) {
        const outcome = await settle(kept ?? saying, kept, again);
        if (outcome !== null) return outcome;
      } else await wait(time, lookAtOtherMs);
    }
  };

  const sayOnce = (saying: Saying, again: boolean): Promise<SayingOutcome> => {
    const known = underWay.get(saying.key);
    if (known !== undefined) return known;
    const task = holding.hold(saying.key, () => deliver(saying, again));
    underWay.set(saying.key, task);
    const done = () => void underWay.delete(saying.key);
    task.then(done, done);
    return task;
  };

  const takeUp = (kept: KeptSaying): void => {
    work
      .track(() => sayOnce(kept, false))
      .catch((error: unknown) => log.warn(`A message that was left unsaid still is: ${inWords(error)}`));
  };

  const holding = makeHolding(holder, store, time, takeUp);
  const insist = insisting(time, holding);

  return {
    say: (saying) => sayOnce(saying, false),
    sayAgain: (saying) => sayOnce(saying, true),
    start: holding.start,
    close: holding.close,
    stop: holding.stop,
  };
};
