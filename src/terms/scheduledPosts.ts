import type { InstantMs } from './clock.ts';
import type { Day } from './day.ts';

/** What is posted without anybody asking, as data: it says nothing of how it looks. */

/** Figures of one ticker. Losses and returns are decimal fractions; `change` is against the digest before. */
export type DigestFigures = {
  readonly ok: true;
  readonly ticker: string;
  readonly asOf: Day;
  readonly lastReturn: number;
  /** Whether the last loss was larger than the figure made from the returns before it; null where that figure is missing. */
  readonly exceeded: boolean | null;
  readonly var: number;
  readonly varLower: number | null;
  readonly varUpper: number | null;
  readonly es: number | null;
  readonly esLower: number | null;
  readonly esUpper: number | null;
  readonly change: number | null;
  /** `change` over half the width of the interval of VaR; null where either is missing. */
  readonly changeOverHalfWidth: number | null;
  /** Days judged, exceedances among them and the traffic-light zone; null where the history is too short. */
  readonly judged: {
    readonly days: number;
    readonly exceedances: number;
    readonly zone: 'green' | 'yellow' | 'red' | null;
  } | null;
  /** Why they were not judged. */
  readonly notJudged: string | null;
  /** Ids of the answers on record. */
  readonly tailId: string;
  readonly backtestId: string | null;
  /** What those answers warn of. */
  readonly warnings: readonly string[];
};

export type DigestRefusal = { readonly ok: false; readonly ticker: string; readonly message: string };

export type DigestLine = DigestFigures | DigestRefusal;

/** Prices that end before the last session whose closes should be in. */
export type OldPrices = {
  readonly lastDay: Day;
  readonly expectedDay: Day;
  readonly sessionsBehind: number;
  readonly tickers: readonly string[];
};

/** Due instants that passed without a post because the bot was not there in time. */
export type Skipped = { readonly count: number; readonly firstMs: InstantMs; readonly lastMs: InstantMs };

/** What chance alone would bring among the tickers that have figures, if every model were right. */
export type ByChance = { readonly exceedances: number; readonly nonGreenZones: number | null };

export type DigestPost = {
  readonly kind: 'digest';
  /** null where somebody asked for it now and nothing was due. */
  readonly dueMs: InstantMs | null;
  readonly id: string;
  readonly timeZone: string;
  readonly tailLevel: number;
  readonly confidenceLevel: number;
  readonly model: string;
  readonly window: string;
  readonly oldPrices: OldPrices | null;
  readonly skipped: Skipped | null;
  /** What the feed says of these tickers' prices. */
  readonly flags: readonly string[];
  /** The largest change first. */
  readonly lines: readonly DigestLine[];
  readonly byChance: ByChance;
};

/** What stands in the thread below a digest: each ticker with the ids of its answers and what they warn of. */
export type DigestDetail = Omit<DigestPost, 'kind'> & { readonly kind: 'detail' };

/** The one line that follows a digest on old prices once the new ones are in. */
export type FreshPost = Omit<DigestPost, 'kind'> & { readonly kind: 'fresh' };

export type WatchEvent = 'fired' | 'cleared' | 'cannotTell';

export type WatchPost = {
  readonly kind: 'watch';
  readonly id: string;
  readonly event: WatchEvent;
  readonly ticker: string;
  /** What is watched, as its canonical question. */
  readonly question: string;
  readonly tailLevel: number;
  readonly confidenceLevel: number;
  readonly model: string;
  /** null where it cannot be told. */
  readonly reading: WatchReading | null;
  /** Why it cannot be told. */
  readonly reason: string | null;
  /** Prices of days that had been looked at read otherwise now. */
  readonly restated: boolean;
};

/** What a watch sees on a day: a figure against its line, or a loss against the figure of the session before. */
export type WatchReading = {
  readonly of: 'var' | 'es' | 'loss';
  readonly day: Day;
  readonly value: number;
  /** Half the width of its interval around; null for a loss and where there is none. */
  readonly lower: number | null;
  readonly upper: number | null;
  readonly line: number;
  readonly side: 'above' | 'below';
  /** The day whose prices made the figure that a loss is compared with. */
  readonly lineDay: Day | null;
  readonly answerId: string;
};

/** Something about a subscription that its owner is told, once. */
export type OwnerNote = {
  readonly kind: 'note';
  readonly id: string;
  readonly subject: 'digest' | 'watch';
  readonly what: 'paused' | 'stopped';
  /** Where it posted. */
  readonly channel: string;
  /** Why, as a short code of the place: archived, notMember, shared, ... */
  readonly why: string;
};

export type ScheduledPost = DigestPost | DigestDetail | FreshPost | WatchPost | OwnerNote;
