import { z } from 'zod';
import type { AskedFrom } from '../../terms/records.ts';
import { answerIn, type ReplyPlace, repliesOrApology, type Speaking } from './answer.ts';
import { headed } from './content.ts';
import type { Conversation, Press, SeenEvents, SpokenReply } from './ports.ts';
import type { RecentPresses } from './recent.ts';
import type { Respond } from './respond.ts';
import { sayOpenly } from './surfaces/sayOpenly.ts';

/** A press on one of our messages; one in a form or on the home page has another shape. */
export const pressedOn = z.object({
  team: z.object({ id: z.string() }).nullish(),
  user: z.object({ id: z.string() }),
  container: z.object({
    message_ts: z.string(),
    channel_id: z.string(),
    thread_ts: z.string().optional(),
    is_ephemeral: z.boolean().optional(),
  }),
  message: z.object({ thread_ts: z.string().optional() }).optional(),
  response_url: z.string(),
  actions: z
    .array(
      z.object({
        action_id: z.string(),
        action_ts: z.string(),
        value: z.string().optional(),
        selected_option: z.object({ value: z.string() }).nullish(),
      }),
    )
    .min(1),
});
type Pressed = z.infer<typeof pressedOn>;

export type Pressing = Speaking & {
  readonly conversation: Pick<Conversation, 'press' | 'ready'>;
  readonly seen: SeenEvents;
  readonly respond: Respond;
  readonly recent: RecentPresses;
};

/** What a press brings up goes below the message that it was made on. */
export const placeOfPress = (made: Pressed): ReplyPlace => {
  const { team, user, container, message } = made;
  const threadTs = container.thread_ts ?? message?.thread_ts ?? null;
  return {
    eventKey: pressKeyOf(made),
    team: team?.id ?? '',
    channel: container.channel_id,
    threadTs: threadTs ?? container.message_ts,
    user: user.id,
    direct: container.channel_id.startsWith('D'),
    askedInThread: threadTs !== null,
  };
};

const fromOf = ({ team, user, container, message }: Pressed): AskedFrom => ({
  team: team?.id ?? null,
  channel: container.channel_id,
  person: user.id,
  message: container.message_ts,
  thread: container.thread_ts ?? message?.thread_ts ?? null,
});

export const pressKeyOf = ({ user, container, actions }: Pressed): string =>
  JSON.stringify([
    container.channel_id,
    container.message_ts,
    user.id,
    ...actions.map((action) => [action.action_id, action.action_ts]),
  ]);

/** The same for every press of one button, by whoever and whenever. */
const buttonKeyOf = ({ container, actions }: Pressed): string =>
  JSON.stringify([container.channel_id, container.message_ts, ...actions.map(({ action_id }) => action_id)]);

const isShare = (actionId: string): boolean => actionId === 'share';

const sharedNote = 'Shared from a private answer.';
const noPinNote =
  'Shared from a private answer. The bot is no member here: this message cannot be pinned or changed.';

/** Says a private answer to the whole channel, where it may be said there. */
const share = async (pressing: Pressing, made: Pressed, replies: readonly SpokenReply[]): Promise<void> => {
  const { container, team, response_url } = made;
  for (const [number, reply] of replies.entries())
    if (reply.private) await pressing.respond(response_url, [reply]);
    else
      await sayOpenly(pressing, {
        key: `share:${pressKeyOf(made)}:${number}`,
        team: team?.id ?? '',
        channel: container.channel_id,
        reply: headed(reply, sharedNote),
        otherwise: { url: response_url, reply: headed(reply, noPinNote) },
      });
};

/** Answers one button: in the thread, or privately where the message was private. Whether others can see what came of it. */
const answerOne = async (pressing: Pressing, made: Pressed, press: Press): Promise<boolean> => {
  const { conversation, log, respond } = pressing;
  const make = () => conversation.press(press);
  if (made.container.is_ephemeral !== true) {
    await conversation.ready(press);
    return (await answerIn(pressing, placeOfPress(made), make)).length > 0;
  }
  if (isShare(press.actionId)) await conversation.ready({ ...press, place: 'channel' });
  const replies = await repliesOrApology(log, make);
  await (isShare(press.actionId) ? share(pressing, made, replies) : respond(made.response_url, replies));
  return replies.some(({ kind }) => kind !== 'refusal');
};

/** Answers a press on one of our messages, once however often it is pressed within a short time. */
export const answerPress = async (pressing: Pressing, body: unknown): Promise<void> => {
  const read = pressedOn.safeParse(body);
  // Presses in forms and on the home page are not made on a message.
  if (!read.success) return;
  const made = read.data;
  if (!(await pressing.seen.firstSeen(pressKeyOf(made)))) return;
  if (!pressing.recent.isFirst(buttonKeyOf(made))) return;
  const { container, actions } = made;
  const direct = container.channel_id.startsWith('D');
  let isSeen = false;
  for (const { action_id, value, selected_option } of actions) {
    const press: Press = {
      actionId: action_id,
      value: value ?? selected_option?.value ?? null,
      place: container.is_ephemeral === true ? 'command' : direct ? 'direct' : 'channel',
      from: fromOf(made),
    };
    isSeen = (await answerOne(pressing, made, press)) || isSeen;
  }
  if (!isSeen) pressing.recent.forget(buttonKeyOf(made));
};
