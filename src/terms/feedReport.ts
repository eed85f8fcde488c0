import type { InstantMs } from './clock.ts';
import type { Day } from './day.ts';
import type { PriceFlag, PriceMeaning } from './prices.ts';
import type { Problem } from './problem.ts';

/** What a finding does: the ticker is not served, the ticker is served with a warning, or it is only told. */
export type FindingWeight = 'quarantined' | 'warned' | 'noted';

/**
 * Where a finding was seen. `row` counts the rows of the file from 1, that of the names included and blank lines not;
 * null where the finding is about sorted rows.
 */
export type FindingExample = {
  readonly file: string | null;
  readonly ticker: string | null;
  readonly day: Day | null;
  readonly row: number | null;
  readonly value: string | null;
};

/** One thing that the checks found, however often: a code of the feed's own list, how often, and the first few places. */
export type FeedFinding = {
  readonly code: string;
  readonly weight: FindingWeight;
  readonly text: string;
  readonly count: number;
  readonly examples: readonly FindingExample[];
};

export type TickerReport = {
  readonly ticker: string;
  readonly state: 'clean' | 'suspicious' | 'quarantined';
  /** Why it is not served, as one sentence; null where it is served. */
  readonly quarantine: string | null;
  readonly priceCount: number;
  /** null where no price of the ticker could be read. */
  readonly firstDay: Day | null;
  readonly lastDay: Day | null;
  /** Sessions between its first and last day on which it has no price. */
  readonly missingSessions: number;
  readonly longestGapDays: number;
  readonly flags: readonly PriceFlag[];
  readonly meaning: PriceMeaning;
};

export type FileReport = {
  readonly path: string;
  readonly kind: string;
  readonly bytes: number;
  readonly rowCount: number;
};

/** What one reading of the price files found. Plain data. */
export type FeedReport = {
  readonly files: readonly FileReport[];
  readonly fingerprint: string;
  readonly priceCount: number;
  readonly firstDay: Day;
  readonly lastDay: Day;
  readonly findings: readonly FeedFinding[];
  readonly tickers: readonly TickerReport[];
};

/** Prices of a ticker's past that a new file gives otherwise than the one before it. */
export type Restatement = {
  readonly ticker: string;
  /** First day that differs. */
  readonly from: Day;
  /** Days that differ, in either file. */
  readonly dayCount: number;
  /** `rescaled`: every price before some day was multiplied by one number, as a new adjustment does; `gone`: the ticker is no longer there. */
  readonly kind: 'changed' | 'rescaled' | 'gone';
};

/** How far the prices lag behind the sessions that are over. */
export type Freshness = {
  readonly lastDay: Day;
  /** The latest session whose prices should be in. */
  readonly expectedDay: Day;
  readonly sessionsBehind: number;
  /** Whether sessions were counted with the desk's holidays, or as every weekday for want of them. */
  readonly counted: 'weekdays without holidays' | 'weekdays';
};

/** The state of the live feed for people: what is served, since when, and what last went wrong. */
export type FeedStatus = {
  readonly report: FeedReport | null;
  readonly freshness: Freshness | null;
  /** When the served prices were swapped in. */
  readonly swappedAt: InstantMs | null;
  readonly restatements: readonly Restatement[];
  /** Why the newest file is not served; null where it is. */
  readonly problem: Problem | null;
  readonly problemAt: InstantMs | null;
};
