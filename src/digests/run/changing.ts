import type { InstantMs } from '../../terms/clock.ts';
import type { Skipped } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import { bothSkipped } from '../due.ts';
import { readDigestMemory } from '../memory.ts';
import type { Calendar } from '../ports.ts';
import { nextDue } from '../schedule.ts';
import type { RunParts } from './parts.ts';

const mostAttempts = 10;

/**
 * Makes a change to a subscription as it stands now: people change it while it is worked on, so what is written is
 * always made from what they left. What was written; null where it could not be, which the operator is told.
 */
export const change = async (
  { store, tell }: Pick<RunParts, 'store' | 'tell'>,
  { team, id }: Pick<Subscription, 'team' | 'id'>,
  changed: (current: Subscription) => Subscription,
): Promise<Subscription | null> => {
  for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
    const current = await store.find(team, id);
    if (!current.ok || current.value === null) {
      if (!current.ok) tell(`${id} could not be noted: ${current.problem.message}`);
      return null;
    }
    const saved = await store.save(changed(current.value));
    if (!saved.ok) {
      tell(`${id} could not be noted: ${saved.problem.message}`);
      return null;
    }
    if (saved.value !== null) return saved.value;
  }
  tell(`${id} is being changed without end and could not be noted.`);
  return null;
};

/**
 * Ends a claim: for good where what was done is noted, else so that it is taken up again; what was said then is said
 * under the same key, and so not twice.
 */
export const finish = async (
  { store, clock, holder, tell }: Pick<RunParts, 'store' | 'clock' | 'holder' | 'tell'>,
  key: string,
  noted: Subscription | null,
): Promise<void> => {
  const ended = noted === null ? await store.release(key, holder) : await store.settle(key, clock.nowMs());
  if (!ended.ok) tell(`${key} was done but not noted: ${ended.problem.message}`);
};

/** Whether the clock brings anything: not where a person paused or stopped it. */
const isPlanned = ({ state, pausedWhy }: Subscription): boolean =>
  state === 'active' || (state === 'paused' && pausedWhy === 'place');

/** The subscription with its next due instant as its schedule and the calendar have it now. */
export const planned = (subscription: Subscription, calendar: Calendar): Subscription => {
  const { schedule, settledUpToMs } = subscription;
  const nextDueMs =
    schedule === null || !isPlanned(subscription) ? null : nextDue(schedule, settledUpToMs, calendar);
  return { ...subscription, nextDueMs };
};

/** Everything up to an instant is settled; what was left out is remembered for the next post. */
export const settledUpTo = (
  subscription: Subscription,
  untilMs: InstantMs,
  skipped: Skipped | null,
  calendar: Calendar,
): Subscription => {
  const memory = readDigestMemory(subscription.memory);
  return planned(
    {
      ...subscription,
      settledUpToMs: Math.max(subscription.settledUpToMs, untilMs),
      memory: JSON.stringify({ ...memory, skipped: bothSkipped(memory.skipped, skipped) }),
    },
    calendar,
  );
};
