import type { Clock } from '../../../src/terms/clock.ts';

export type Block = { readonly type: string; readonly [key: string]: unknown };
export type Metadata = { readonly event_type: string; readonly event_payload: Record<string, unknown> };

export type Message = {
  readonly ts: string;
  readonly channel: string;
  readonly user: string;
  readonly botId: string | null;
  readonly threadTs: string | null;
  readonly subtype: string | null;
  /** Posted through a response address: the platform lets nobody edit it afterwards. */
  readonly fixed: boolean;
  text: string;
  blocks: readonly Block[];
  metadata: Metadata | null;
  edited: { readonly user: string; readonly ts: string } | null;
};

export type Channel = {
  readonly id: string;
  readonly name: string;
  readonly kind: 'public' | 'private' | 'direct';
  readonly members: Set<string>;
  archived: boolean;
  shared: 'no' | 'pending' | 'external';
  readonly messages: Message[];
  readonly pins: string[];
};

export type Person = {
  readonly id: string;
  readonly name: string;
  readonly zone: string;
  readonly guest: 'no' | 'several channels' | 'one channel';
  deleted: boolean;
};

/** What the platform remembers of one workspace: who is there, which channels there are and what was said in them. */
export type Workspace = ReturnType<typeof makeWorkspace>;

export const bot = { userId: 'U0LEADSMAN', botId: 'B0LEADSMAN', appId: 'A0LEADSMAN', name: 'leadsman' };
export const team = { id: 'T0DESK', domain: 'desk' };

const seats = (): Person[] => [
  { id: 'U0ADA', name: 'ada', zone: 'Europe/London', guest: 'no', deleted: false },
  { id: 'U0BEN', name: 'ben', zone: 'America/New_York', guest: 'no', deleted: false },
  { id: 'U0GUS', name: 'gus', zone: 'Europe/Paris', guest: 'one channel', deleted: false },
];

export const makeWorkspace = (clock: Clock) => {
  const channels = new Map<string, Channel>();
  const people = new Map(seats().map((person) => [person.id, person]));
  let lastStamp = '';
  let count = 0;

  /** Message stamps are the second and a count, unique and ascending in the whole workspace. */
  const stamp = (): string => {
    count += 1;
    const seconds = Math.floor(clock.nowMs() / 1000);
    lastStamp = `${seconds}.${String(count).padStart(6, '0')}`;
    return lastStamp;
  };

  const addChannel = (channel: Partial<Channel> & { readonly id: string }): Channel => {
    const added: Channel = {
      name: channel.id.toLowerCase(),
      kind: 'public',
      members: new Set([...people.keys(), bot.userId]),
      archived: false,
      shared: 'no',
      messages: [],
      pins: [],
      ...channel,
    };
    channels.set(added.id, added);
    return added;
  };

  /** The direct conversation of a person with the bot. */
  const directWith = (user: string): Channel => {
    const id = `D${user.slice(1)}`;
    return (
      channels.get(id) ?? addChannel({ id, kind: 'direct', name: '', members: new Set([user, bot.userId]) })
    );
  };

  const say = (channel: Channel, said: Partial<Message> & { readonly user: string }): Message => {
    const message: Message = {
      ts: stamp(),
      channel: channel.id,
      botId: null,
      threadTs: null,
      subtype: null,
      fixed: false,
      text: '',
      blocks: [],
      metadata: null,
      edited: null,
      ...said,
    };
    channel.messages.push(message);
    return message;
  };

  const messageAt = (channel: string, ts: string): Message | null =>
    channels.get(channel)?.messages.find((message) => message.ts === ts) ?? null;

  addChannel({ id: 'C0DESK', name: 'desk' });
  addChannel({ id: 'C0RATES', name: 'rates' });
  addChannel({ id: 'C0ELSEWHERE', name: 'elsewhere', members: new Set(['U0ADA']) });
  addChannel({ id: 'C0OLD', name: 'old', archived: true });

  return { clock, channels, people, stamp, addChannel, directWith, say, messageAt };
};

/** A message as the platform writes it out. Metadata is left out unless it was asked for. */
export const writtenOut = (message: Message, withMetadata: boolean) => ({
  type: 'message',
  ts: message.ts,
  user: message.user,
  text: message.text,
  team: team.id,
  ...(message.botId === null ? {} : { bot_id: message.botId, app_id: bot.appId }),
  ...(message.subtype === null ? {} : { subtype: message.subtype }),
  ...(message.blocks.length === 0 ? {} : { blocks: message.blocks }),
  ...(message.threadTs === null ? {} : { thread_ts: message.threadTs }),
  ...(message.edited === null ? {} : { edited: message.edited }),
  ...(withMetadata && message.metadata !== null ? { metadata: message.metadata } : {}),
});
