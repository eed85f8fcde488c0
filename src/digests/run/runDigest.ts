import type { InstantMs } from '../../terms/clock.ts';
import type { DigestPost, Skipped } from '../../terms/scheduledPosts.ts';
import type { Schedule, Subscription } from '../../terms/subscriptions.ts';
import { type DigestBody, readDigestBody } from '../body.ts';
import { awaitedUntil, bothSkipped, decideDue } from '../due.ts';
import { readDigestMemory } from '../memory.ts';
import type { Calendar } from '../ports.ts';
import { makeDigest, varsOf } from '../post/makeDigest.ts';
import { oldPricesOf } from '../post/oldPrices.ts';
import { change, finish, planned, settledUpTo } from './changing.ts';
import { leaseMs, type RunParts } from './parts.ts';
import { holdBack, refusedBecause, takenUp } from './places.ts';

/** A digest whose hour has come. */
export type Due = {
  readonly subscription: Subscription;
  readonly schedule: Schedule;
  readonly body: DigestBody;
  readonly calendar: Calendar;
  readonly dueMs: InstantMs;
  readonly skipped: Skipped | null;
};

export const keyOf = ({ team, id }: Pick<Subscription, 'team' | 'id'>, dueMs: InstantMs): string =>
  `digest:${team}:${id}:${dueMs}`;

/**
 * Notes before it is posted that it will be on old prices: should the process end in between, whoever takes it over may
 * have the new prices by then, and would not know that what stands there is old. A fresh line too many is no harm.
 */
const noteOld = (parts: RunParts, { subscription, schedule, dueMs }: Due): Promise<Subscription | null> =>
  change(parts, subscription, (current) => ({
    ...current,
    awaitingUntilMs: awaitedUntil(dueMs, schedule.timeZone),
    memory: JSON.stringify({ ...readDigestMemory(current.memory), awaiting: { dueMs, ts: null } }),
  }));

/** Notes that it was posted: what it said for the next one, and whether it still waits for prices. */
const notePosted = (
  parts: RunParts,
  due: Due,
  post: DigestPost,
  ts: string,
): Promise<Subscription | null> => {
  const { dueMs, schedule, calendar } = due;
  return change(parts, due.subscription, (current) => {
    const memory = readDigestMemory(current.memory);
    const waits = memory.awaiting?.dueMs === dueMs;
    const awaitingUntilMs = waits ? awaitedUntil(dueMs, schedule.timeZone) : null;
    return planned(
      {
        ...takenUp(current),
        settledUpToMs: Math.max(current.settledUpToMs, dueMs),
        awaitingUntilMs,
        memory: JSON.stringify({
          vars: varsOf(post.lines, memory.vars),
          skipped: null,
          awaiting: awaitingUntilMs === null ? null : { dueMs, ts },
        }),
      },
      calendar,
    );
  });
};

/** What was not posted is left out for good and said in the next one. */
const noteLeftOut = (parts: RunParts, { subscription, dueMs, skipped, calendar }: Due) => {
  const leftOut = bothSkipped(skipped, { count: 1, firstMs: dueMs, lastMs: dueMs });
  return change(parts, subscription, (current) => settledUpTo(current, dueMs, leftOut, calendar));
};

const say = async (parts: RunParts, due: Due, post: DigestPost): Promise<void> => {
  const { subscription, dueMs } = due;
  const key = keyOf(subscription, dueMs);
  const { team, channel } = subscription;
  const expiresAtMs = dueMs + parts.mostLateMs;
  const saying = { team, channel, urgent: false };
  if (post.oldPrices !== null) await noteOld(parts, due);
  const outcome = await parts.deliver({ ...saying, key, threadTs: null, expiresAtMs, post });
  if (outcome.kind === 'said') {
    await parts.deliver({
      ...saying,
      key: `${key}:detail`,
      threadTs: outcome.ts,
      expiresAtMs: null,
      post: { ...post, kind: 'detail' },
    });
    await finish(parts, key, await notePosted(parts, due, post, outcome.ts));
  } else {
    const verdict = outcome.kind === 'refused' ? refusedBecause(outcome.code) : null;
    if (verdict !== null && verdict.kind !== 'fine') await holdBack(parts, subscription, verdict, dueMs);
    await finish(parts, key, await noteLeftOut(parts, due));
  }
};

/** Posts a digest that is due, unless its prices are still waited for or another copy has it. */
const postDue = async (parts: RunParts, due: Due): Promise<void> => {
  const { subscription, body, calendar, dueMs, skipped } = due;
  const { team, channel, owner } = subscription;
  const verdict = await parts.placeState(team, channel, owner);
  if (verdict.kind !== 'fine') {
    await holdBack(parts, subscription, verdict, dueMs);
    if (verdict.kind === 'paused') await noteLeftOut(parts, due);
    return;
  }
  const prices = parts.prices();
  const nowMs = parts.clock.nowMs();
  const missing = !prices.ok || oldPricesOf(prices.value, body.tickers, dueMs, calendar) !== null;
  // without any prices it is tried until it is too late, and then said in the next one
  if (!prices.ok || (missing && nowMs < dueMs + parts.waitForPricesMs)) return;
  const key = keyOf(subscription, dueMs);
  const claimed = await parts.store.claim({ key, holder: parts.holder, nowMs, leaseMs });
  if (!claimed.ok) return parts.tell(`${subscription.id} could not be claimed: ${claimed.problem.message}`);
  if (!claimed.value) return;
  const memory = readDigestMemory(subscription.memory);
  const post = await parts.inTurn(() =>
    makeDigest(subscription, body, {
      prices: prices.value,
      calendar,
      chanceOfNonGreen: parts.chanceOfNonGreen,
      vars: memory.vars,
      skipped: bothSkipped(memory.skipped, skipped),
      dueMs,
      nowMs,
    }),
  );
  await say(parts, due, post);
};

/** Does what the hour asks of one digest: nothing yet, leave it out, or post it. */
export const runDigest = async (parts: RunParts, subscription: Subscription): Promise<void> => {
  const { schedule } = subscription;
  const body = readDigestBody(subscription);
  if (!body.ok || schedule === null)
    return parts.tell(body.ok ? `${subscription.id} has no schedule.` : body.problem.message);
  const calendar = parts.calendars().of(body.value.tickers);
  const decision = decideDue(
    schedule,
    subscription.settledUpToMs,
    parts.clock.nowMs(),
    calendar,
    parts.mostLateMs,
  );
  if (decision.kind === 'post')
    return postDue(parts, { ...decision, subscription, schedule, body: body.value, calendar });
  // a holiday that was named since has moved the instant that was planned
  await change(parts, subscription, (current) =>
    decision.kind === 'nothing'
      ? planned(current, calendar)
      : settledUpTo(current, decision.skipped.lastMs, decision.skipped, calendar),
  );
};
