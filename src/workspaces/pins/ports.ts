import type { Reply } from '../../present/reply.ts';
import type { PinnedCard, PinPlace, PinState } from '../../terms/pins.ts';
import type { Result } from '../../terms/result.ts';

/** Where cards are kept. */
export type PinStore = {
  readonly find: (place: PinPlace, answerId: string) => Promise<Result<PinnedCard | null>>;
  /** The card whose message this is. */
  readonly findCard: (team: string, channel: string, cardTs: string) => Promise<Result<PinnedCard | null>>;
  readonly put: (card: PinnedCard) => Promise<Result<null>>;
  /** Those that stand there, the newest first. */
  readonly standingIn: (
    place: PinPlace | { readonly team: string; readonly channel: string },
  ) => Promise<Result<readonly PinnedCard[]>>;
  /** Those in these states, the oldest first, at most so many. */
  readonly list: (states: readonly PinState[], most: number) => Promise<Result<readonly PinnedCard[]>>;
};

/** What became of a pin. A refusal has the platform's own code. */
export type PinOutcome =
  | { readonly kind: 'done' }
  | { readonly kind: 'refused'; readonly code: string }
  | { readonly kind: 'unreached' };

export type Posted =
  | { readonly kind: 'said'; readonly ts: string }
  | { readonly kind: 'refused'; readonly code: string }
  | { readonly kind: 'expired' };

/** The wall that cards are put on. Whatever is said under a key is said once. */
export type Wall = {
  readonly say: (key: string, place: PinPlace, content: Reply) => Promise<Posted>;
  readonly pin: (channel: string, ts: string) => Promise<PinOutcome>;
  readonly unpin: (channel: string, ts: string) => Promise<PinOutcome>;
};

/** Cards of a desk. `wall` is null in a terminal, where the list of cards is all there is, and where none stands yet. */
export type DeskPins = { readonly store: PinStore; readonly wall: () => Wall | null };
