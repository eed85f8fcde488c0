import { levelFromPercent } from '../../../terms/level.ts';
import { type Attempt, attained, type Fault, faulty } from '../faults/fault.ts';
import { allOf, has, type Piece, type PieceOf, type Placed } from '../pieces/piece.ts';
import { numberReadings } from '../recognisers/bareNumbers.ts';
import { levelOutside } from '../recognisers/levels.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { scaledDecimal } from '../words/numbers.ts';
import { faultAtPiece, type VerbReader } from './verbReader.ts';

type Settle = VerbReader['settle'];
type PlacedPercent = Placed<PieceOf<'percent'>>;

const replacePiece = (pieces: readonly Placed[], old: Placed, piece: Piece): readonly Placed[] =>
  pieces.map((placed) => (placed === old ? { ...placed, piece } : placed));

/** A number without a unit is never guessed at: each of its readings is offered. */
export const bareNumberFault = (line: Line, placed: Placed<PieceOf<'number'>>): Fault => {
  const { decimal } = placed.piece;
  const readings = numberReadings(decimal, line.context.today);
  const ticker = line.context.vocabulary.canonicalTicker(line.words[placed.first]?.text ?? '');
  return faultAtPiece(line, placed, {
    code: 'ambiguous',
    says: `has no unit. Write at 95% for a level, 95d for a window or 95bp for a size.`,
    instead: [...readings, ...(ticker === null ? [] : [`\`${ticker}\``]), ''],
  });
};

export const percentAsLevel = (
  line: Line,
  pieces: readonly Placed[],
  placed: PlacedPercent,
): Attempt<readonly Placed[]> => {
  const level = levelFromPercent(placed.piece.decimal);
  return level === null
    ? faulty(faultAtPiece(line, placed, levelOutside('at')))
    : attained(replacePiece(pieces, placed, { kind: 'level', level }));
};

/** For verbs without a size: percentages are levels, and bare numbers nothing. */
export const settleLevels: Settle = (line, pieces) => {
  const [number] = allOf(pieces, 'number');
  if (number !== undefined) return faulty(bareNumberFault(line, number));
  let settled = pieces;
  for (const placed of allOf(pieces, 'percent')) {
    const attempt = percentAsLevel(line, settled, placed);
    if (!attempt.ok) return attempt;
    settled = attempt.value;
  }
  return attained(settled);
};

const percentAsSize = (pieces: readonly Placed[], placed: PlacedPercent): readonly Placed[] =>
  replacePiece(pieces, placed, { kind: 'size', fraction: scaledDecimal(placed.piece.decimal, -2) });

/** Which of two percentages is the size is told by neither; both readings are offered. */
const twoPercentages = (line: Line, first: PlacedPercent, second: PlacedPercent): Fault => ({
  ...faultAtPiece(line, first, {
    code: 'ambiguous',
    says: 'can be the size or the level, since there are two percentages. Put at before the level.',
    instead: [],
  }),
  repairs: [second, first].map((placed) => [
    { first: placed.first, wordCount: placed.wordCount, text: `at ${placed.piece.decimal}%` },
  ]),
});

/** For verbs with a size: a percentage is the level where the size is given otherwise, else the size. */
export const settleSize: Settle = (line, pieces) => {
  const [number] = allOf(pieces, 'number');
  if (number !== undefined) return faulty(bareNumberFault(line, number));
  const [first, second] = allOf(pieces, 'percent');
  if (first === undefined) return attained(pieces);
  if (has(pieces, 'size')) return settleLevels(line, pieces);
  if (second === undefined || has(pieces, 'level')) return attained(percentAsSize(pieces, first));
  return faulty(twoPercentages(line, first, second));
};
