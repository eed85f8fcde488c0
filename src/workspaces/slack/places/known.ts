import type { ChannelFacts, KnownPlaces, PersonFacts } from '../../access/places.ts';

/** What the platform says; null where it does not say it now. */
export type Lookups = {
  readonly channel: (channel: string) => Promise<Omit<ChannelFacts, 'guests'> | null>;
  readonly members: (channel: string) => Promise<readonly string[] | null>;
  readonly person: (team: string, person: string) => Promise<PersonFacts | null>;
  /** Everybody of the workspace. */
  readonly everybody: (team: string) => Promise<ReadonlyMap<string, PersonFacts> | null>;
};

/** What is known of channels and people, and how it is put right. */
export type Places = KnownPlaces & {
  /** From now on there is somebody to ask. */
  readonly connect: (lookups: Lookups, botUserId: string) => void;
  /** It has changed: it is looked up before it is relied on again. */
  readonly forgetChannel: (team: string, channel: string) => void;
  readonly changePerson: (team: string, person: string, facts: PersonFacts) => void;
  readonly moved: (team: string, from: string, to: string) => void;
};
