import type { Subscription } from '../../terms/subscriptions.ts';
import type { PlaceVerdict } from '../ports.ts';
import { change } from './changing.ts';
import type { RunParts } from './parts.ts';

/** What the platform says when it does not take a post, as the reason that the owner is told. */
const reasons: Readonly<Record<string, string>> = {
  is_archived: 'archived',
  not_in_channel: 'notMember',
  channel_not_found: 'gone',
  restricted_action: 'restricted',
};

export const refusedBecause = (code: string): PlaceVerdict => ({
  kind: 'paused',
  why: reasons[code] ?? code,
});

/** Tells the owner once, in a message to them alone; `at` is what it is about, the same at each attempt. */
const tellOwner = async (
  { deliver, tell }: Pick<RunParts, 'deliver' | 'tell'>,
  { team, id, owner, kind, channel }: Subscription,
  what: 'paused' | 'stopped',
  why: string,
  at: number,
): Promise<void> => {
  const outcome = await deliver({
    key: `note:${team}:${id}:${what}:${at}`,
    team,
    channel: owner,
    threadTs: null,
    urgent: false,
    expiresAtMs: null,
    post: { kind: 'note', id, subject: kind, what, why, channel },
  });
  if (outcome.kind === 'refused') tell(`${id} was ${what} (${why}), and its owner could not be told.`);
};

/**
 * Acts on a place that may not be posted to: pauses until it may, or stops for good; the owner is told first, so that a
 * crash in between never leaves them untold. Nothing is said again of what is paused already.
 */
export const holdBack = async (
  parts: Pick<RunParts, 'store' | 'deliver' | 'tell'>,
  subscription: Subscription,
  verdict: Exclude<PlaceVerdict, { kind: 'fine' }>,
  at: number,
): Promise<void> => {
  if (verdict.kind === 'paused' && subscription.state === 'paused') return;
  await tellOwner(parts, subscription, verdict.kind, verdict.why, at);
  await change(parts, subscription, (current) =>
    verdict.kind === 'stopped'
      ? { ...current, state: 'stopped', pausedWhy: null, nextDueMs: null, awaitingUntilMs: null }
      : current.state === 'active'
        ? { ...current, state: 'paused', pausedWhy: 'place' }
        : current,
  );
};

/** A place that works again takes up what it had paused. */
export const takenUp = (subscription: Subscription): Subscription =>
  subscription.state === 'paused' && subscription.pausedWhy === 'place'
    ? { ...subscription, state: 'active', pausedWhy: null }
    : subscription;
