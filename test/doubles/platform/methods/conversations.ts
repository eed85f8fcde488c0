import { flag, needed, page, Refused, words } from '../arguments.ts';
import { joinedChannel, knownChannel, type Method, type Methods } from '../desk.ts';
import type { Arguments } from '../records.ts';
import { bot, type Channel, type Message, writtenOut } from '../workspace.ts';

const within = (args: Arguments) => (message: Message) => {
  const oldest = words(args, 'oldest') ?? '0';
  const latest = words(args, 'latest');
  const inclusive = flag(args, 'inclusive');
  const late = Number(message.ts) > Number(oldest) || (inclusive && message.ts === oldest);
  const early =
    latest === null || Number(message.ts) < Number(latest) || (inclusive && message.ts === latest);
  return late && early;
};

const topLevel = (message: Message): boolean =>
  message.threadTs === null || message.threadTs === message.ts || message.subtype === 'thread_broadcast';

const listed = (messages: readonly Message[], args: Arguments) => {
  const { items, hasMore, response_metadata } = page(messages, args, 999);
  const withMetadata = flag(args, 'include_all_metadata');
  return {
    messages: items.map((message) => writtenOut(message, withMetadata)),
    has_more: hasMore,
    response_metadata,
  };
};

const history: Method = (desk, args) => {
  const channel = joinedChannel(desk, needed(args, 'channel'));
  return listed(channel.messages.filter(topLevel).filter(within(args)).reverse(), args);
};

/** The message that began the thread is always among them, whatever the span. */
const replies: Method = (desk, args) => {
  const channel = joinedChannel(desk, needed(args, 'channel'));
  const threadTs = needed(args, 'ts');
  const parent = channel.messages.filter((message) => message.ts === threadTs);
  const inThread = channel.messages.filter((message) => message.threadTs === threadTs);
  if (parent.length === 0 && inThread.length === 0) throw new Refused('thread_not_found');
  return listed([...parent, ...inThread.filter(within(args))], args);
};

const described = (channel: Channel) => ({
  id: channel.id,
  name: channel.name,
  is_channel: channel.kind === 'public',
  is_group: channel.kind === 'private',
  is_im: channel.kind === 'direct',
  is_private: channel.kind !== 'public',
  is_archived: channel.archived,
  is_shared: channel.shared === 'external',
  is_ext_shared: channel.shared === 'external',
  is_pending_ext_shared: channel.shared === 'pending',
  is_member: channel.members.has(bot.userId),
});

const info: Method = (desk, args) => ({ channel: described(knownChannel(desk, needed(args, 'channel'))) });

const members: Method = (desk, args) => {
  const channel = knownChannel(desk, needed(args, 'channel'));
  const { items, response_metadata } = page([...channel.members], args, 1000);
  return { members: items, response_metadata };
};

export const conversations: Methods = {
  'conversations.history': history,
  'conversations.replies': replies,
  'conversations.info': info,
  'conversations.members': members,
};
