import type { Schedule, Subscription } from '../../terms/subscriptions.ts';
import type { SubscriptionRow } from '../database.ts';

export const subscriptionRow = (given: Subscription): Omit<SubscriptionRow, 'number'> => ({
  team: given.team,
  id: given.id,
  kind: given.kind,
  owner: given.owner,
  place: given.place,
  channel: given.channel,
  questions: JSON.stringify(given.questions),
  body: given.body,
  schedule: given.schedule === null ? null : JSON.stringify(given.schedule),
  state: given.state,
  paused_why: given.pausedWhy,
  revision: given.revision,
  created_at_ms: given.createdAtMs,
  next_due_ms: given.nextDueMs,
  settled_up_to_ms: given.settledUpToMs,
  awaiting_until_ms: given.awaitingUntilMs,
  memory: given.memory,
});

export const subscriptionOf = (row: SubscriptionRow): Subscription => {
  // both written by subscriptionRow above
  const questions: readonly string[] = JSON.parse(row.questions);
  const schedule: Schedule | null = row.schedule === null ? null : JSON.parse(row.schedule);
  return {
    kind: row.kind,
    team: row.team,
    id: row.id,
    owner: row.owner,
    place: row.place,
    channel: row.channel,
    questions,
    body: row.body,
    schedule,
    state: row.state,
    pausedWhy: row.paused_why,
    revision: row.revision,
    createdAtMs: row.created_at_ms,
    nextDueMs: row.next_due_ms,
    settledUpToMs: row.settled_up_to_ms,
    awaitingUntilMs: row.awaiting_until_ms,
    memory: row.memory,
  };
};
