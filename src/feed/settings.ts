import type { PriceMeaning } from '../terms/prices.ts';

/** What the feed must be told about the files it reads. Nothing of it is guessed from the files. */
export type FeedSettings = {
  /** Absolute path of the price file. */
  readonly path: string;
  /** Names of the columns in the first row of the file. */
  readonly columns: { readonly date: string; readonly ticker: string; readonly close: string };
  /** What the closes of every ticker are, unless `tickers` says otherwise. */
  readonly prices: PriceMeaning;
  readonly tickers: Readonly<
    Record<string, { readonly [Key in keyof PriceMeaning]?: PriceMeaning[Key] | undefined }>
  >;
};

/** What is known of one ticker's closes: its own settings over those for all. */
export const meaningOf = (
  settings: Pick<FeedSettings, 'prices' | 'tickers'>,
  ticker: string,
): PriceMeaning => {
  const own = Object.hasOwn(settings.tickers, ticker) ? settings.tickers[ticker] : undefined;
  const { prices } = settings;
  return {
    priceAdjustment: own?.priceAdjustment ?? prices.priceAdjustment,
    currency: own?.currency === undefined ? prices.currency : own.currency,
    quoteUnit: own?.quoteUnit === undefined ? prices.quoteUnit : own.quoteUnit,
    closingTime: own?.closingTime === undefined ? prices.closingTime : own.closingTime,
    calendar: own?.calendar === undefined ? prices.calendar : own.calendar,
  };
};
