import type { InstantMs } from '../terms/clock.ts';
import type { Day } from '../terms/day.ts';
import type { Skipped } from '../terms/scheduledPosts.ts';

/** What a digest remembers from one post to the next. Written and read here alone, as JSON. */
export type DigestMemory = {
  /** VaR of each ticker in the last post. */
  readonly vars: Readonly<Record<string, number>>;
  /** Dues left out since the last post. */
  readonly skipped: Skipped | null;
  /** The post on old prices that waits for new ones, and its thread; null for as long as it is not known to be posted. */
  readonly awaiting: { readonly dueMs: InstantMs; readonly ts: string | null } | null;
};

/** What a watch remembers from one session to the next. */
export type WatchMemory = {
  /** The last day of prices that was looked at. */
  readonly lastDay: Day | null;
  /** Hex SHA-256 of the prices up to that day: tells a restatement of the past. */
  readonly past: string | null;
  /** The past was restated since the last message. */
  readonly restated: boolean;
  readonly crossed: boolean;
  /** Sessions on the other side since it was crossed. */
  readonly calmSessions: number;
  /** It was said that it cannot be told. */
  readonly saidCannotTell: boolean;
  /** The tail figure made on `lastDay`, for the losses after it. */
  readonly figure: { readonly day: Day; readonly value: number; readonly answerId: string } | null;
};

export const freshDigestMemory: DigestMemory = { vars: {}, skipped: null, awaiting: null };

export const freshWatchMemory: WatchMemory = {
  lastDay: null,
  past: null,
  restated: false,
  crossed: false,
  calmSessions: 0,
  saidCannotTell: false,
  figure: null,
};

/** What is missing in a memory written by an earlier version is as in a fresh one. */
export const readDigestMemory = (memory: string): DigestMemory => ({
  ...freshDigestMemory,
  ...JSON.parse(memory),
});

export const readWatchMemory = (memory: string): WatchMemory => ({
  ...freshWatchMemory,
  ...JSON.parse(memory),
});
