import type { App } from '@slack/bolt';
import type { KeptEvent } from '../../../terms/inbox.ts';
import type { Delivering } from '../deliver.ts';
import { makeSend } from '../deliver.ts';
import type { EventMemory, SpokenReply } from '../ports.ts';
import type { Voice } from '../post.ts';
import type { Respond } from '../respond.ts';
import type { Work } from '../work.ts';
import { type DurableInbox, makeInbox } from './inbox.ts';
import { lineInstead, sayLate } from './late.ts';
import { makeMemory } from './memory.ts';
import { makeOutbox, type Outbox } from './outbox.ts';
import type { DurableStore } from './ports.ts';

export type DurableDesk = {
  readonly store: DurableStore;
  readonly holder: string;
  readonly delivering: Delivering;
  readonly voice: Pick<Voice, 'remove' | 'update'>;
  readonly respond: Respond;
  readonly work: Work;
  readonly app: () => App;
};

export type Durable = {
  readonly outbox: Outbox;
  readonly inbox: DurableInbox;
  readonly memory: EventMemory;
};

/** What arrives and what is said, kept so that neither is lost with the process nor done twice. */
export const makeDurable = ({
  store,
  holder,
  delivering,
  voice,
  respond,
  work,
  app,
}: DurableDesk): Durable => {
  const { time, log, self } = delivering;
  const outbox = makeOutbox({
    store: store.deliveries,
    holder,
    send: makeSend(delivering),
    time,
    log,
    work,
  });

  /** An answer that was about to stand is brought to stand; only where there is none a line is said in its place. */
  const giveUp = async (event: KeptEvent, line: SpokenReply): Promise<void> => {
    const { standing, editing, replied } = await memory.recall(event.key);
    if (editing !== null) {
      const { content, ...at } = editing;
      await voice.update(at, content);
      return;
    }
    if (!replied) await sayLate({ self, time, deliveries: outbox, respond }, event, line);
    if (standing !== null) await voice.remove(standing);
  };

  const takeUp = async (event: KeptEvent): Promise<void> => {
    const instead = lineInstead(event, time.nowMs());
    if (instead !== null) return giveUp(event, instead);
    // it was acknowledged when it arrived
    await app().processEvent({ body: JSON.parse(event.body), ack: async () => {} });
  };

  const inbox = makeInbox({ store: store.inbox, holder, self, time, log, work, takeUp });
  const memory = makeMemory(inbox, outbox, store.deliveries, time);
  return { outbox, inbox, memory };
};
