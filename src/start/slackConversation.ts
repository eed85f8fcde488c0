import { z } from 'zod';
import { toBlocks } from '../present/blocks.ts';
import { type Button, type ButtonAction, buttonActions, type Reply, reply } from '../present/reply.ts';
import { homeView } from '../present/views/homePage.ts';
import { admission } from '../workspaces/admission.ts';
import { type Asking, type Spoken, said } from '../workspaces/conversation.ts';
import type { Converse } from '../workspaces/converse.ts';
import { everythingAllowed, type Permissions } from '../workspaces/permissions.ts';
import type { Conversation, Press, SpokenReply } from '../workspaces/slack/ports.ts';
import type { Surfaces } from '../workspaces/surfaces/surfaces.ts';
import { shownPicture } from './pictures/shown.ts';

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

const inBlocks = ({ reply: each, pictures = [] }: Spoken): SpokenReply => ({
  ...spokenReply(each),
  ...(pictures.length === 0 ? {} : { pictures: pictures.map(shownPicture) }),
});

const pressable = z.object({
  id: z.string(),
  question: z.string().default(''),
  added: z.string().optional(),
});

/** The action behind an action id: several buttons of one kind are told apart by what follows a full stop. */
const readAction = (actionId: string): ButtonAction | null => {
  const [name] = actionId.split('.');
  return buttonActions.find((action) => action === name) ?? null;
};

/** The button that was pressed, from what present/blocks wrote into it; null where it is none of ours. */
const readButton = (actionId: string, value: string | null): Omit<Button, 'label'> | null => {
  const action = readAction(actionId);
  if (action === null || value === null) return null;
  try {
    const { id, question, added } = pressable.parse(JSON.parse(value));
    return { action, answerId: id, question, ...(added === undefined ? {} : { added }) };
  } catch {
    return null;
  }
};

/** A private answer can be shown to the whole channel, where it was asked in one. */
const shareable = (asking: Pick<Asking, 'place' | 'from'>, spoken: Spoken): Spoken => {
  const channel = asking.from?.channel ?? 'D';
  const answer = spoken.reply.buttons.find(({ action }) => action === 'working');
  if (asking.place !== 'command' || channel.startsWith('D') || answer === undefined) return spoken;
  const { answerId, question } = answer;
  const share: Button = { action: 'share', label: 'Share with the channel', answerId, question };
  return { ...spoken, reply: { ...spoken.reply, buttons: [share, ...spoken.reply.buttons] } };
};

const olderButton: Spoken = said(
  reply('refusal', 'This button is from an older version of the bot. Ask the question anew.'),
);

/** The conversation as the Slack workspace wants it: replies already laid out in blocks. */
export const slackConversation = (
  converse: Converse,
  firstTickers: () => readonly string[],
  { form, home, listensInThreads }: Surfaces,
  permissions: Permissions = everythingAllowed,
): Conversation => {
  const press = async ({ actionId, value, place, from }: Press): Promise<readonly Spoken[]> => {
    const button = readButton(actionId, value);
    return button === null ? [olderButton] : converse.press({ ...button, place, from });
  };

  return {
    ready: permissions.learn,
    converse: async (asking) =>
      (await converse.ask(asking)).map((spoken) => inBlocks(shareable(asking, spoken))),
    press: async (pressing) =>
      (await press(pressing)).map((spoken) =>
        inBlocks(pressing.actionId === 'share' ? spoken : shareable(pressing, spoken)),
      ),
    overhear: listensInThreads ? async (asking) => (await converse.overhear(asking)).map(inBlocks) : null,
    form,
    home: async (asker, page, chosen) => {
      const [spoken] = chosen === null ? [] : await press({ ...chosen, ...asker });
      return homeView(await home(asker, page, spoken?.reply.sentence ?? null));
    },
    examples: async (asker) => {
      const barred = await admission(permissions, asker);
      if (barred !== null) return barred.map(inBlocks);
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
  };
};
