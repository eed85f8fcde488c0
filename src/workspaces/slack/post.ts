import { type Content, looksRefused, looksRefusedNote, plainly, textAlone } from './content.ts';
import type { Delivering, Destination } from './deliver.ts';
import type { Pace } from './pace.ts';
import { wait } from './wait.ts';
import type { Outcome } from './wire.ts';

/** A message of ours in the workspace. */
export type At = { readonly channel: string; readonly ts: string };

/** What the bot can do beside saying something new: what is said so is not kept, or changes what stands. */
export type Voice = {
  /** Only for one person; not kept, and not shown in a thread where nobody has replied. */
  readonly whisper: (to: Destination & { readonly user: string }, content: Content) => Promise<void>;
  /** Waits for its turn where the workspace has had its share of edits. */
  readonly update: (at: At, content: Content) => Promise<void>;
  /** Changes the message now or not at all: whether it did. */
  readonly updateNow: (at: At, content: Content) => Promise<boolean>;
  readonly remove: (at: At) => Promise<void>;
};

const editLane = 'edits';
const mostAttempts = 4;
const retryMs = 5_000;

/** Blocks are always sent: left out, the old ones would stay. */
const editArguments = (at: At, content: Content) => ({ ...at, ...content, ...plainly });

const whisperArguments = (to: Destination & { readonly user: string }, content: Content) => ({
  channel: to.channel,
  user: to.user,
  ...(to.threadTs === null ? {} : { thread_ts: to.threadTs }),
  text: content.text,
  ...(content.blocks.length === 0 ? {} : { blocks: content.blocks }),
  ...plainly,
});

export const makeVoice = (desk: Delivering, edits: Pace): Voice => {
  const { wire, time, log } = desk;

  /** Repeats what was not done; an unsure call only where doing it twice is the same as once. */
  const persist = async (
    pace: Pace,
    lane: string,
    repeatUnsure: boolean,
    call: () => Promise<Outcome>,
  ): Promise<Outcome> => {
    let outcome: Outcome = { kind: 'unreached', reason: 'not tried' };
    for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
      await pace.turn(lane);
      outcome = await call();
      if (outcome.kind === 'done' || outcome.kind === 'refused') return outcome;
      if (outcome.kind === 'unsure' && !repeatUnsure) return outcome;
      if (outcome.kind === 'limited') pace.hold(lane, outcome.retryAfterMs);
      else await wait(time, retryMs);
    }
    return outcome;
  };

  /** A message whose looks are refused goes out as text. */
  const withLooks = async (content: Content, send: (content: Content) => Promise<Outcome>) => {
    const outcome = await send(content);
    if (!looksRefused(outcome, content)) return outcome;
    log.error(looksRefusedNote(outcome));
    return send(textAlone(content));
  };

  const edit = (at: At, content: Content) => wire.call('chat.update', editArguments(at, content));

  return {
    whisper: async (to, content) => {
      const outcome = await withLooks(content, (shown) =>
        persist(desk.pace, to.channel, false, () =>
          wire.call('chat.postEphemeral', whisperArguments(to, shown)),
        ),
      );
      if (outcome.kind === 'done') return;
      // Whoever left the channel in the meantime is not told anything there.
      if (outcome.kind === 'refused' && outcome.code === 'user_not_in_channel') return;
      log.warn(`A private message in ${to.channel} was not delivered: ${outcome.kind}.`);
    },

    update: async (at, content) => {
      const outcome = await withLooks(content, (shown) =>
        persist(edits, editLane, true, () => edit(at, shown)),
      );
      if (outcome.kind !== 'done') log.warn(`A message in ${at.channel} was not changed: ${outcome.kind}.`);
    },

    updateNow: async (at, content) => {
      if (!edits.tryTurn(editLane)) return false;
      const outcome = await withLooks(content, (shown) => edit(at, shown));
      if (outcome.kind === 'limited') edits.hold(editLane, outcome.retryAfterMs);
      return outcome.kind === 'done';
    },

    remove: async (at) => {
      const outcome = await persist(edits, editLane, true, () => wire.call('chat.delete', { ...at }));
      if (outcome.kind === 'done') return;
      if (outcome.kind === 'refused' && outcome.code === 'message_not_found') return;
      log.warn(`A placeholder in ${at.channel} was left standing: ${outcome.kind}.`);
    },
  };
};
