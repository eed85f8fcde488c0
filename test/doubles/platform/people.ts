import type { Sent } from './deliveries.ts';
import { makeEvents, mentionOfBot, type Stage } from './events.ts';
import { type Channel, type Message, type Workspace, writtenOut } from './workspace.ts';

export type Place = { readonly channel: string; readonly ts: string };
export type Said = Place & { readonly sent: readonly Sent[] };

type Saying = {
  readonly user?: string;
  /** As the platform writes it out: & < > escaped, links and mentions in angle brackets. */
  readonly text: string;
  /** The stamp of the message whose thread it is said in. */
  readonly thread?: string;
  readonly subtype?: string;
  readonly botId?: string;
};

export const channelOf = (workspace: Workspace, id: string): Channel => {
  const channel = workspace.channels.get(id);
  if (channel === undefined) throw new Error(`no channel ${id} in this workspace`);
  return channel;
};

export const messageOf = (workspace: Workspace, at: Place): Message => {
  const message = workspace.messageAt(at.channel, at.ts);
  if (message === null) throw new Error(`no message ${at.ts} in ${at.channel}`);
  return message;
};

/** What people say in the workspace, each with the events that the platform makes of it. */
export const makePeople = (stage: Stage) => {
  const { workspace } = stage.desk;
  const events = makeEvents(stage);

  const say = (channel: Channel, saying: Saying): Said => {
    const message = workspace.say(channel, {
      user: saying.user ?? 'U0ADA',
      text: saying.text,
      threadTs: saying.thread ?? null,
      subtype: saying.subtype ?? null,
      botId: saying.botId ?? null,
    });
    return { channel: channel.id, ts: message.ts, sent: events.said(channel, message) };
  };

  return {
    /** Words in a channel, with a mention among them or not. */
    say: (saying: Saying & { readonly channel: string }): Said =>
      say(channelOf(workspace, saying.channel), saying),

    mention: (saying: Saying & { readonly channel: string }): Said =>
      say(channelOf(workspace, saying.channel), { ...saying, text: `${mentionOfBot} ${saying.text}` }),

    direct: (saying: Saying): Said => say(workspace.directWith(saying.user ?? 'U0ADA'), saying),

    edit: (at: Place, text: string): Said => {
      const channel = channelOf(workspace, at.channel);
      const message = messageOf(workspace, at);
      const previous = writtenOut(message, false);
      message.text = text;
      message.edited = { user: message.user, ts: workspace.stamp() };
      return { ...at, sent: events.edited(channel, message, previous) };
    },

    remove: (at: Place): Said => {
      const channel = channelOf(workspace, at.channel);
      const message = messageOf(workspace, at);
      channel.messages.splice(channel.messages.indexOf(message), 1);
      return { ...at, sent: events.removed(channel, message) };
    },
  };
};
