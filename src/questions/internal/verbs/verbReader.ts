import type { Question, Verb } from '../../question.ts';
import type { Attempt, Fault } from '../faults/fault.ts';
import type { PieceKind, Placed } from '../pieces/piece.ts';
import { type Complaint, faultAt, type Line, type Recogniser } from '../recognisers/recogniser.ts';

/** A line whose verb is known and whose pieces are placed. `tickers` are in the order in which they were written. */
export type VerbLine = Line & { readonly pieces: readonly Placed[]; readonly tickers: readonly string[] };

/** The questions of one line, alike but for the ticker, and what was taken for granted in words. */
export type ReadLine = { readonly questions: readonly Question[]; readonly assumed: readonly string[] };

/** The same question of each ticker of the line. */
export const ofEachTicker = (
  line: VerbLine,
  assumed: readonly string[],
  question: (ticker: string) => Question,
): ReadLine => ({ questions: line.tickers.map(question), assumed });

/** How one verb is read. A new verb of the language is one such reader, listed in the table. */
export type VerbReader = {
  readonly verb: Verb;
  /** The pieces that the verb has a use for; others refuse the line. */
  readonly takes: ReadonlySet<PieceKind>;
  readonly tickers: { readonly least: number; readonly most: number };
  /** Looks at every word before the language does, where the verb has words of its own. */
  readonly recognise?: Recogniser;
  /** Those words, where they stand in the place of the language's. */
  readonly ownWords?: readonly string[];
  /** Makes levels, sizes and ratios of the percentages and numbers that nothing marks. */
  readonly settle: (line: Line, pieces: readonly Placed[]) => Attempt<readonly Placed[]>;
  readonly read: (line: VerbLine) => Attempt<ReadLine>;
};

export const faultAtPiece = (line: Line, placed: Placed, complaint: Complaint): Fault =>
  faultAt(line, placed.first, placed.wordCount, complaint);

/** A fault about something that is not there: it is shown at the whole line. `added` are texts that would fill the gap. */
export const missing = (line: Line, message: string, added: readonly string[]): Fault => ({
  code: 'missingPart',
  message,
  first: 0,
  wordCount: line.words.length,
  repairs: added.map((text) => [{ first: line.words.length, wordCount: 0, text }]),
});
