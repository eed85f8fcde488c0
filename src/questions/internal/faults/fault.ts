import type { ProblemCode } from '../../../terms/problem.ts';

/** Puts `text` in the place of `wordCount` words from `first` on; none: before that word. */
export type Edit = { readonly first: number; readonly wordCount: number; readonly text: string };

/** Edits that together may make a line readable. Whether they do is tried out before anything is suggested. */
export type Repair = readonly Edit[];

/** Why a line cannot be read, at which words, and what could be sent instead. */
export type Fault = {
  readonly code: ProblemCode;
  readonly message: string;
  readonly first: number;
  readonly wordCount: number;
  readonly repairs: readonly Repair[];
};

export type Attempt<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly fault: Fault };

export const attained = <T>(value: T): { readonly ok: true; readonly value: T } => ({ ok: true, value });

export const faulty = (fault: Fault): { readonly ok: false; readonly fault: Fault } => ({ ok: false, fault });

/** Repairs that write each of the texts in the place of the words; an empty text leaves them out. */
export const instead = (first: number, wordCount: number, texts: readonly string[]): readonly Repair[] =>
  texts.map((text) => [{ first, wordCount, text }]);
