import { z } from 'zod';
import type { AskedFrom } from '../../terms/records.ts';
import { answerIn, type ReplyPlace, repliesOrApology, type Speaking } from './answer.ts';
import type { Conversation, Press, SeenEvents } from './ports.ts';
import type { Respond } from './respond.ts';

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
  readonly conversation: Conversation;
  readonly seen: SeenEvents;
  readonly respond: Respond;
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

/** Answers a press on one of our messages: in its thread, or privately where the message was private. */
export const answerPress = async (pressing: Pressing, body: unknown): Promise<void> => {
  const read = pressedOn.safeParse(body);
  // Presses in forms and on the home page are not made on a message.
  if (!read.success) return;
  if (!(await pressing.seen.firstSeen(pressKeyOf(read.data)))) return;
  const { container, actions, response_url } = read.data;
  const place = placeOfPress(read.data);
  for (const { action_id, value, selected_option } of actions) {
    const isPrivate = container.is_ephemeral === true;
    const press: Press = {
      actionId: action_id,
      value: value ?? selected_option?.value ?? null,
      place: isPrivate ? 'command' : place.direct ? 'direct' : 'channel',
      from: fromOf(read.data),
    };
    const make = () => pressing.conversation.press(press);
    if (!isPrivate) await pressing.conversation.ready(press);
    if (isPrivate) await pressing.respond(response_url, await repliesOrApology(pressing.log, make));
    else await answerIn(pressing, place, make);
  }
};
