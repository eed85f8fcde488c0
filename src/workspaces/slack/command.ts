import { z } from 'zod';
import { repliesOrApology } from './answer.ts';
import type { Conversation, Logger, SeenEvents } from './ports.ts';
import type { Respond } from './respond.ts';

export const commandName = '/leadsman';

const typed = z.object({
  team_id: z.string(),
  channel_id: z.string().nullable().default(null),
  user_id: z.string().nullable().default(null),
  text: z.string().optional(),
  response_url: z.string(),
  trigger_id: z.string(),
});

export type Commanding = {
  readonly conversation: Conversation;
  readonly seen: SeenEvents;
  readonly respond: Respond;
  readonly log: Logger;
};

/** Answers a slash command to the person who typed it. A command has no thread and no message to reply to. */
export const answerCommand = async (commanding: Commanding, command: unknown): Promise<void> => {
  const { conversation, seen, respond, log } = commanding;
  const read = typed.safeParse(command);
  if (!read.success) {
    log.error('A slash command arrived in a form that cannot be read.');
    return;
  }
  const { team_id, channel_id, user_id, text = '', response_url, trigger_id } = read.data;
  if (!(await seen.firstSeen(JSON.stringify([team_id, trigger_id])))) return;
  const words = text.trim();
  const from = { team: team_id, channel: channel_id, person: user_id, message: null, thread: null };
  const replies = await repliesOrApology(log, async () =>
    words === ''
      ? conversation.examples({ place: 'command', from })
      : conversation.converse({ text: words, place: 'command', from }),
  );
  await respond(response_url, replies);
};
