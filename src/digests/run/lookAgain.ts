import type { Subscription } from '../../terms/subscriptions.ts';
import { change } from './changing.ts';
import type { RunParts } from './parts.ts';
import { holdBack, takenUp } from './places.ts';

/** What posts into a channel, or what a person made. */
export type Touched = { readonly channel: string } | { readonly owner: string };

type Looking = Pick<RunParts, 'team' | 'store' | 'deliver' | 'placeState' | 'tell'>;

const lookAtOne = async (parts: Looking, subscription: Subscription): Promise<void> => {
  const { team, channel, owner, revision } = subscription;
  const verdict = await parts.placeState(team, channel, owner);
  if (verdict.kind !== 'fine') await holdBack(parts, subscription, verdict, revision);
  else if (subscription.pausedWhy === 'place') await change(parts, subscription, takenUp);
};

/**
 * Something has become of a channel or of a person: what posts there, or for them, is held back or taken up at once,
 * and not only when it falls due.
 */
export const lookAgain = async (parts: Looking, touched: Touched): Promise<void> => {
  const found = await parts.store.list({ team: parts.team, states: ['active', 'paused'], ...touched });
  if (!found.ok)
    return parts.tell(`What posts into a changed place cannot be read: ${found.problem.message}`);
  for (const subscription of found.value)
    if (subscription.pausedWhy !== 'person') await lookAtOne(parts, subscription);
};
