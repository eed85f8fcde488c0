import type { InstantMs } from '../../../terms/clock.ts';
import type { KeptSaying, Lease, Saying, SayingOutcome } from '../../../terms/delivery.ts';
import type { InboxEvent, KeptEvent, PostedContent } from '../../../terms/inbox.ts';
import type { Result } from '../../../terms/result.ts';

/** What a holder of leases needs of the store, for what is to be said and for what was asked alike. */
export type LeasedStore<T> = {
  readonly renew: (keys: readonly string[], lease: Lease) => Promise<Result<null>>;
  /** Takes what nobody holds and is not settled, at most so many. */
  readonly takeOver: (
    lease: Lease,
    nowMs: InstantMs,
    underWay: readonly string[],
    most: number,
  ) => Promise<Result<readonly T[]>>;
  readonly release: (holder: string) => Promise<Result<null>>;
};

export type DeliveryStore = LeasedStore<KeptSaying> & {
  /** Keeps a saying whose key is new. What is kept under the key, held by the lease unless another holder has it. */
  readonly take: (
    saying: Saying,
    deliveryId: string,
    lease: Lease,
    nowMs: InstantMs,
  ) => Promise<Result<KeptSaying>>;
  readonly begin: (key: string, lease: Lease, nowMs: InstantMs) => Promise<Result<boolean>>;
  readonly undone: (key: string, holder: string) => Promise<Result<null>>;
  readonly settle: (key: string, outcome: SayingOutcome, nowMs: InstantMs) => Promise<Result<null>>;
  readonly find: (keys: readonly string[]) => Promise<Result<readonly KeptSaying[]>>;
};

export type InboxStore = LeasedStore<KeptEvent> & {
  /** The event where it is this holder's to deal with; null where it was dealt with, or somebody else does. */
  readonly keep: (event: InboxEvent, lease: Lease, nowMs: InstantMs) => Promise<Result<KeptEvent | null>>;
  readonly willEdit: (key: string, into: PostedContent) => Promise<Result<null>>;
  readonly settle: (key: string, nowMs: InstantMs) => Promise<Result<null>>;
  readonly ofMessage: (messageKey: string) => Promise<Result<readonly KeptEvent[]>>;
};

/** What of the store makes receiving and sending survive the process. */
export type DurableStore = { readonly deliveries: DeliveryStore; readonly inbox: InboxStore };
