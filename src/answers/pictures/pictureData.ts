import type { TailModelName } from '../../stats/tails/tailFigures.ts';
import type { Day } from '../../terms/day.ts';
import type { PriceMeaning } from '../../terms/prices.ts';
import type { DigestLine } from '../../terms/scheduledPosts.ts';
import type {
  Answer,
  Answers,
  BacktestAnswer,
  NeedAnswer,
  ShapeAnswer,
  TailAnswer,
  TailBeyondAnswer,
} from '../answer.ts';

/** Answers whose figures alone make the picture. */
export type AnswerInFigures = Exclude<
  Answer,
  TailAnswer | TailBeyondAnswer | ShapeAnswer | BacktestAnswer | NeedAnswer
>;

export type NeedWidth = { readonly returnCount: number; readonly halfWidth: number };

/** How many returns lie from one edge to the next. */
export type HistogramBin = { readonly from: number; readonly to: number; readonly count: number };

/** How many returns each distribution would put into a bin around this place. */
export type CountCurvePoint = {
  readonly value: number;
  readonly normal: number;
  readonly student: number | null;
};

/** The share of days with at least this loss. */
export type LossShare = { readonly loss: number; readonly share: number };

export type LossCurvePoint = {
  readonly loss: number;
  readonly normal: number;
  readonly student: number | null;
};

/** A sample's returns as the holder of the position has them, beside the two fitted distributions. */
export type ReturnPicture = {
  readonly bins: readonly HistogramBin[];
  readonly counts: readonly CountCurvePoint[];
  /** The largest losses, the largest first, with the share of days that lost as much. */
  readonly losses: readonly LossShare[];
  /** The same shares by the fitted distributions, on a grid of losses. */
  readonly curve: readonly LossCurvePoint[];
};

/** One return against the quantile of a fitted distribution at its rank. */
export type QuantilePoint = {
  readonly observed: number;
  readonly normal: number;
  readonly student: number | null;
};

/** The lowest and the highest return of a few days beside each other, and the figure of the last of them. */
export type PathStep = {
  readonly day: Day;
  readonly low: number;
  readonly high: number;
  readonly valueAtRisk: number | null;
};

export type CountStep = {
  readonly day: Day;
  readonly count: number;
  readonly expected: number;
  readonly lower: number;
  readonly upper: number;
};

export type BacktestPath = {
  readonly model: TailModelName;
  readonly steps: readonly PathStep[];
  readonly exceedances: readonly { readonly day: Day; readonly value: number }[];
  readonly counts: readonly CountStep[];
  /** The level of the band, at each day alone. */
  readonly bandLevel: number;
};

/** A stretch of days, both ends included. */
export type Stretch = { readonly from: Day; readonly to: Day };

export type CoverageRow = {
  readonly ticker: string;
  readonly state: 'served' | 'heldBack';
  readonly covered: readonly Stretch[];
  readonly gaps: readonly Stretch[];
};

export type FeedPicture = {
  readonly kind: 'feed';
  readonly asOf: string;
  readonly fingerprint: string;
  readonly rows: readonly CoverageRow[];
  /** Tickers of the feed that have no row. */
  readonly more: number;
};

export type PricePoint = {
  readonly day: Day;
  readonly low: number;
  readonly high: number;
  readonly close: number;
};

export type TickerPicture = {
  readonly kind: 'ticker';
  readonly ticker: string;
  readonly asOf: string;
  readonly meaning: PriceMeaning;
  readonly priceCount: number;
  /** Runs of closes without a gap between them. */
  readonly runs: readonly (readonly PricePoint[])[];
  readonly gaps: readonly Stretch[];
};

export type DigestPicture = {
  readonly kind: 'digest';
  /** `D-12`. */
  readonly id: string;
  readonly asOf: string;
  readonly tailLevel: number;
  readonly confidenceLevel: number;
  readonly model: string;
  readonly rows: readonly {
    readonly line: DigestLine;
    /** The last returns, the oldest first; none where they are not at hand. */
    readonly returns: readonly number[];
  }[];
};

/** What a picture is drawn from: answers, and beside them what the picture shows that they do not hold. Plain data. */
export type PictureData =
  | { readonly kind: 'figures'; readonly answers: Answers; readonly answer: AnswerInFigures }
  | { readonly kind: 'tail'; readonly answer: TailAnswer; readonly returns: ReturnPicture }
  | { readonly kind: 'beyond'; readonly answer: TailBeyondAnswer; readonly returns: ReturnPicture }
  | { readonly kind: 'shape'; readonly answer: ShapeAnswer; readonly points: readonly QuantilePoint[] }
  | { readonly kind: 'need'; readonly answer: NeedAnswer; readonly widths: readonly NeedWidth[] }
  | { readonly kind: 'backtest'; readonly answer: BacktestAnswer; readonly path: BacktestPath }
  | FeedPicture
  | TickerPicture
  | DigestPicture;
