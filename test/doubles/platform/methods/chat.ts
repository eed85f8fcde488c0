import { needed, Refused, words } from '../arguments.ts';
import { contentOf, metadataOf } from '../content.ts';
import { type Desk, joinedChannel, knownChannel, type Method, type Methods, openChannel } from '../desk.ts';
import type { Arguments } from '../records.ts';
import { bot, type Message, writtenOut } from '../workspace.ts';

const postMessage: Method = (desk, args) => {
  const channel = openChannel(desk, needed(args, 'channel'));
  const content = contentOf(desk, args);
  const metadata = metadataOf(args);
  const threadTs = words(args, 'thread_ts');
  const message = desk.workspace.say(channel, {
    user: bot.userId,
    botId: bot.botId,
    threadTs,
    metadata,
    ...content,
  });
  desk.records.posts.add({ channel: channel.id, ts: message.ts, threadTs, metadata, args, ...content });
  return { channel: channel.id, ts: message.ts, message: writtenOut(message, true) };
};

const ownMessage = (desk: Desk, args: Arguments, refusal: string): Message => {
  const channel = joinedChannel(desk, needed(args, 'channel'));
  const message = desk.workspace.messageAt(channel.id, needed(args, 'ts'));
  if (message === null) throw new Refused('message_not_found');
  if (message.botId !== bot.botId || message.fixed) throw new Refused(refusal);
  return message;
};

/** What is not sent stays: blocks and metadata are only taken away by an empty value. */
const update: Method = (desk, args) => {
  const message = ownMessage(desk, args, 'cant_update_message');
  const content = contentOf(desk, { blocks: message.blocks, text: message.text, ...args });
  if (args['metadata'] !== undefined) message.metadata = metadataOf(args);
  Object.assign(message, content);
  desk.records.updates.add({ channel: message.channel, ts: message.ts, args, ...content });
  return { channel: message.channel, ts: message.ts, text: message.text, message: writtenOut(message, true) };
};

const remove: Method = (desk, args) => {
  const message = ownMessage(desk, args, 'cant_delete_message');
  const channel = joinedChannel(desk, message.channel);
  channel.messages.splice(channel.messages.indexOf(message), 1);
  desk.records.deletions.add(message);
  return { channel: message.channel, ts: message.ts };
};

const postEphemeral: Method = (desk, args) => {
  const channel = openChannel(desk, needed(args, 'channel'));
  const user = needed(args, 'user');
  const content = contentOf(desk, args);
  if (!channel.members.has(user)) throw new Refused('user_not_in_channel');
  const threadTs = words(args, 'thread_ts');
  const active = channel.messages.some((message) => message.threadTs === threadTs);
  const ts = desk.workspace.stamp();
  desk.records.ephemerals.add({
    channel: channel.id,
    user,
    ts,
    threadTs,
    args,
    shown: threadTs === null || active,
    ...content,
  });
  return { message_ts: ts };
};

const getPermalink: Method = (desk, args) => {
  const channel = knownChannel(desk, needed(args, 'channel'));
  const ts = needed(args, 'message_ts');
  if (desk.workspace.messageAt(channel.id, ts) === null) throw new Refused('message_not_found');
  return {
    channel: channel.id,
    permalink: `${desk.origin()}/archives/${channel.id}/p${ts.replace('.', '')}`,
  };
};

export const chat: Methods = {
  'chat.postMessage': postMessage,
  'chat.update': update,
  'chat.delete': remove,
  'chat.postEphemeral': postEphemeral,
  'chat.getPermalink': getPermalink,
};
