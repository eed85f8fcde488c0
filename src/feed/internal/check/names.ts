import type { PriceMeaning } from '../../../terms/prices.ts';
import type { FeedSettings } from '../../settings.ts';
import type { Findings } from '../findings.ts';
import type { Collected, TickerExtras } from '../read/collected.ts';

/** Records a currency of the file that contradicts the one the settings give to that very ticker. */
export const checkCurrency = (extras: TickerExtras, settings: FeedSettings, findings: Findings): void => {
  const { ticker, currency } = extras;
  const stated: PriceMeaning['currency'] | undefined = Object.hasOwn(settings.tickers, ticker)
    ? settings.tickers[ticker]?.currency
    : undefined;
  if (typeof stated !== 'string' || currency === null || stated === currency) return;
  findings.record('currencyContradicted', {
    ticker,
    value: `${currency} in the file, ${stated} in the settings`,
  });
};

/** Tickers whose names are the same but for case, each with the other. */
export const twinsOf = (names: readonly string[]): ReadonlyMap<string, string> => {
  const firstOf = new Map<string, string>();
  const twins = new Map<string, string>();
  for (const name of names) {
    const folded = name.toUpperCase();
    const other = firstOf.get(folded);
    if (other === undefined) firstOf.set(folded, name);
    else twins.set(name, other).set(other, name);
  }
  return twins;
};

/** What is known of every ticker beside its prices, with what the optional columns said. */
export const extrasByTicker = (collected: Collected): ReadonlyMap<string, TickerExtras> =>
  new Map(
    collected.names.flatMap((name, number) => {
      const extras = collected.extrasOf(number);
      return extras === null ? [] : [[name, extras] as const];
    }),
  );
