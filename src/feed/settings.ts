import type { PriceMeaning } from '../terms/prices.ts';
import type { TextFormat } from '../terms/tableFormat.ts';

/** Names of the columns in the first row of the files; null for one that they do not have. */
export type PriceColumns = {
  readonly date: string;
  readonly ticker: string;
  readonly close: string;
  /** Where named, these are the prices that are served, and `close` is only checked against them. */
  readonly adjustedClose: string | null;
  readonly volume: string | null;
  readonly currency: string | null;
};

export type HolidaySettings = {
  readonly path: string | null;
  readonly columns: { readonly date: string; readonly calendar: string | null };
};

/** What the feed must be told about the files it reads. Nothing of it is guessed from the files. */
export type FeedSettings = {
  /** Absolute path of the price file, of a folder of price files, or a pattern with * for several. */
  readonly path: string;
  /** `long`: one row per date and ticker. `wide`: one row per date and one column per ticker. */
  readonly shape: 'long' | 'wide';
  readonly columns: PriceColumns;
  readonly format: TextFormat;
  readonly holidays: HolidaySettings;
  /** What the closes of every ticker are, unless `tickers` says otherwise. */
  readonly prices: PriceMeaning;
  readonly tickers: Readonly<
    Record<string, { readonly [Key in keyof PriceMeaning]?: PriceMeaning[Key] | undefined }>
  >;
};

/** What is known of one ticker's closes: its own settings, then the currency that its file names, then those for all. */
export const meaningOf = (
  settings: Pick<FeedSettings, 'prices' | 'tickers'>,
  ticker: string,
  currencyOfFile: string | null,
): PriceMeaning => {
  const own = Object.hasOwn(settings.tickers, ticker) ? settings.tickers[ticker] : undefined;
  const { prices } = settings;
  return {
    priceAdjustment: own?.priceAdjustment ?? prices.priceAdjustment,
    currency: own?.currency === undefined ? (currencyOfFile ?? prices.currency) : own.currency,
    quoteUnit: own?.quoteUnit === undefined ? prices.quoteUnit : own.quoteUnit,
    closingTime: own?.closingTime === undefined ? prices.closingTime : own.closingTime,
    calendar: own?.calendar === undefined ? prices.calendar : own.calendar,
  };
};
