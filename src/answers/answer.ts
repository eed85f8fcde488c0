import type { PriceAdjustment } from '../terms/prices.ts';
import type { ReturnType } from '../terms/returns.ts';
import type { BacktestFigures } from './backtest/figures.ts';
import type { ClaimFigures } from './claim/figures.ts';
import type { CompareFigures } from './compare/figures.ts';
import type { MeanFigures, RatioFigures, VolFigures } from './interval/figures.ts';
import type { NeedFigures } from './need/figures.ts';
import type { ShapeFigures } from './shape/figures.ts';
import type { BeyondFigures, TailFigures } from './tail/figures.ts';

/** Raised whenever a figure is computed differently than before, so that recorded answers can be told apart. */
export const methodVersion = '2';

/** `text` says what it means here and what to do. */
export type Warning = { readonly code: string; readonly text: string };

/** Why a figure is null, or what a reader of the data must know of it. */
export type Note = { readonly figure: string; readonly code: string; readonly text: string };

/** One step of the working: the formula with this sample's numbers in it. */
export type WorkingStep = { readonly step: string; readonly text: string };

/**
 * An answer as data, the same for chat, terminal, records and JSON. Returns and figures are decimal fractions, days are
 * ISO 8601 dates; every key is always present and null means not computed, with the reason in `notes`.
 */
export type AnswerOf<Kind extends string, Verb extends string, Figures> = {
  readonly schemaVersion: 1;
  readonly methodVersion: string;
  readonly id: string;
  /** Tells apart answers of one verb whose figures differ. */
  readonly kind: Kind;
  readonly verb: Verb;
  /** The question in its one fixed form. */
  readonly question: string;
  /** What was not typed but taken, in words. */
  readonly assumed: readonly string[];
  readonly subject: readonly string[];
  /** The last day of the data that the answer rests on. */
  readonly asOf: string;
  readonly window: { readonly asked: string; readonly from: string; readonly to: string };
  readonly returnCount: number;
  readonly returnType: ReturnType;
  /** Dates left out because not every ticker of the question has a price on them. */
  readonly droppedDates: number;
  /** The longest stretch between two consecutive prices used, in calendar days. */
  readonly longestGapDays: number;
  readonly currency: string | null;
  readonly quoteUnit: string | null;
  readonly priceAdjustment: PriceAdjustment;
  readonly periodsPerYear: number;
  /** Hex SHA-256 of the canonical question and the data fingerprint: every random draw follows from it. */
  readonly seed: string;
  readonly dataFingerprint: string;
  readonly figures: Figures;
  readonly warnings: readonly Warning[];
  readonly notes: readonly Note[];
  readonly method: string;
  readonly sources: readonly string[];
  readonly working: readonly WorkingStep[];
};

export type MeanAnswer = AnswerOf<'interval mean', 'interval', MeanFigures>;
export type VolAnswer = AnswerOf<'interval vol', 'interval', VolFigures>;
export type RatioAnswer = AnswerOf<'interval ratio', 'interval', RatioFigures>;
export type ClaimAnswer = AnswerOf<'claim', 'claim', ClaimFigures>;
export type NeedAnswer = AnswerOf<'need', 'need', NeedFigures>;
export type CompareAnswer = AnswerOf<'compare', 'compare', CompareFigures>;

export type TailAnswer = AnswerOf<'tail', 'tail', TailFigures>;
export type TailBeyondAnswer = AnswerOf<'tail beyond', 'tail', BeyondFigures>;
export type ShapeAnswer = AnswerOf<'shape', 'shape', ShapeFigures>;
export type BacktestAnswer = AnswerOf<'backtest', 'backtest', BacktestFigures>;

export type Answer =
  | MeanAnswer
  | VolAnswer
  | RatioAnswer
  | ClaimAnswer
  | NeedAnswer
  | CompareAnswer
  | TailAnswer
  | TailBeyondAnswer
  | ShapeAnswer
  | BacktestAnswer;

/** What one question is answered with: one answer, or one for each pair where several tickers are compared. */
export type Answers = readonly [Answer, ...Answer[]];
