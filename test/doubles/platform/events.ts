import type { Delivery, Sent } from './deliveries.ts';
import type { Desk } from './desk.ts';
import type { Responses } from './responses.ts';
import { bot, type Channel, type Message, team, writtenOut } from './workspace.ts';

export type Stage = {
  readonly desk: Desk;
  readonly responses: Responses;
  /** Event kinds the app is subscribed to, such as `app_mention` and `message.im`. */
  readonly subscriptions: readonly string[];
  readonly deliver: (delivery: Delivery) => Sent;
};

const channelTypes = { public: 'channel', private: 'group', direct: 'im' } as const;
const messageKinds = { public: 'message.channels', private: 'message.groups', direct: 'message.im' } as const;
export const mentionOfBot = `<@${bot.userId}>`;
const mentionsBot = new RegExp(`<@${bot.userId}[|>]`);

const place = (channel: Channel, message: Message) => ({
  ...writtenOut(message, false),
  channel: channel.id,
  event_ts: message.edited?.ts ?? message.ts,
});

/** The events that the platform makes of what happens in a channel. */
export const makeEvents = ({ desk, subscriptions, deliver }: Stage) => {
  const { workspace } = desk;

  const event = (payload: Record<string, unknown>): Sent =>
    deliver({
      kind: 'events_api',
      payload: {
        token: 'verification',
        team_id: team.id,
        api_app_id: bot.appId,
        type: 'event_callback',
        event_id: desk.newId('Ev'),
        event_time: Math.floor(workspace.clock.nowMs() / 1000),
        authorizations: [
          { team_id: team.id, user_id: bot.userId, is_bot: true, is_enterprise_install: false },
        ],
        event: payload,
      },
    });

  const listensTo = (channel: Channel): boolean =>
    subscriptions.includes(messageKinds[channel.kind]) && channel.members.has(bot.userId);

  const mentioned = (channel: Channel, message: Message): readonly Sent[] =>
    channel.kind !== 'direct' &&
    mentionsBot.test(message.text) &&
    channel.members.has(bot.userId) &&
    subscriptions.includes('app_mention')
      ? [event({ ...place(channel, message), type: 'app_mention' })]
      : [];

  const hidden = (channel: Channel, subtype: string, parts: Record<string, unknown>): readonly Sent[] => {
    if (!listensTo(channel)) return [];
    const kind = { channel: channel.id, channel_type: channelTypes[channel.kind] };
    const ts = workspace.stamp();
    return [event({ type: 'message', subtype, hidden: true, event_ts: ts, ts, ...kind, ...parts })];
  };

  return {
    /** News of the workspace itself, where the app is subscribed to that kind. */
    told: (news: { readonly type: string; readonly [key: string]: unknown }): readonly Sent[] =>
      subscriptions.includes(news.type) ? [event({ ...news, event_ts: workspace.stamp() })] : [],
    /** A mention is told twice to an app that also listens to the channel's messages. */
    said: (channel: Channel, message: Message): readonly Sent[] => [
      ...mentioned(channel, message),
      ...(listensTo(channel)
        ? [event({ ...place(channel, message), channel_type: channelTypes[channel.kind] })]
        : []),
    ],
    /** An edited mention is told again under its old stamp; listeners to messages hear of a change. */
    edited: (channel: Channel, message: Message, previous: object): readonly Sent[] => [
      ...mentioned(channel, message),
      ...hidden(channel, 'message_changed', {
        message: writtenOut(message, false),
        previous_message: previous,
      }),
    ],
    removed: (channel: Channel, message: Message): readonly Sent[] =>
      hidden(channel, 'message_deleted', {
        deleted_ts: message.ts,
        previous_message: writtenOut(message, false),
      }),
  };
};
