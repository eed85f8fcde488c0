import type { Day } from './day.ts';

/** How the closes of a ticker were adjusted for what happened to the share. `unknown` warns in every tail answer. */
export type PriceAdjustment = 'none' | 'splits' | 'splits+dividends' | 'unknown';

/** What is known of a ticker's prices beside the prices. */
export type PriceMeaning = {
  readonly priceAdjustment: PriceAdjustment;
  /** ISO 4217 code, or null where the desk has not said. */
  readonly currency: string | null;
  /** The unit in which closes are quoted where it is not the currency itself: `pence`, `cents`; null for the currency. */
  readonly quoteUnit: string | null;
  /** Local time and zone of the close, such as `17:30 Europe/London`; null where the desk has not said. */
  readonly closingTime: string | null;
  /** Tickers of one group share holidays; null where the desk has not said. */
  readonly calendar: string | null;
};

/** A flag on a ticker's prices that an answer must repeat: a code of the feed's own list and one sentence. */
export type PriceFlag = { readonly code: string; readonly text: string; readonly day: Day | null };

/** One ticker's closes, oldest first. `days` ascends strictly and both columns have the same length. Views, never copies. */
export type PriceSeries = {
  readonly ticker: string;
  readonly days: Int32Array;
  readonly closes: Float64Array;
  readonly meaning: PriceMeaning;
  readonly flags: readonly PriceFlag[];
};

/** One whole reading of the feed. A question that began on one snapshot ends on it. */
export type PriceSnapshot = {
  /** Hex SHA-256 of the values (tickers, days, closes), the same for every file format that holds them. */
  readonly fingerprint: string;
  readonly tickers: readonly string[];
  readonly lastDay: Day;
  /** null for a ticker that the feed does not have and for one that is quarantined. */
  readonly series: (ticker: string) => PriceSeries | null;
  /**
   * Tickers of the feed that are not in `tickers` because their prices contradict themselves, each with the reason as
   * one sentence. A question about one is refused with the code `quarantined` and that sentence.
   */
  readonly quarantined: ReadonlyMap<string, string>;
};
