import type { InstantMs } from '../../terms/clock.ts';
import type { OldPrices } from '../../terms/scheduledPosts.ts';
import type { Calendar, PricesNow } from '../ports.ts';

type Lagging = { readonly ticker: string; readonly lastDay: number; readonly expectedDay: number };

/** Tickers whose last close is older than the last session whose closes should be in. */
const laggingOf = (prices: PricesNow, tickers: readonly string[], atMs: InstantMs): readonly Lagging[] =>
  tickers.flatMap((ticker) => {
    const lastDay = prices.series(ticker)?.days.at(-1);
    if (lastDay === undefined) return [];
    const expectedDay = prices.expectedDay(ticker, atMs);
    return lastDay < expectedDay ? [{ ticker, lastDay, expectedDay }] : [];
  });

/** What is old among the prices of some tickers at an instant; null where all are there that should be. */
export const oldPricesOf = (
  prices: PricesNow,
  tickers: readonly string[],
  atMs: InstantMs,
  calendar: Calendar,
): OldPrices | null => {
  const lagging = laggingOf(prices, tickers, atMs);
  const [oldest] = [...lagging].sort((first, second) => first.lastDay - second.lastDay);
  if (oldest === undefined) return null;
  let sessionsBehind = 0;
  for (let day = oldest.lastDay + 1; day <= oldest.expectedDay; day += 1)
    if (calendar.isSession(day)) sessionsBehind += 1;
  return {
    lastDay: oldest.lastDay,
    expectedDay: oldest.expectedDay,
    sessionsBehind: Math.max(1, sessionsBehind),
    tickers: lagging.map(({ ticker }) => ticker),
  };
};
