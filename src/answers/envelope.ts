import type { ReadQuestion } from '../questions/question.ts';
import { type Day, isoFromDay } from '../terms/day.ts';
import type { PriceMeaning } from '../terms/prices.ts';
import type { ReturnType } from '../terms/returns.ts';
import { type Window, windowText } from '../terms/window.ts';
import { counted } from '../wording/words.ts';
import { type AnswerOf, methodVersion, type Warning } from './answer.ts';
import type { Identity } from './identity.ts';
import type { AnswerPolicy } from './policy.ts';
import type { ReturnSample } from './sample.ts';

/** The parts that each verb fills in by itself. */
export type OwnParts<Kind extends string, Verb extends string, Figures> = Pick<
  AnswerOf<Kind, Verb, Figures>,
  'kind' | 'verb' | 'figures' | 'warnings' | 'notes' | 'method' | 'sources' | 'working'
>;

/** Which returns an answer rests on. */
export type Span = {
  readonly subject: readonly string[];
  readonly from: Day;
  readonly to: Day;
  readonly returnCount: number;
  readonly droppedDates: number;
  readonly longestGapDays: number;
  readonly cutToHistory: boolean;
};

/** What the envelope of an answer is made from. */
export type Enclosing = {
  readonly read: ReadQuestion;
  readonly window: Window;
  readonly returnType: ReturnType;
  readonly span: Span;
  readonly meaning: Pick<PriceMeaning, 'currency' | 'quoteUnit' | 'priceAdjustment'>;
  /** What the feed says of these prices; it stands before every other warning. */
  readonly feedWarnings: readonly Warning[];
  readonly identity: Identity;
  readonly policy: AnswerPolicy;
};

/** A question about one ticker, with its returns found. */
export type Asked = Enclosing & { readonly sample: ReturnSample };

export const spanOf = (sample: ReturnSample): Span => ({
  subject: [sample.ticker],
  from: sample.from,
  to: sample.to,
  returnCount: sample.returns.length,
  droppedDates: 0,
  longestGapDays: sample.longestGapDays,
  cutToHistory: sample.cutToHistory,
});

const assumedWords = ({ assumed }: ReadQuestion, window: Window, span: Span): readonly string[] =>
  span.cutToHistory
    ? [
        ...assumed,
        `the whole history of ${counted(span.returnCount, 'return')}, as it is shorter than ${windowText(window)}`,
      ]
    : assumed;

/** What every verb says of its question and data, around the verb’s own parts. */
export const enclose = <Kind extends string, Verb extends string, Figures>(
  { read, window, returnType, span, meaning, feedWarnings, identity, policy }: Enclosing,
  own: OwnParts<Kind, Verb, Figures>,
): AnswerOf<Kind, Verb, Figures> => ({
  schemaVersion: 1,
  methodVersion,
  id: identity.id,
  kind: own.kind,
  verb: own.verb,
  question: read.canonical,
  assumed: assumedWords(read, window, span),
  subject: span.subject,
  asOf: isoFromDay(span.to),
  window: { asked: windowText(window), from: isoFromDay(span.from), to: isoFromDay(span.to) },
  returnCount: span.returnCount,
  returnType,
  droppedDates: span.droppedDates,
  longestGapDays: span.longestGapDays,
  currency: meaning.currency,
  quoteUnit: meaning.quoteUnit,
  priceAdjustment: meaning.priceAdjustment,
  periodsPerYear: policy.periodsPerYear,
  seed: identity.seed,
  dataFingerprint: identity.dataFingerprint,
  figures: own.figures,
  warnings: [...feedWarnings, ...own.warnings],
  notes: own.notes,
  method: own.method,
  sources: own.sources,
  working: own.working,
});
