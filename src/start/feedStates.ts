import type { FeedState, TickerState } from '../present/compose/feed.ts';
import type { PriceSeries, PriceSnapshot } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';

const longestGap = (days: Int32Array): number => {
  let longest = 0;
  for (let row = 1; row < days.length; row += 1)
    longest = Math.max(longest, (days[row] as number) - (days[row - 1] as number));
  return longest;
};

const present = (snapshot: PriceSnapshot): readonly PriceSeries[] =>
  snapshot.tickers.map((ticker) => snapshot.series(ticker)).filter((series) => series !== null);

export const feedStateOf = (snapshot: PriceSnapshot): FeedState => {
  const all = present(snapshot);
  return {
    tickers: snapshot.tickers,
    priceCount: all.reduce((sum, { days }) => sum + days.length, 0),
    firstDay: all.reduce((first, { days }) => Math.min(first, days[0] ?? first), snapshot.lastDay),
    lastDay: snapshot.lastDay,
    fingerprint: snapshot.fingerprint,
    remarks: all.flatMap(({ ticker, flags }) => flags.map(({ text }) => `${ticker}: ${text}`)),
  };
};

export const tickerStateOf = (snapshot: PriceSnapshot, ticker: string): Result<TickerState> => {
  const series = snapshot.series(ticker);
  const last = series === null ? -1 : series.days.length - 1;
  const [firstDay, lastDay, lastClose] = [series?.days[0], series?.days[last], series?.closes[last]];
  if (series === null || firstDay === undefined || lastDay === undefined || lastClose === undefined)
    return refuse(
      problem('unknownTicker', `${ticker} is not in the feed. Ask feed for the tickers that are.`, {
        suggestion: 'feed',
      }),
    );
  return succeed({
    ticker,
    priceCount: series.days.length,
    firstDay,
    lastDay,
    lastClose,
    longestGapDays: longestGap(series.days),
    meaning: series.meaning,
    remarks: series.flags.map(({ text }) => text),
  });
};
