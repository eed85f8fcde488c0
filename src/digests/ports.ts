import type { Answers } from '../answers/answer.ts';
import type { StatisticalQuestion } from '../questions/question.ts';
import type { InstantMs } from '../terms/clock.ts';
import type { Day } from '../terms/day.ts';
import type { Level } from '../terms/level.ts';
import type { PriceSeries } from '../terms/prices.ts';
import type { Result } from '../terms/result.ts';
import type { ReturnType } from '../terms/returns.ts';
import type { ScheduledPost } from '../terms/scheduledPosts.ts';
import type { Claim, NewSubscription, Subscription, SubscriptionFilter } from '../terms/subscriptions.ts';

/** Where digests and watches are kept. Whatever goes wrong there comes back as a problem. */
export type SubscriptionStore = {
  readonly add: (given: NewSubscription) => Promise<Result<Subscription>>;
  readonly find: (team: string, id: string) => Promise<Result<Subscription | null>>;
  /** In the order in which they were made. */
  readonly list: (filter: SubscriptionFilter) => Promise<Result<readonly Subscription[]>>;
  /** Keeps a changed one under its next revision; null where it has changed since it was read. */
  readonly save: (changed: Subscription) => Promise<Result<Subscription | null>>;
  /** Those whose next due instant has come, the longest due first, at most so many. */
  readonly dueBefore: (
    team: string,
    nowMs: InstantMs,
    most: number,
  ) => Promise<Result<readonly Subscription[]>>;
  /** Those that were posted on old prices and still wait for the new ones. */
  readonly awaitingPrices: (team: string, nowMs: InstantMs) => Promise<Result<readonly Subscription[]>>;
  /** True for one holder at a time; the same holder may claim anew. Never true again once the key is settled. */
  readonly claim: (claim: Claim) => Promise<Result<boolean>>;
  readonly settle: (key: string, nowMs: InstantMs) => Promise<Result<null>>;
  readonly release: (key: string, holder: string) => Promise<Result<null>>;
  /** Forgets what was settled before an instant; how many. */
  readonly forgetSettled: (beforeMs: InstantMs) => Promise<Result<number>>;
};

/** On which days tickers trade. */
export type Calendar = {
  readonly isSession: (day: Day) => boolean;
  /** False where no file of holidays speaks of that year, so that every weekday counts. */
  readonly knows: (year: number) => boolean;
};

/** Prices as a digest meets them: it begins and ends on one reading of the feed. */
export type PricesNow = {
  readonly fingerprint: string;
  readonly series: (ticker: string) => PriceSeries | null;
  /** Why a ticker of the feed is not served, as a sentence; null where it is served or not there. */
  readonly heldBack: (ticker: string) => string | null;
  /** The returns of the days after a day, oldest first; after null: of the last day alone. */
  readonly returnsAfter: (
    ticker: string,
    after: Day | null,
    returnType: ReturnType,
  ) => readonly { readonly day: Day; readonly value: number }[];
  /** The latest session of a ticker whose closes should be in at an instant. */
  readonly expectedDay: (ticker: string, atMs: InstantMs) => Day;
  /** A statistical question answered, and kept on record as asked by the subscription. */
  readonly ask: (question: StatisticalQuestion, by: Subscription) => Promise<Result<Answers>>;
};

/** Something to be said once: the same key never appears twice, whatever crashes in between. */
export type PostToSay = {
  readonly key: string;
  readonly team: string;
  readonly channel: string;
  readonly threadTs: string | null;
  readonly urgent: boolean;
  /** Not said any more after this. */
  readonly expiresAtMs: InstantMs | null;
  readonly post: ScheduledPost;
};

export type Deliver = (
  saying: PostToSay,
) => Promise<
  | { readonly kind: 'said'; readonly ts: string }
  | { readonly kind: 'refused'; readonly code: string }
  | { readonly kind: 'expired' }
>;

/** Whether a place may be posted to now. */
export type PlaceVerdict =
  | { readonly kind: 'fine' }
  | { readonly kind: 'paused'; readonly why: string }
  | { readonly kind: 'stopped'; readonly why: string };

export type PlaceState = (team: string, channel: string, owner: string) => Promise<PlaceVerdict>;

/** What chance alone brings: the share of models that are right and yet not in the green zone after so many days. */
export type ChanceOfNonGreen = (days: number, tailLevel: Level) => number | null;
