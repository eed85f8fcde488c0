import { toBlocks } from '../present/blocks.ts';
import { type Reply, reply } from '../present/reply.ts';
import type { Converse } from '../workspaces/converse.ts';
import type { Conversation, SpokenReply } from '../workspaces/slack/ports.ts';

const examples = ['interval KELP 60d', 'interval vol KELP 3m', 'help'];

const kinds = {
  answer: 'answer',
  refusal: 'refusal',
  help: 'help',
  feed: 'answer',
  working: 'answer',
  record: 'answer',
} as const;

const spokenReply = (each: Reply): SpokenReply => ({
  ...toBlocks(each),
  kind: kinds[each.kind],
  private: each.kind === 'refusal',
});

/** What stands in a button’s value, written by present/blocks. */
const readValue = (value: string | null): { id: string; question: string } | null => {
  try {
    const parsed: unknown = JSON.parse(value ?? '');
    if (typeof parsed !== 'object' || parsed === null) return null;
    const { id, question } = parsed as { id?: unknown; question?: unknown };
    return typeof id === 'string' && typeof question === 'string' ? { id, question } : null;
  } catch {
    return null; // not a value of ours
  }
};

/** The conversation as the Slack workspace wants it: replies already laid out in blocks. */
export const slackConversation = (
  converse: Converse,
  firstTickers: () => readonly string[],
): Conversation => ({
  converse: async (asking) => (await converse.ask(asking)).map((spoken) => spokenReply(spoken.reply)),
  press: async ({ actionId, value, place, from }) => {
    const read = readValue(value);
    if (actionId !== 'working' || read === null)
      return [
        spokenReply(
          reply('refusal', 'This button is from an older version of the bot. Ask the question anew.'),
        ),
      ];
    const { id: answerId, question } = read;
    const replies = await converse.press({ action: actionId, answerId, question, place, from });
    return replies.map(spokenReply);
  },
  examples: () => {
    const [ticker = 'KELP'] = firstTickers();
    const lines = examples.map((example) => example.replace('KELP', ticker));
    return [
      spokenReply(
        reply('help', 'Ask one question a line. Three that work here:', {
          passages: [{ head: null, lines }],
        }),
      ),
    ];
  },
});
