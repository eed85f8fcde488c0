import type { InstantMs } from './clock.ts';

/** The thread in which a card stands; `thread` is null at the top of a channel or of a direct conversation. */
export type PinPlace = {
  readonly team: string;
  readonly channel: string;
  readonly thread: string | null;
};

/**
 * `posting`: wanted, and not known to stand yet. `pinned`: it stands and is pinned. `standing`: it stands, and the
 * platform would not pin it. `removed`: taken off, by unpin or by a person's hand.
 */
export type PinState = 'posting' | 'pinned' | 'standing' | 'removed';

/** A result kept at the head of a discussion: one card for each result and thread. */
export type PinnedCard = PinPlace & {
  readonly answerId: string;
  /** The canonical question. */
  readonly question: string;
  /** ISO date of the last price used. */
  readonly asOf: string;
  readonly sentence: string;
  /** Who wanted it last. */
  readonly person: string | null;
  readonly state: PinState;
  /** The card's own message; null until it stands. */
  readonly cardTs: string | null;
  /** How often it was pinned: after it was taken off it is posted anew. */
  readonly times: number;
  readonly pinnedAtMs: InstantMs;
  /** Whether its thread was told that there are new days of prices, and that prices it rests on were restated. */
  readonly toldMoved: boolean;
  readonly toldRestated: boolean;
};

/** A channel that was given another id. */
export type ChannelMove = { readonly team: string; readonly from: string; readonly to: string };
