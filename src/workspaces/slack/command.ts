import { z } from 'zod';
import { repliesOrApology } from './answer.ts';
import type { Conversation, Logger, SeenEvents } from './ports.ts';
import type { Respond } from './respond.ts';

export const commandName = '/leadsman';

export const typedCommand = z.object({
  team_id: z.string(),
  channel_id: z.string().nullable().default(null),
  user_id: z.string().nullable().default(null),
  text: z.string().default(''),
  response_url: z.string(),
  trigger_id: z.string(),
});

export const commandKeyOf = (command: { readonly team_id: string; readonly trigger_id: string }): string =>
  JSON.stringify([command.team_id, command.trigger_id]);

export type Commanding = {
  readonly conversation: Pick<Conversation, 'converse' | 'examples'>;
  readonly seen: SeenEvents;
  readonly respond: Respond;
  readonly log: Logger;
};

/** Answers a slash command to the person who typed it. A command has no thread and no message to reply to. */
export const answerCommand = async (commanding: Commanding, command: unknown): Promise<void> => {
  const { conversation, seen, respond, log } = commanding;
  const read = typedCommand.safeParse(command);
  if (!read.success) {
    log.error('A slash command arrived in a form that cannot be read.');
    return;
  }
  const { team_id, channel_id, user_id, text, response_url } = read.data;
  if (!(await seen.firstSeen(commandKeyOf(read.data)))) return;
  const words = text.trim();
  const from = { team: team_id, channel: channel_id, person: user_id, message: null, thread: null };
  const replies = await repliesOrApology(log, async () =>
    words === ''
      ? conversation.examples({ place: 'command', from })
      : conversation.converse({ text: words, place: 'command', from }),
  );
  await respond(response_url, replies);
};
