import type { InstantMs } from '../terms/clock.ts';
import type { Skipped } from '../terms/scheduledPosts.ts';
import type { Schedule } from '../terms/subscriptions.ts';
import { instantOf, localTimeAt } from '../terms/zonedTime.ts';
import type { Calendar } from './ports.ts';
import { duesBetween } from './schedule.ts';

/** What is to be done now. Of several dues that passed only the last can be posted; it says which were left out. */
export type DueDecision =
  | { readonly kind: 'nothing' }
  | { readonly kind: 'post'; readonly dueMs: InstantMs; readonly skipped: Skipped | null }
  /** All of them are too late. */
  | { readonly kind: 'skip'; readonly skipped: Skipped };

const skippedOf = (dues: readonly InstantMs[]): Skipped | null => {
  const [firstMs] = dues;
  const lastMs = dues.at(-1);
  return firstMs === undefined || lastMs === undefined ? null : { count: dues.length, firstMs, lastMs };
};

/**
 * Decides from the schedule, up to when everything is settled, the hour and the calendar, and from nothing else: a host
 * that slept, a clock that was set back and a restart need no case of their own.
 */
export const decideDue = (
  schedule: Schedule,
  settledUpToMs: InstantMs,
  nowMs: InstantMs,
  calendar: Calendar,
  mostLateMs: number,
): DueDecision => {
  const dues = duesBetween(schedule, settledUpToMs, nowMs, calendar);
  const last = dues.at(-1);
  if (last === undefined) return { kind: 'nothing' };
  if (nowMs - last <= mostLateMs) return { kind: 'post', dueMs: last, skipped: skippedOf(dues.slice(0, -1)) };
  const skipped = skippedOf(dues);
  return skipped === null ? { kind: 'nothing' } : { kind: 'skip', skipped };
};

/** What was left out earlier and what was now, together. */
export const bothSkipped = (earlier: Skipped | null, later: Skipped | null): Skipped | null => {
  if (earlier === null || later === null) return earlier ?? later;
  return { count: earlier.count + later.count, firstMs: earlier.firstMs, lastMs: later.lastMs };
};

const noon = 12 * 60;

/** Until when the prices that were missing are waited for: noon of the day on which it was due; null where that is over. */
export const awaitedUntil = (dueMs: InstantMs, timeZone: string): InstantMs | null => {
  const untilMs = instantOf({ day: localTimeAt(dueMs, timeZone).day, minutes: noon }, timeZone);
  return untilMs > dueMs ? untilMs : null;
};
