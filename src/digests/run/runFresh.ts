import type { Subscription } from '../../terms/subscriptions.ts';
import { readDigestBody } from '../body.ts';
import { readDigestMemory } from '../memory.ts';
import { makeDigest, varsOf } from '../post/makeDigest.ts';
import { oldPricesOf } from '../post/oldPrices.ts';
import { change, finish } from './changing.ts';
import { leaseMs, type RunParts } from './parts.ts';
import { keyOf } from './runDigest.ts';

/** The fresh line below a digest that was posted on old prices, once the new ones are in. */
export const runFresh = async (parts: RunParts, subscription: Subscription): Promise<void> => {
  const body = readDigestBody(subscription);
  const memory = readDigestMemory(subscription.memory);
  const prices = parts.prices();
  const { awaiting } = memory;
  if (!body.ok || !prices.ok || awaiting === null || awaiting.ts === null) return;
  const calendar = parts.calendars().of(body.value.tickers);
  if (oldPricesOf(prices.value, body.value.tickers, awaiting.dueMs, calendar) !== null) return;
  const key = `${keyOf(subscription, awaiting.dueMs)}:fresh`;
  const nowMs = parts.clock.nowMs();
  const claimed = await parts.store.claim({ key, holder: parts.holder, nowMs, leaseMs });
  if (!claimed.ok || !claimed.value) return;
  const post = await parts.inTurn(() =>
    makeDigest(subscription, body.value, {
      prices: prices.value,
      calendar,
      chanceOfNonGreen: parts.chanceOfNonGreen,
      vars: memory.vars,
      skipped: null,
      dueMs: awaiting.dueMs,
      nowMs,
    }),
  );
  const { team, channel, awaitingUntilMs } = subscription;
  await parts.deliver({
    key,
    team,
    channel,
    threadTs: awaiting.ts,
    urgent: false,
    expiresAtMs: awaitingUntilMs,
    post: { ...post, kind: 'fresh' },
  });
  const noted = await change(parts, subscription, (current) => {
    const now = readDigestMemory(current.memory);
    // a later digest may wait by now
    if (now.awaiting?.dueMs !== awaiting.dueMs) return current;
    return {
      ...current,
      awaitingUntilMs: null,
      memory: JSON.stringify({ ...now, vars: varsOf(post.lines, now.vars), awaiting: null }),
    };
  });
  await finish(parts, key, noted);
};
