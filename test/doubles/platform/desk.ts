import { Refused } from './arguments.ts';
import type { Arguments, Records } from './records.ts';
import type { Channel, Workspace } from './workspace.ts';
import { bot } from './workspace.ts';

export type StoredFile = {
  readonly id: string;
  readonly name: string;
  readonly length: number;
  readonly altText: string | null;
  bytes: Buffer | null;
  completed: boolean;
  /** Posts that show it are refused until the platform has looked at it; each refusal uses one up. */
  refusalsLeft: number;
};

export type Trigger = { readonly bornMs: number; used: boolean };
export type OpenView = { readonly id: string; hash: string; view: unknown };

/** All that a method of the Web API works on. */
export type Desk = {
  readonly workspace: Workspace;
  readonly records: Records;
  readonly files: Map<string, StoredFile>;
  readonly triggers: Map<string, Trigger>;
  readonly views: Map<string, OpenView>;
  readonly homes: Map<string, OpenView>;
  /** Where the platform listens, without a path; known once it listens. */
  readonly origin: () => string;
  readonly newId: (prefix: string) => string;
};

export type Method = (desk: Desk, args: Arguments) => Record<string, unknown>;
export type Methods = Readonly<Record<string, Method>>;

/** The channel, as far as the bot may know of it. */
export const knownChannel = (desk: Desk, id: string): Channel => {
  const { channels, people, directWith } = desk.workspace;
  // whoever is named as a channel is spoken to directly
  const channel = people.get(id)?.deleted === false ? directWith(id) : channels.get(id);
  const hidden = channel !== undefined && channel.kind !== 'public' && !channel.members.has(bot.userId);
  if (channel === undefined || hidden) throw new Refused('channel_not_found');
  return channel;
};

export const joinedChannel = (desk: Desk, id: string): Channel => {
  const channel = knownChannel(desk, id);
  if (!channel.members.has(bot.userId)) throw new Refused('not_in_channel');
  return channel;
};

export const openChannel = (desk: Desk, id: string): Channel => {
  const channel = joinedChannel(desk, id);
  if (channel.archived) throw new Refused('is_archived');
  return channel;
};
