import type { InstantMs } from './clock.ts';

/**
 * On which days something is posted. `sessions`: the days on which the tickers trade; `on`: the days of the week by
 * their ISO 8601 number, ascending; `monthStart` and `monthEnd`: the first and the last session of a month.
 */
export type ScheduleDays =
  | { readonly kind: 'sessions' | 'weekdays' | 'daily' | 'monthStart' | 'monthEnd' }
  | { readonly kind: 'on'; readonly weekdays: readonly number[] };

/** When something is posted: on these days at so many minutes after midnight on the clocks of an IANA time zone. */
export type Schedule = {
  readonly days: ScheduleDays;
  readonly minutes: number;
  readonly timeZone: string;
};

export type SubscriptionKind = 'digest' | 'watch';
export type SubscriptionState = 'active' | 'paused' | 'stopped';

/** A digest or a watch: what a place is told without anybody asking anew. */
export type Subscription = {
  readonly kind: SubscriptionKind;
  readonly team: string;
  /** `D-12`, `W-7`: counted in each team, never given twice. */
  readonly id: string;
  /** The person who made it. */
  readonly owner: string;
  readonly place: 'channel' | 'direct' | 'terminal';
  readonly channel: string;
  /** What it asks, in full: canonical questions with every default filled in. */
  readonly questions: readonly string[];
  /** What it asks, as data that its own room reads: JSON. */
  readonly body: string;
  /** null for a watch, which looks whenever there is a new day of prices. */
  readonly schedule: Schedule | null;
  readonly state: SubscriptionState;
  /** Who paused it: a person, or the place that cannot be posted to. null unless paused. */
  readonly pausedWhy: 'person' | 'place' | null;
  /** Grows with every change; a change made from an older one is refused. */
  readonly revision: number;
  readonly createdAtMs: InstantMs;
  /** null where nothing is due by the clock: a watch, and whatever a person paused or stopped. */
  readonly nextDueMs: InstantMs | null;
  /** Whatever was due up to this instant is settled, posted or not. */
  readonly settledUpToMs: InstantMs;
  /** Until when a digest posted on old prices waits for the new ones. */
  readonly awaitingUntilMs: InstantMs | null;
  /** What it must remember from one time to the next, as data that its own room reads: JSON. */
  readonly memory: string;
};

/** What a person makes; the store gives it its id and its first revision. */
export type NewSubscription = Omit<Subscription, 'id' | 'revision'>;

export type SubscriptionFilter = {
  readonly team: string;
  readonly kind?: SubscriptionKind;
  readonly channel?: string;
  readonly owner?: string;
  readonly states?: readonly SubscriptionState[];
};

/** The right to do one thing, such as the digest of one due instant, for a while: whoever has it is the only one. */
export type Claim = {
  readonly key: string;
  readonly holder: string;
  readonly nowMs: InstantMs;
  readonly leaseMs: number;
};
