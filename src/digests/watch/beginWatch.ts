import { type Result, succeed } from '../../terms/result.ts';
import type { WatchReading } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import type { WatchBody } from '../body.ts';
import { freshWatchMemory, type WatchMemory } from '../memory.ts';
import type { PricesNow } from '../ports.ts';
import { figureOf, watchStep } from './checkWatch.ts';
import { pastOf } from './past.ts';

export type Begun = { readonly memory: WatchMemory; readonly reading: WatchReading };

/**
 * Where a watch stands when it is made: what it sees then sets nothing off. A figure that is beyond its line already
 * fires the next time that it crosses it.
 */
export const beginWatch = async (
  prices: PricesNow,
  body: WatchBody,
  by: Subscription,
): Promise<Result<Begun>> => {
  const figure = await figureOf(prices, body, by);
  if (!figure.ok) return figure;
  const { memory, reading } = watchStep(body, freshWatchMemory, prices, figure.value);
  const series = prices.series(body.tail.ticker);
  const past = series === null ? null : pastOf(series, figure.value.day);
  const { day, value, lower, upper, answerId } = figure.value;
  const lossToCome: WatchReading = {
    of: 'loss',
    day,
    value,
    lower,
    upper,
    line: value,
    side: 'above',
    lineDay: day,
    answerId,
  };
  return succeed({ memory: { ...memory, past }, reading: reading ?? lossToCome });
};
