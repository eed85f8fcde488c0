import type { ReadQuestion } from '../questions/question.ts';
import { isoFromDay } from '../terms/day.ts';
import type { PriceMeaning } from '../terms/prices.ts';
import type { ReturnType } from '../terms/returns.ts';
import { type Window, windowText } from '../terms/window.ts';
import { counted } from '../wording/words.ts';
import { type AnswerOf, methodVersion } from './answer.ts';
import type { Identity } from './identity.ts';
import type { AnswerPolicy } from './policy.ts';
import type { ReturnSample } from './sample.ts';

/** The parts that each verb fills in by itself. */
export type OwnParts<Kind extends string, Verb extends string, Figures> = Pick<
  AnswerOf<Kind, Verb, Figures>,
  'kind' | 'verb' | 'figures' | 'warnings' | 'notes' | 'method' | 'sources' | 'working'
>;

/** What the envelope of an answer about one ticker is made from. */
export type Asked = {
  readonly read: ReadQuestion;
  readonly window: Window;
  readonly returnType: ReturnType;
  readonly sample: ReturnSample;
  readonly meaning: PriceMeaning;
  readonly identity: Identity;
  readonly policy: AnswerPolicy;
};

const assumedWords = (
  { assumed }: ReadQuestion,
  window: Window,
  { cutToHistory, returns }: ReturnSample,
): readonly string[] =>
  cutToHistory
    ? [
        ...assumed,
        `the whole history of ${counted(returns.length, 'return')}, as it is shorter than ${windowText(window)}`,
      ]
    : assumed;

/** An answer about one ticker: what every verb says of its question and data, around the verb’s own parts. */
export const enclose = <Kind extends string, Verb extends string, Figures>(
  { read, window, returnType, sample, meaning, identity, policy }: Asked,
  own: OwnParts<Kind, Verb, Figures>,
): AnswerOf<Kind, Verb, Figures> => ({
  schemaVersion: 1,
  methodVersion,
  id: identity.id,
  kind: own.kind,
  verb: own.verb,
  question: read.canonical,
  assumed: assumedWords(read, window, sample),
  subject: [sample.ticker],
  asOf: isoFromDay(sample.to),
  window: { asked: windowText(window), from: isoFromDay(sample.from), to: isoFromDay(sample.to) },
  returnCount: sample.returns.length,
  returnType,
  droppedDates: 0,
  longestGapDays: sample.longestGapDays,
  currency: meaning.currency,
  quoteUnit: meaning.quoteUnit,
  priceAdjustment: meaning.priceAdjustment,
  periodsPerYear: policy.periodsPerYear,
  seed: identity.seed,
  dataFingerprint: identity.dataFingerprint,
  figures: own.figures,
  warnings: own.warnings,
  notes: own.notes,
  method: own.method,
  sources: own.sources,
  working: own.working,
});
