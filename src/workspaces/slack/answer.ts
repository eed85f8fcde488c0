import type { Destination } from './deliver.ts';
import { inWords } from './log.ts';
import { startPlaceholder } from './placeholder.ts';
import type { Logger, SpokenReply, Time } from './ports.ts';
import type { At, Voice } from './post.ts';

/** Where replies go and who asked for them. */
export type ReplyPlace = Destination & {
  readonly user: string;
  readonly direct: boolean;
  /** The question stood in a thread itself: a private reply shows there only then. */
  readonly askedInThread: boolean;
};

/** A reply that stands in the workspace, with what it says. */
export type Posted = At & { readonly reply: SpokenReply };

export type Speaking = { readonly voice: Voice; readonly time: Time; readonly log: Logger };

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

const say = async (
  { voice }: Speaking,
  place: ReplyPlace,
  reply: SpokenReply,
): Promise<readonly Posted[]> => {
  if (reply.private && !place.direct) {
    await voice.whisper({ ...place, threadTs: place.askedInThread ? place.threadTs : null }, reply);
    return [];
  }
  const delivered = await voice.post(place, reply);
  return delivered.ok ? [{ channel: place.channel, ts: delivered.ts, reply }] : [];
};

const sayAll = async (
  speaking: Speaking,
  place: ReplyPlace,
  replies: readonly SpokenReply[],
): Promise<readonly Posted[]> => {
  const posted: Posted[] = [];
  for (const reply of replies) posted.push(...(await say(speaking, place, reply)));
  return posted;
};

/** Says the replies in the place, in order, with a placeholder meanwhile where they take long. */
export const answerIn = async (
  speaking: Speaking,
  place: ReplyPlace,
  produce: Produce,
): Promise<readonly Posted[]> => {
  const { voice, time, log } = speaking;
  const beganMs = time.nowMs();
  const placeholder = startPlaceholder(voice, time, log, place);
  const replies = await repliesOrApology(log, () => produce(placeholder.progress));
  const tookMs = time.nowMs() - beganMs;
  const standing = await placeholder.end();
  if (standing === null) return sayAll(speaking, place, replies);

  const [first, ...others] = replies;
  const takesItsPlace = first !== undefined && !(first.private && !place.direct) && tookMs < editLimitMs;
  if (takesItsPlace && (await voice.updateNow(standing, first))) {
    return [{ ...standing, reply: first }, ...(await sayAll(speaking, place, others))];
  }
  const posted = await sayAll(speaking, place, replies);
  await voice.remove(standing);
  return posted;
};
