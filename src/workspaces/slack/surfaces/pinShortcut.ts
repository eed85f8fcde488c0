import { z } from 'zod';
import { repliesOrApology } from '../answer.ts';
import type { Self } from '../lookup.ts';
import type { SpokenReply } from '../ports.ts';
import { answerPress, type Pressing } from '../press.ts';

export const pinShortcutId = 'pin_result';

const chosen = z.object({
  team: z.object({ id: z.string() }).nullish(),
  user: z.object({ id: z.string() }),
  channel: z.object({ id: z.string() }),
  action_ts: z.string(),
  response_url: z.string(),
  message: z.object({
    ts: z.string(),
    thread_ts: z.string().optional(),
    user: z.string().optional(),
    bot_id: z.string().optional(),
    blocks: z.array(z.looseObject({ type: z.string() })).default([]),
  }),
});

const buttons = z.object({ elements: z.array(z.looseObject({ value: z.string().optional() })) });
const aboutAnswer = z.object({ id: z.string().startsWith('R-') });

/** What a button of the message carries, where the message is an answer of ours: every answer has buttons. */
const answerUnder = (blocks: readonly object[]): string | null => {
  for (const block of blocks) {
    const read = buttons.safeParse(block);
    for (const { value = '' } of read.success ? read.data.elements : []) {
      try {
        if (aboutAnswer.safeParse(JSON.parse(value)).success) return value;
      } catch {
        // not a value of ours
      }
    }
  }
  return null;
};

const notOurs: SpokenReply = {
  text: 'Only an answer of the bot itself can be pinned so. Choose the message that shows it; its id, R- and ten characters, stands in its last lines.',
  blocks: [],
  kind: 'refusal',
  private: true,
};

/** The message shortcut: the same as the pin button under an answer; on anything else a polite refusal. */
export const pinChosen = async (
  pressing: Pressing & { readonly self: Self },
  body: unknown,
): Promise<void> => {
  const read = chosen.safeParse(body);
  if (!read.success) return;
  const { team, user, channel, message, action_ts, response_url } = read.data;
  const ours = message.bot_id === pressing.self.botId || message.user === pressing.self.userId;
  const value = ours ? answerUnder(message.blocks) : null;
  if (value === null) {
    await pressing.respond(response_url, await repliesOrApology(pressing.log, async () => [notOurs]));
    return;
  }
  await answerPress(pressing, {
    team,
    user,
    container: {
      message_ts: message.ts,
      channel_id: channel.id,
      ...(message.thread_ts === undefined ? {} : { thread_ts: message.thread_ts }),
    },
    response_url,
    actions: [{ action_id: 'pin', action_ts, value }],
  });
};
