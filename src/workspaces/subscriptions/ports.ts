import type { DigestChange, DigestQuestion, WatchQuestion } from '../../questions/question.ts';
import type { Result } from '../../terms/result.ts';
import type { DigestPost, WatchReading } from '../../terms/scheduledPosts.ts';
import type { NewSubscription, Subscription, SubscriptionFilter } from '../../terms/subscriptions.ts';

/** Who makes something, and where it will speak. */
export type Maker = Pick<Subscription, 'team' | 'owner' | 'place' | 'channel'>;

export type WatchMade = {
  readonly made: NewSubscription;
  readonly watching: {
    readonly ticker: string;
    readonly tailLevel: number;
    readonly confidenceLevel: number;
    readonly model: string;
  };
  readonly reading: WatchReading;
};

/** What a conversation needs of digests and watches. */
export type DeskSubscriptions = {
  readonly store: {
    readonly add: (given: NewSubscription) => Promise<Result<Subscription>>;
    readonly find: (team: string, id: string) => Promise<Result<Subscription | null>>;
    readonly list: (filter: SubscriptionFilter) => Promise<Result<readonly Subscription[]>>;
    /** null where it has changed since it was read. */
    readonly save: (changed: Subscription) => Promise<Result<Subscription | null>>;
  };
  /** False where they are only read. */
  readonly keeps: boolean;
  /** The line that would make the same anew. */
  readonly asks: (subscription: Subscription) => string;
  readonly newDigest: (question: DigestQuestion & { readonly do: 'add' }, by: Maker) => NewSubscription;
  readonly newWatch: (
    question: WatchQuestion & { readonly do: 'add' },
    by: Maker,
  ) => Promise<Result<WatchMade>>;
  readonly changed: (subscription: Subscription, change: DigestChange) => Result<Subscription>;
  readonly paused: (subscription: Subscription) => Subscription;
  readonly resumed: (subscription: Subscription) => Result<Subscription>;
  readonly stopped: (subscription: Subscription) => Subscription;
  readonly digestNow: (subscription: Subscription) => Promise<Result<DigestPost>>;
  readonly weekdaysAssumed: (subscription: Pick<Subscription, 'id' | 'body' | 'schedule'>) => boolean;
};
