import type { Sent } from './deliveries.ts';
import type { Stage } from './events.ts';
import { channelOf, messageOf, type Place } from './people.ts';
import type { Whispered } from './records.ts';
import { triggerOf } from './triggers.ts';
import { type Block, bot, team, writtenOut } from './workspace.ts';

const carries = (element: unknown, actionId: string): element is object =>
  typeof element === 'object' && element !== null && 'action_id' in element && element.action_id === actionId;

/** The element with this action id as a press reports it, with the value that stands in the blocks. */
const pressed = (blocks: readonly Block[], actionId: string, actionTs: string) => {
  for (const block of blocks) {
    const elements: unknown = block['elements'] ?? [block['accessory']];
    const element = Array.isArray(elements) ? elements.find((each) => carries(each, actionId)) : undefined;
    if (carries(element, actionId))
      return { block_id: block['block_id'] ?? 'b0', action_ts: actionTs, ...element };
  }
  throw new Error(`nothing with the action id ${actionId} to press`);
};

type Pressable = {
  readonly isPrivate: boolean;
  readonly blocks: readonly Block[];
  readonly threadTs: string | null;
  readonly message: object;
};

/** Slash commands, shortcuts and presses of buttons on messages. */
export const makeCommands = ({ desk, responses, deliver }: Stage) => {
  const { workspace } = desk;

  const newTrigger = (): string => triggerOf(desk);
  const nameOf = (user: string): string => workspace.people.get(user)?.name ?? '';

  /** A private message is not shown to the app again. */
  const pressable = (on: Place | Whispered): Pressable => {
    if ('shown' in on) return { isPrivate: true, blocks: on.blocks, threadTs: on.threadTs, message: {} };
    const { blocks, threadTs, ...message } = messageOf(workspace, on);
    const shown = { message: writtenOut({ ...message, blocks, threadTs }, false) };
    return { isPrivate: false, blocks, threadTs, message: shown };
  };

  return {
    /** A slash command carries no thread, wherever it was typed. */
    command: (typed: { readonly user?: string; readonly channel: string; readonly text: string }): Sent => {
      const user = typed.user ?? 'U0ADA';
      return deliver({
        kind: 'slash_commands',
        payload: {
          token: 'verification',
          command: '/leadsman',
          text: typed.text,
          team_id: team.id,
          team_domain: team.domain,
          channel_id: typed.channel,
          channel_name: channelOf(workspace, typed.channel).name,
          user_id: user,
          user_name: nameOf(user),
          api_app_id: bot.appId,
          is_enterprise_install: 'false',
          response_url: responses.newAddress(typed.channel, user, null),
          trigger_id: newTrigger(),
        },
      });
    },

    /** The global shortcut: it knows no channel and no thread. */
    shortcut: (callbackId: string, user = 'U0ADA'): Sent =>
      deliver({
        kind: 'interactive',
        payload: {
          type: 'shortcut',
          token: 'verification',
          action_ts: workspace.stamp(),
          team,
          user: { id: user, username: nameOf(user), team_id: team.id },
          is_enterprise_install: false,
          enterprise: null,
          callback_id: callbackId,
          trigger_id: newTrigger(),
        },
      }),

    /** The shortcut in the menu of a message, whosever the message is. */
    messageShortcut: (on: Place, callbackId: string, user = 'U0ADA'): Sent => {
      const channel = channelOf(workspace, on.channel);
      const message = messageOf(workspace, on);
      return deliver({
        kind: 'interactive',
        payload: {
          type: 'message_action',
          token: 'verification',
          action_ts: workspace.stamp(),
          team,
          user: { id: user, username: nameOf(user), team_id: team.id },
          channel: { id: channel.id, name: channel.name },
          is_enterprise_install: false,
          enterprise: null,
          callback_id: callbackId,
          trigger_id: newTrigger(),
          response_url: responses.newAddress(channel.id, user, message.threadTs),
          message_ts: message.ts,
          message: writtenOut(message, false),
        },
      });
    },

    /** Presses what carries this action id, on a message or on a private one. */
    press: (on: Place | Whispered, actionId: string, user = 'U0ADA'): Sent => {
      const channel = channelOf(workspace, on.channel);
      const { isPrivate, blocks, threadTs, message } = pressable(on);
      const threaded = threadTs === null ? {} : { thread_ts: threadTs };
      return deliver({
        kind: 'interactive',
        payload: {
          type: 'block_actions',
          team,
          user: { id: user, username: nameOf(user), team_id: team.id },
          api_app_id: bot.appId,
          token: 'verification',
          container: {
            type: 'message',
            message_ts: on.ts,
            channel_id: channel.id,
            is_ephemeral: isPrivate,
            ...threaded,
          },
          trigger_id: newTrigger(),
          enterprise: null,
          is_enterprise_install: false,
          channel: { id: channel.id, name: channel.name },
          ...message,
          state: { values: {} },
          response_url: responses.newAddress(channel.id, user, threadTs),
          actions: [pressed(blocks, actionId, workspace.stamp())],
        },
      });
    },
  };
};
