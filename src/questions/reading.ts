import type { Problem } from '../terms/problem.ts';
import type { ReadQuestion } from './question.ts';

/** A refused line. `suggestions` are questions that would work, ready to send, the nearest first; `suggestion` is the first of them. */
export type ReadingProblem = Problem & { readonly suggestions: readonly string[] };

/** What became of one question; a `Result` whose refusals carry more than one suggestion. */
export type ReadOutcome =
  | { readonly ok: true; readonly value: ReadQuestion }
  | { readonly ok: false; readonly problem: ReadingProblem };

/**
 * What was read of one message: an outcome per question, in order. Empty where nothing was asked (no words, or only
 * filler words). `text` is the cleaned text, to which every position refers.
 */
export type Reading = { readonly text: string; readonly questions: readonly ReadOutcome[] };
