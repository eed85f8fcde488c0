import type { NewSubscription } from '../../src/terms/subscriptions.ts';

/** A digest of KELP in channel C1, as somebody has just made it. */
export const newDigest = (more: Partial<NewSubscription> = {}): NewSubscription => ({
  kind: 'digest',
  team: 'T1',
  owner: 'U1',
  place: 'channel',
  channel: 'C1',
  questions: ['tail KELP 500d at 99% confidence 95% over 1d by student'],
  body: '{"tickers":["KELP"]}',
  schedule: { days: { kind: 'on', weekdays: [1, 4] }, minutes: 510, timeZone: 'Europe/London' },
  state: 'active',
  pausedWhy: null,
  createdAtMs: 1_796_114_400_000,
  nextDueMs: 1_796_200_200_000,
  settledUpToMs: 1_796_114_400_000,
  awaitingUntilMs: null,
  memory: '{}',
  ...more,
});

export const newWatch = (more: Partial<NewSubscription> = {}): NewSubscription =>
  newDigest({ kind: 'watch', schedule: null, nextDueMs: null, ...more });
