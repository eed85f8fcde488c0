import { canonicalText } from '../../canonicalText.ts';
import type { ReadContext } from '../../context.ts';
import type { StatisticalQuestion } from '../../question.ts';
import { findHead } from '../line/head.ts';
import { placePieces } from '../line/placePieces.ts';
import type { PieceKind, Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import { splitWords } from '../words/splitWords.ts';

/** The question before, taken apart again: its canonical line and the pieces of it, with what is left of them to carry. */
export type Previous = {
  readonly question: StatisticalQuestion;
  readonly line: Line;
  readonly reader: VerbReader;
  readonly pieces: readonly Placed[];
};

/** Null where the question cannot be read any more: its verb is switched off. */
export const takenApart = (question: StatisticalQuestion, context: ReadContext): Previous | null => {
  const line = { words: splitWords(canonicalText(question), 0, context.vocabulary), context };
  const head = findHead(line);
  if (!head.ok) return null;
  const { reader } = head.value;
  const settled = reader.settle(line, placePieces(line, head.value));
  return settled.ok ? { question, line, reader, pieces: settled.value } : null;
};

/** Kinds that have no place beside another: what is said anew takes the older one away. */
const instead: readonly (readonly [PieceKind, readonly PieceKind[]])[] = [
  ['beyond', ['level', 'horizon']],
  ['level', ['beyond']],
  ['horizon', ['beyond']],
  ['size', ['annual']],
  ['of', ['size', 'number']],
];

/** A ticker that the feed has no more is a word that nothing reads: it goes where another ticker comes. */
const tickerKinds: readonly PieceKind[] = ['ticker', 'unread'];

const replacedBy = (said: readonly Placed[]): ReadonlySet<PieceKind> => {
  const kinds = said.map(({ piece }) => piece.kind);
  const tickerCount = kinds.filter((kind) => kind === 'ticker').length;
  return new Set([
    ...kinds,
    ...instead.flatMap(([kind, replaced]) => (kinds.includes(kind) ? replaced : [])),
    ...(tickerCount > 0 ? tickerKinds : []),
    ...(tickerCount > 1 ? (['splitDay'] as const) : []),
  ]);
};

/** Neither is carried over: the verb because it is there whatever is said, filler because it says nothing. */
const carriedAnyway: readonly PieceKind[] = ['verb', 'filler'];

/** The pieces of the question before that what is said now leaves standing. */
export const keptBeside = ({ pieces }: Previous, said: readonly Placed[]): readonly Placed[] => {
  const replaced = replacedBy(said);
  return pieces.filter(({ piece }) => carriedAnyway.includes(piece.kind) || !replaced.has(piece.kind));
};

export const wordsOf = ({ line }: Previous, pieces: readonly Placed[]): string =>
  pieces
    .flatMap(({ first, wordCount }) => line.words.slice(first, first + wordCount))
    .map((word) => (word.quoted ? `\`${word.text}\`` : word.text))
    .join(' ');

/** The pieces as they stand once the words of the question before follow those that were said. */
export const shifted = (pieces: readonly Placed[], by: number): readonly Placed[] =>
  pieces.map((placed) => ({ ...placed, first: placed.first + by }));
