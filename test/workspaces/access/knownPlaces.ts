import type { ChannelFacts, KnownPlaces, PersonFacts } from '../../../src/workspaces/access/places.ts';

export const anOpenChannel: ChannelFacts = {
  kind: 'public',
  there: true,
  archived: false,
  joined: true,
  shared: false,
  guests: false,
};

export const aMember: PersonFacts = { left: false, guest: false };

export type MadePlaces = {
  readonly channels?: Readonly<Record<string, Partial<ChannelFacts>>>;
  readonly people?: Readonly<Record<string, Partial<PersonFacts>>>;
  /** Members of private channels. */
  readonly members?: Readonly<Record<string, readonly string[]>>;
  readonly moved?: Readonly<Record<string, string>>;
};

/** Channels and people that are known beforehand; others are unknown however long one waits. */
export const knownPlaces = (made: MadePlaces): KnownPlaces & { readonly learned: readonly string[] } => {
  const learned: string[] = [];
  const currentId = (_team: string, channel: string) => made.moved?.[channel] ?? channel;
  return {
    channel: (team, channel) => {
      const facts = made.channels?.[currentId(team, channel)];
      return facts === undefined ? null : { ...anOpenChannel, ...facts };
    },
    person: (_team, person) => {
      const facts = made.people?.[person];
      return facts === undefined ? null : { ...aMember, ...facts };
    },
    isMember: (team, channel, person) => made.members?.[currentId(team, channel)]?.includes(person) ?? null,
    learnChannel: async (_team, channel) => void learned.push(channel),
    learnPerson: async (_team, person) => void learned.push(person),
    currentId,
    learned,
  };
};

export const nothingNamed = {
  workspaces: [],
  channels: [],
  people: [],
  verbs: {},
  sharedChannels: [],
  digestManagers: [],
  questionsPerMinute: null,
} as const;
