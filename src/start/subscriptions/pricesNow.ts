import type { PricesNow } from '../../digests/ports.ts';
import { freshnessOf } from '../../feed/freshness.ts';
import type { OpenSnapshot } from '../../feed/openFeed.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Desk } from '../../workspaces/desk.ts';
import { askAndKeep, returnsAfter } from '../../workspaces/subscriptions/asking.ts';

type PricingDesk = Pick<Desk, 'compute' | 'policy' | 'records' | 'clock' | 'timeZone'>;

const pricesOf = (desk: PricingDesk, snapshot: OpenSnapshot): PricesNow => ({
  fingerprint: snapshot.fingerprint,
  series: snapshot.series,
  heldBack: (ticker) => snapshot.quarantined.get(ticker) ?? null,
  returnsAfter: (ticker, after, returnType) => {
    const series = snapshot.series(ticker);
    return series === null ? [] : returnsAfter(series, after, returnType);
  },
  expectedDay: (ticker, atMs) => {
    const series = snapshot.series(ticker);
    const { expectedDay } = freshnessOf({
      lastDay: series?.days.at(-1) ?? snapshot.lastDay,
      holidays: snapshot.holidays.get(series?.meaning.calendar ?? null) ?? null,
      closingTime: series?.meaning.closingTime ?? null,
      deskTimeZone: desk.timeZone,
      nowMs: atMs,
    });
    return expectedDay;
  },
  ask: askAndKeep(desk, snapshot),
});

/** The live prices as digests meet them; made once for each reading of the feed. */
export const pricesFrom = (
  desk: PricingDesk,
  snapshot: () => Result<OpenSnapshot>,
): (() => Result<PricesNow>) => {
  const made = new WeakMap<OpenSnapshot, PricesNow>();
  return () => {
    const live = snapshot();
    if (!live.ok) return live;
    const prices = made.get(live.value) ?? pricesOf(desk, live.value);
    made.set(live.value, prices);
    return succeed(prices);
  };
};
