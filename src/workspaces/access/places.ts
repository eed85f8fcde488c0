/** What is known of a channel. */
export type ChannelFacts = {
  readonly kind: 'public' | 'private' | 'direct';
  /** False where it was deleted, or is private and the bot is no longer in it. */
  readonly there: boolean;
  readonly archived: boolean;
  /** Whether the bot is in it. */
  readonly joined: boolean;
  /** With another company, or about to be. */
  readonly shared: boolean;
  /** null for as long as not all of its people are known. */
  readonly guests: boolean | null;
};

/** What is known of a person. */
export type PersonFacts = {
  /** No longer in the workspace. */
  readonly left: boolean;
  /** A guest of the workspace, or somebody of another company. */
  readonly guest: boolean;
};

/** What is known of channels and people; null where nothing is. Knowledge ages: what is too old is not known any more. */
export type KnownPlaces = {
  readonly channel: (team: string, channel: string) => ChannelFacts | null;
  readonly person: (team: string, person: string) => PersonFacts | null;
  /** null where that is not known. */
  readonly isMember: (team: string, channel: string, person: string) => boolean | null;
  /** Looks up what is not known; done after a few seconds at most. */
  readonly learnChannel: (team: string, channel: string) => Promise<void>;
  readonly learnPerson: (team: string, person: string) => Promise<void>;
  /** The id that a channel has now: the platform gives some a new one when they are moved. */
  readonly currentId: (team: string, channel: string) => string;
};
