import type { Question, StatisticalQuestion } from '../../question.ts';
import { type Attempt, attained, type Fault, faulty } from '../faults/fault.ts';
import { findHead } from '../line/head.ts';
import { placePieces } from '../line/placePieces.ts';
import { assemble, readLine, recognitionFault, type WholeLine } from '../line/readLine.ts';
import { verbPlaces } from '../line/verbPlaces.ts';
import { allOf, firstOf, has, type Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { faultAtPiece, type VerbReader } from '../verbs/verbReader.ts';
import { scaledDecimal } from '../words/numbers.ts';
import { keptBeside, type Previous, shifted, takenApart, wordsOf } from './previous.ts';

const assumedFrom = (previous: Previous, kept: readonly Placed[]): string =>
  `${wordsOf(previous, kept)} (carried over)`;

/** With a verb that takes a size, a percentage that nothing marks may be either; neither is guessed. */
const sizeOrLevel = (line: Line, reader: VerbReader, said: readonly Placed[]): Fault | null => {
  const [unmarked] = allOf(said, 'percent');
  if (unmarked === undefined || !reader.takes.has('size') || has(said, 'size')) return null;
  const { decimal } = unmarked.piece;
  return faultAtPiece(line, unmarked, {
    code: 'ambiguous',
    says: 'can be the size or the level. Put at before a level; write a size in bp.',
    instead: [`at ${decimal}%`, `${scaledDecimal(decimal, 2)}bp`],
  });
};

/** What was said, settled as the verb of the question before has it. A ratio claimed before makes a bare number one. */
const settledWith = (
  { reader, pieces }: Previous,
  line: Line,
  said: readonly Placed[],
): Attempt<readonly Placed[]> => {
  const ofBefore: readonly Placed[] = has(said, 'of') ? [] : allOf(pieces, 'of');
  const settled = reader.settle(line, [...said, ...ofBefore]);
  return settled.ok ? attained(settled.value.filter((placed) => !ofBefore.includes(placed))) : settled;
};

/** A default window that is carried over is still one that nobody asked for: it may be cut to the history. */
const withWindowOf = ({ question: before }: Previous, question: Question): Question =>
  'windowAsked' in question ? { ...question, windowAsked: before.windowAsked } : question;

/** Words without a verb: they replace their like in the question before, and the rest of it stays. */
const withoutVerb = (line: Line, previous: Previous): Attempt<WholeLine> | null => {
  const { reader } = previous;
  const said = placePieces(line, { reader, verbAt: new Set(), assumed: [] });
  const fault =
    recognitionFault(line, reader, [...said, ...allOf(previous.pieces, 'ticker')]) ??
    sizeOrLevel(line, reader, said);
  const saysNothing = said.every(({ piece }) => piece.kind === 'unread' || piece.kind === 'filler');
  if (saysNothing && fault?.code !== 'unknownTicker') return null;
  if (fault !== null) return faulty(fault);
  const settled = settledWith(previous, line, said);
  if (!settled.ok) return settled;
  const kept = keptBeside(previous, settled.value);
  const merged = { ...line, words: [...line.words, ...previous.line.words] };
  const read = assemble(merged, reader, [...settled.value, ...shifted(kept, line.words.length)]);
  if (!read.ok) return read;
  const { questions, assumed } = read.value;
  return attained({
    questions: has(said, 'window') ? questions : questions.map((each) => withWindowOf(previous, each)),
    assumed: [...said.flatMap((each) => each.assumed ?? []), assumedFrom(previous, kept), ...assumed],
    wishes: allOf(said, 'wish').map(({ piece }) => piece.wish),
  });
};

/** A verb of its own that lacks the ticker, or the second one of a comparison: only tickers are carried over. */
const withTickers = (line: Line, previous: Previous): Attempt<WholeLine> | null => {
  const head = findHead(line);
  if (!head.ok) return null;
  const { reader, assumed: byHead } = head.value;
  const said = placePieces(line, head.value);
  const kept = allOf(previous.pieces, 'ticker');
  const fits = kept.length <= reader.tickers.most - allOf(said, 'ticker').length;
  if (!fits || recognitionFault(line, reader, said) !== null) return null;
  const merged = { ...line, words: [...line.words, ...previous.line.words] };
  const read = assemble(merged, reader, [...shifted(kept, line.words.length), ...said]);
  if (!read.ok) return read;
  return attained({
    questions: read.value.questions,
    assumed: [
      ...byHead,
      ...said.flatMap((each) => each.assumed ?? []),
      assumedFrom(previous, kept),
      ...read.value.assumed,
    ],
    wishes: allOf(said, 'wish').map(({ piece }) => piece.wish),
  });
};

const comparesOne = (line: Line): boolean => {
  const head = findHead(line);
  if (!head.ok || head.value.reader.verb !== 'compare') return false;
  const said = placePieces(line, head.value);
  return allOf(said, 'ticker').length === 1 && firstOf(said, 'splitDay') === null;
};

/** `vol` alone begins a question of its own, but after an interval it says what the interval is of. */
const saysVerb = (line: Line, { reader }: Previous): boolean =>
  verbPlaces(line).length > 0 || (reader.verb !== 'interval' && findHead(line).ok);

/**
 * A line that is no whole question, read as one about the question before it: what it does not say is carried over, and
 * `assumed` says what. Null where it has nothing to do with that question.
 */
export const readFollowUp = (line: Line, question: StatisticalQuestion): Attempt<WholeLine> | null => {
  const previous = takenApart(question, line.context);
  if (previous === null) return null;
  const alone = readLine(line);
  if (alone.ok) return null;
  if (!saysVerb(line, previous)) return withoutVerb(line, previous);
  const lacksTicker = alone.fault.code === 'noTicker' || comparesOne(line);
  return lacksTicker ? withTickers(line, previous) : null;
};
