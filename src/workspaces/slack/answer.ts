import type { Deliveries } from '../deliveries.ts';
import type { Destination } from './deliver.ts';
import { replyKey } from './keys.ts';
import { inWords } from './log.ts';
import { type ShowPicture, type Turn, turnsOf } from './pictures/show.ts';
import { leftStanding, startPlaceholder } from './placeholder.ts';
import type { EventMemory, Logger, SpokenReply, Time } from './ports.ts';
import type { At, Voice } from './post.ts';

/** Where replies go and who asked for them. */
export type ReplyPlace = Destination & {
  /** What the keys of the replies follow from, so that none is said twice. */
  readonly eventKey: string;
  readonly team: string;
  readonly user: string;
  readonly direct: boolean;
  /** The question stood in a thread itself: a private reply shows there only then. */
  readonly askedInThread: boolean;
};

/** A reply that stands in the workspace, with what it says. */
export type Posted = At & { readonly reply: SpokenReply };

export type Speaking = {
  readonly voice: Voice;
  /** Says each key once, whatever happens. `sayAgain`: somebody whose trace is lost may have said it before. */
  readonly deliveries: Deliveries & { readonly sayAgain: Deliveries['say'] };
  readonly memory: EventMemory;
  readonly showPicture: ShowPicture;
  readonly time: Time;
  readonly log: Logger;
};

/** Makes the replies; may say how far it has come. */
export type Produce = (progress: (words: string) => void) => Promise<readonly SpokenReply[]>;

/** An answer that took less than this takes the placeholder's place; a later one is a new message, which notifies. */
const editLimitMs = 10_000;

const broken: SpokenReply = {
  text: 'That question ran into a fault on this side and has no answer. The fault is logged; the desk’s operator can see it.',
  blocks: [],
  kind: 'refusal',
  private: true,
};

/** The replies, or an apology where making them failed. */
export const repliesOrApology = async (
  log: Logger,
  make: () => Promise<readonly SpokenReply[]>,
): Promise<readonly SpokenReply[]> => {
  try {
    return await make();
  } catch (error) {
    log.error(`A question ran into a fault: ${inWords(error)}`);
    return [broken];
  }
};

/** A person does not wait longer than this; what could not be said by then is not said any more. */
const replyLifeMs = 3_600_000;

type Saying = { readonly place: ReplyPlace; readonly again: boolean };

const say = async (
  { voice, deliveries, time }: Speaking,
  { place, again }: Saying,
  reply: SpokenReply,
  number: number,
): Promise<readonly Posted[]> => {
  if (reply.private && !place.direct) {
    await voice.whisper({ ...place, threadTs: place.askedInThread ? place.threadTs : null }, reply);
    return [];
  }
  const { eventKey, team, channel, threadTs } = place;
  const outcome = await deliveries[again ? 'sayAgain' : 'say']({
    key: replyKey(eventKey, number),
    team,
    channel,
    threadTs,
    content: { text: reply.text, blocks: reply.blocks },
    urgent: true,
    expiresAtMs: time.nowMs() + replyLifeMs,
  });
  return outcome.kind === 'said' ? [{ channel, ts: outcome.ts, reply }] : [];
};

const sayFrom = async (
  speaking: Speaking,
  saying: Saying,
  turns: readonly Turn[],
  from: number,
): Promise<readonly Posted[]> => {
  const posted: Posted[] = [];
  for (const [index, turn] of turns.entries())
    if (index >= from) posted.push(...(await say(speaking, saying, await turn(), index)));
  return posted;
};

/** Changes the placeholder into the first reply, where it may become that; whether it did. */
const becomes = async (
  { voice, memory }: Speaking,
  { eventKey, direct }: ReplyPlace,
  standing: At,
  first: SpokenReply | undefined,
): Promise<boolean> => {
  if (first === undefined || (first.private && !direct)) return false;
  await memory.willEdit(eventKey, { ...standing, content: { text: first.text, blocks: first.blocks } });
  return voice.updateNow(standing, first);
};

/** Says the replies in the place, in order, with a placeholder meanwhile where they take long. */
export const answerIn = async (
  speaking: Speaking,
  place: ReplyPlace,
  produce: Produce,
): Promise<readonly Posted[]> => {
  const { deliveries, memory, time, voice, log } = speaking;
  const beganMs = time.nowMs();
  const { again, standing: left, editing } = await memory.recall(place.eventKey);
  const placeholder =
    left === null ? startPlaceholder({ voice, deliveries, time, log }, place) : leftStanding(left);
  const replies = await repliesOrApology(log, () => produce(placeholder.progress));
  const inTime = again ? editing !== null : time.nowMs() - beganMs < editLimitMs;
  const standing = await placeholder.end();
  const saying = { place, again };
  const turns = turnsOf(replies, speaking.showPicture);
  if (standing === null) return sayFrom(speaking, saying, turns, 0);

  const [first] = replies;
  if (inTime && first !== undefined && (await becomes(speaking, place, standing, first)))
    return [{ ...standing, reply: first }, ...(await sayFrom(speaking, saying, turns, 1))];
  const posted = await sayFrom(speaking, saying, turns, 0);
  await voice.remove(standing);
  return posted;
};
