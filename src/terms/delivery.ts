import type { InstantMs } from './clock.ts';

/** What a message holds: text for screen readers and notifications, and the blocks that are seen. */
export type MessageContent = {
  readonly text: string;
  readonly blocks: readonly { readonly type: string }[];
};

/**
 * Something to be said once. The same key never appears twice in the workspace, whatever crashes in between; the content
 * that is first given under a key is the one that is said.
 */
export type Saying = {
  readonly key: string;
  readonly team: string;
  readonly channel: string;
  readonly threadTs: string | null;
  readonly content: MessageContent;
  /** A person waits for it: it goes before what nobody waits for. */
  readonly urgent: boolean;
  /** It is not said any more after this. */
  readonly expiresAtMs: InstantMs | null;
};

export type SayingOutcome =
  | { readonly kind: 'said'; readonly ts: string }
  /** The platform says why it does not take it: is_archived, not_in_channel and the like. */
  | { readonly kind: 'refused'; readonly code: string }
  | { readonly kind: 'expired' };

/** Who deals with something, and until when nobody else may. */
export type Lease = { readonly holder: string; readonly untilMs: InstantMs };

/** A saying as it is kept until it is settled. */
export type KeptSaying = Saying & {
  /** Opaque; it stands in the metadata of the post, where other apps can read it. */
  readonly deliveryId: string;
  readonly createdAtMs: InstantMs;
  readonly firstAttemptMs: InstantMs | null;
  readonly lastAttemptMs: InstantMs | null;
  /** The last attempt was begun, and what became of it is not known. */
  readonly unsure: boolean;
  readonly lease: Lease | null;
  /** Null for as long as it is not settled. */
  readonly outcome: SayingOutcome | null;
};
