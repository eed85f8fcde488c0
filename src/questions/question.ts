import type { Day } from '../terms/day.ts';
import type { Level } from '../terms/level.ts';
import type { Position } from '../terms/problem.ts';
import type { ReturnType } from '../terms/returns.ts';
import type { Side } from '../terms/side.ts';
import type { Schedule, ScheduleDays } from '../terms/subscriptions.ts';
import type { Window } from '../terms/window.ts';

/** A size as a decimal fraction per day or per year: 20bp is 0.002. */
export type Size = { readonly fraction: number; readonly per: 'day' | 'year' };

export const tailModels = ['historical', 'normal', 'student', 'filtered', 'peaks'] as const;
export type TailModel = (typeof tailModels)[number];

/** What a loss is reckoned on: an amount of money (currency null: the ticker's own) or a number of shares; negative is short. */
export type Exposure =
  | { readonly kind: 'money'; readonly amount: number; readonly currency: string | null }
  | { readonly kind: 'shares'; readonly shares: number };

/** What every statistical question has. `windowAsked` is false where the default window was taken. */
export type Sample = {
  readonly window: Window;
  readonly windowAsked: boolean;
  readonly returnType: ReturnType;
};

export type IntervalQuestion = Sample & {
  readonly verb: 'interval';
  readonly of: 'mean' | 'vol' | 'ratio';
  readonly ticker: string;
  readonly level: Level;
  readonly side: Side;
  /** The dependence-proof interval comes first. */
  readonly robust: boolean;
  /** Annual figures lead. */
  readonly annual: boolean;
};

export type ClaimQuestion = Sample & {
  readonly verb: 'claim';
  readonly of: 'mean' | 'ratio';
  readonly ticker: string;
  /** The claimed mean as a decimal fraction per day or year, or the claimed ratio of mean to standard deviation. */
  readonly claimed: Size;
  readonly level: Level;
  readonly side: Side;
  readonly robust: boolean;
};

export type NeedQuestion = Sample & {
  readonly verb: 'need';
  readonly ticker: string;
  /** Half-width wanted, and the difference to be detected: the same size serves for both. */
  readonly size: Size;
  readonly level: Level;
  /** The power as a level: 80% unless said. */
  readonly power: Level;
};

export type CompareQuestion = Sample & {
  readonly verb: 'compare';
  readonly level: Level;
} & (
    | { readonly between: 'tickers'; readonly tickers: readonly string[] }
    /** Returns before the day against returns from that day on, within the window (default: the whole history). */
    | { readonly between: 'periods'; readonly ticker: string; readonly splitDay: Day }
  );

export type TailQuestion = Sample & {
  readonly verb: 'tail';
  readonly ticker: string;
  readonly tailLevel: Level;
  /** Level of the tail figure's own interval. */
  readonly confidence: Level;
  readonly horizonDays: number;
  readonly exposure: Exposure | null;
  /** null: all five. */
  readonly model: TailModel | null;
  /** A daily loss whose rarity is asked, as a positive decimal fraction; null for VaR and ES. */
  readonly beyond: number | null;
};

export type ShapeQuestion = Sample & {
  readonly verb: 'shape';
  readonly ticker: string;
  readonly confidence: Level;
};

export type BacktestQuestion = {
  readonly verb: 'backtest';
  readonly ticker: string;
  readonly tailLevel: Level;
  /** Estimation window in returns (`on window 500d`; 250 unless said). */
  readonly estimationReturns: number;
  /** The days that are judged: the last 500 unless said. */
  readonly window: Window;
  readonly windowAsked: boolean;
  readonly returnType: ReturnType;
  readonly model: TailModel | null;
};

export type HelpQuestion = { readonly verb: 'help'; readonly topic: string | null };
export type FeedQuestion = { readonly verb: 'feed'; readonly ticker: string | null };

/** Recompute one answer on record, or say how two differ. */
export type AgainQuestion = {
  readonly verb: 'again';
  readonly ids: readonly [string] | readonly [string, string];
};

export type RecordsQuestion = {
  readonly verb: 'records';
  /** null: answers about any ticker. */
  readonly ticker: string | null;
  /** null: whenever they were asked. */
  readonly since: Day | null;
  /** Examine the records instead of listing them. */
  readonly verify: boolean;
};

/** What a digest says of each of its tickers: the tail figure of this model over this window. */
export type DigestFigure = {
  readonly window: Window;
  readonly tailLevel: Level;
  readonly model: TailModel;
};

/** What is to be another way in a digest; null and no tickers: as it was. */
export type DigestChange = {
  readonly tickers: readonly string[];
  readonly days: ScheduleDays | null;
  readonly minutes: number | null;
  readonly timeZone: string | null;
  readonly window: Window | null;
  readonly tailLevel: Level | null;
  readonly model: TailModel | null;
};

/** A scheduled post: made, listed, shown now, paused, resumed, changed, stopped. */
export type DigestQuestion = { readonly verb: 'digest' } & (
  | ({
      readonly do: 'add';
      readonly tickers: readonly string[];
      readonly schedule: Schedule;
    } & DigestFigure)
  | { readonly do: 'list' }
  | { readonly do: 'now' | 'pause' | 'resume' | 'stop'; readonly id: string }
  | { readonly do: 'change'; readonly id: string; readonly change: DigestChange }
);

/** The line that a watched figure crosses, as a positive decimal fraction. */
export type Crossing = { readonly side: 'above' | 'below'; readonly fraction: number };

/** A line that somebody wants to be told of: made, listed, paused, resumed, stopped. */
export type WatchQuestion = { readonly verb: 'watch' } & (
  | {
      readonly do: 'add';
      readonly watched: 'var' | 'es' | 'loss';
      /** null for a loss, which is held against the tail figure itself. */
      readonly crossing: Crossing | null;
      /** The tail question behind it, of one model. */
      readonly tail: TailQuestion;
    }
  | { readonly do: 'list' }
  | { readonly do: 'pause' | 'resume' | 'stop'; readonly id: string }
);

/** What is asked of digests and watches. */
export type SubscriptionQuestion = DigestQuestion | WatchQuestion;

/** One result put at the head of a discussion, or taken off; null: the last one in the thread that it is asked in. */
export type PinQuestion = { readonly verb: 'pin' | 'unpin'; readonly id: string | null };

/** What is asked of the records rather than of the prices. */
export type RecordQuestion = AgainQuestion | RecordsQuestion;

export type StatisticalQuestion =
  | IntervalQuestion
  | ClaimQuestion
  | NeedQuestion
  | CompareQuestion
  | TailQuestion
  | ShapeQuestion
  | BacktestQuestion;

export type Question =
  | StatisticalQuestion
  | RecordQuestion
  | SubscriptionQuestion
  | PinQuestion
  | HelpQuestion
  | FeedQuestion;

export type Verb = Question['verb'];

/** How the answer is wanted beside its words. */
export type Wish = 'picture' | 'json';

/**
 * A question that was read. `canonical` writes it out in full in one fixed form: the same question always has the same
 * canonical text, whatever the order and spelling it was typed in. `assumed` says in words what was not typed.
 */
export type ReadQuestion = {
  readonly question: Question;
  readonly canonical: string;
  readonly assumed: readonly string[];
  readonly wishes: readonly Wish[];
  /** Where in the text this question stood. */
  readonly position: Position;
};
