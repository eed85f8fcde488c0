import { isoFromDay } from '../../terms/day.ts';
import { levelFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import type { WatchEvent, WatchReading } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import { readWatchBody, type WatchBody } from '../body.ts';
import { readWatchMemory, type WatchMemory } from '../memory.ts';
import type { PricesNow } from '../ports.ts';
import { oldPricesOf } from '../post/oldPrices.ts';
import { figureOf, watchStep } from '../watch/checkWatch.ts';
import { pastOf } from '../watch/past.ts';
import { change, finish } from './changing.ts';
import { leaseMs, type RunParts } from './parts.ts';
import { holdBack, refusedBecause, takenUp } from './places.ts';

/** Prices come in a while after each session; a watch calls them old when another session is over without them. */
const sessionsUntilOld = 2;

type Watching = {
  readonly parts: RunParts;
  readonly subscription: Subscription;
  readonly body: WatchBody;
  readonly memory: WatchMemory;
  readonly prices: PricesNow;
};

const remember = ({ parts, subscription }: Watching, memory: WatchMemory): Promise<Subscription | null> =>
  change(parts, subscription, (current) => ({ ...takenUp(current), memory: JSON.stringify(memory) }));

const namesOf = ({ tail: { ticker, tailLevel, confidence, model } }: WatchBody) => ({
  ticker,
  tailLevel: levelFraction(tailLevel),
  confidenceLevel: levelFraction(confidence),
  model: model ?? 'all models',
});

type Said = {
  readonly event: WatchEvent;
  readonly reading: WatchReading | null;
  readonly reason: string | null;
  readonly restated: boolean;
};

/** Whether it was said, now or before; false where the place does not take it, and the watch is held back then. */
const say = async ({ parts, subscription, body }: Watching, key: string, said: Said, at: number) => {
  const { team, id, channel, owner } = subscription;
  const verdict = await parts.placeState(team, channel, owner);
  if (verdict.kind !== 'fine') {
    await holdBack(parts, subscription, verdict, at);
    return false;
  }
  const question = subscription.questions[0] ?? '';
  const outcome = await parts.deliver({
    key,
    team,
    channel,
    threadTs: null,
    urgent: false,
    expiresAtMs: null,
    post: { kind: 'watch', id, question, ...namesOf(body), ...said },
  });
  if (outcome.kind !== 'refused') return true;
  const refusal = refusedBecause(outcome.code);
  if (refusal.kind !== 'fine') await holdBack(parts, subscription, refusal, at);
  return false;
};

/** That it cannot be told is said once, until a new session can be told again. */
const cannotTell = async (watching: Watching, reason: string): Promise<void> => {
  const { memory, subscription } = watching;
  if (memory.saidCannotTell) return;
  const at = memory.lastDay ?? 0;
  const key = `watch:${subscription.team}:${subscription.id}:${at}:cannotTell`;
  const { restated } = memory;
  const said = await say(watching, key, { event: 'cannotTell', reading: null, reason, restated }, at);
  if (said) await remember(watching, { ...memory, saidCannotTell: true, restated: false });
};

/** Why the prices tell nothing of the present; null where they do. */
const untellable = ({ parts, prices, body }: Watching, series: PriceSeries | null): string | null => {
  const { ticker } = body.tail;
  if (series === null) return prices.heldBack(ticker) ?? `${ticker} is not in the feed.`;
  const old = oldPricesOf(prices, [ticker], parts.clock.nowMs(), parts.calendars().of([ticker]));
  return old === null || old.sessionsBehind < sessionsUntilOld
    ? null
    : `The prices of ${ticker} end ${isoFromDay(old.lastDay)}, ${old.sessionsBehind} sessions old.`;
};

/** A new session: claimed, so that of several copies one looks at it. */
const lookAt = async (watching: Watching, series: PriceSeries, lastDay: number, restated: boolean) => {
  const { parts, subscription, body, memory, prices } = watching;
  const key = `watch:${subscription.team}:${subscription.id}:${lastDay}`;
  const nowMs = parts.clock.nowMs();
  const claimed = await parts.store.claim({ key, holder: parts.holder, nowMs, leaseMs });
  if (!claimed.ok || !claimed.value) return;
  const figure = await parts.inTurn(() => figureOf(prices, body, subscription));
  if (!figure.ok) {
    await cannotTell(watching, figure.problem.message);
    await parts.store.release(key, parts.holder);
    return;
  }
  const step = watchStep(body, memory, prices, figure.value);
  const { event, reading } = step;
  const said =
    event === null || (await say(watching, key, { event, reading, reason: null, restated }, lastDay));
  if (!said) {
    await parts.store.release(key, parts.holder);
    return;
  }
  const noted = await remember(watching, {
    ...step.memory,
    past: pastOf(series, lastDay),
    restated: event === null && restated,
  });
  await finish(parts, key, noted);
};

/** Looks at one watch: once for each new last day of its prices. A past that was restated sets nothing off. */
export const runWatch = async (
  parts: RunParts,
  prices: PricesNow,
  subscription: Subscription,
): Promise<void> => {
  const body = readWatchBody(subscription);
  if (!body.ok) return parts.tell(body.problem.message);
  if (subscription.state === 'paused') {
    const verdict = await parts.placeState(subscription.team, subscription.channel, subscription.owner);
    if (verdict.kind === 'paused') return;
  }
  const memory = readWatchMemory(subscription.memory);
  const watching: Watching = { parts, subscription, body: body.value, memory, prices };
  const series = prices.series(body.value.tail.ticker);
  const reason = untellable(watching, series);
  if (reason !== null) return cannotTell(watching, reason);
  const lastDay = series?.days.at(-1);
  if (series === null || lastDay === undefined) return;
  const past = memory.lastDay === null ? null : pastOf(series, memory.lastDay);
  const restatedNow = memory.past !== null && past !== memory.past;
  if (memory.lastDay === null || lastDay > memory.lastDay)
    return lookAt(watching, series, lastDay, memory.restated || restatedNow);
  if (restatedNow) await remember(watching, { ...memory, past, restated: true });
};
