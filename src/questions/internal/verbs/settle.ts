import { levelFromPercent } from '../../../terms/level.ts';
import { type Attempt, attained, type Fault, faulty } from '../faults/fault.ts';
import { allOf, has, type Piece, type PieceOf, type Placed } from '../pieces/piece.ts';
import { levelOrWindow } from '../recognisers/bareNumbers.ts';
import { levelOutside } from '../recognisers/levels.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { scaledDecimal } from '../words/numbers.ts';
import { faultAtPiece, type VerbReader } from './verbReader.ts';

type Settle = VerbReader['settle'];
type PlacedPercent = Placed<PieceOf<'percent'>>;

const replacePiece = (pieces: readonly Placed[], old: Placed, piece: Piece): readonly Placed[] =>
  pieces.map((placed) => (placed === old ? { ...placed, piece } : placed));

/** A number without a unit is never guessed at: what it may have been short for is offered. */
const bareNumberFault = (
  line: Line,
  placed: Placed<PieceOf<'number'>>,
  readingsOf: (decimal: string) => readonly string[],
): Fault => {
  const readings = readingsOf(placed.piece.decimal);
  const ticker = line.context.vocabulary.canonicalTicker(line.words[placed.first]?.text ?? '');
  const says =
    readings.length === 0
      ? 'has no unit and no use here. Leave it out.'
      : `has no unit. Write what is meant: ${readings.join(' or ')}.`;
  const texts = ticker === null ? readings : [...readings, `\`${ticker}\``];
  return faultAtPiece(line, placed, { code: 'ambiguous', says, instead: texts.length === 0 ? [''] : texts });
};

const percentAsLevel = (
  line: Line,
  pieces: readonly Placed[],
  placed: PlacedPercent,
): Attempt<readonly Placed[]> => {
  const level = levelFromPercent(placed.piece.decimal);
  return level === null
    ? faulty(faultAtPiece(line, placed, levelOutside('at')))
    : attained(replacePiece(pieces, placed, { kind: 'level', level }));
};

/**
 * For verbs without a size: percentages are levels, and bare numbers nothing. `others` are texts that a bare number may
 * be short for with this verb alone.
 */
export const settleLevels = (
  line: Line,
  pieces: readonly Placed[],
  others: (decimal: string) => readonly string[] = () => [],
): ReturnType<Settle> => {
  const [number] = allOf(pieces, 'number');
  const { today } = line.context;
  if (number !== undefined)
    return faulty(
      bareNumberFault(line, number, (decimal) => [...others(decimal), ...levelOrWindow(decimal, today)]),
    );
  let settled = pieces;
  for (const placed of allOf(pieces, 'percent')) {
    const attempt = percentAsLevel(line, settled, placed);
    if (!attempt.ok) return attempt;
    settled = attempt.value;
  }
  return attained(settled);
};

const percentsAsSizes = (pieces: readonly Placed[]): readonly Placed[] =>
  pieces.map((placed) =>
    placed.piece.kind === 'percent'
      ? { ...placed, piece: { kind: 'size', fraction: scaledDecimal(placed.piece.decimal, -2) } }
      : placed,
  );

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

const sizes = (decimal: string): readonly string[] => [`${decimal}bp`, `${decimal}%`];

/**
 * For verbs with a size: a percentage is the level where the size is given otherwise, else the size. `others` are
 * texts that a bare number may be short for with this verb alone.
 */
export const settleSize = (
  line: Line,
  pieces: readonly Placed[],
  others: (decimal: string) => readonly string[] = () => [],
): ReturnType<Settle> => {
  const [number] = allOf(pieces, 'number');
  const { today } = line.context;
  const readingsOf = (decimal: string) => {
    const shared = levelOrWindow(decimal, today);
    return has(pieces, 'size') ? shared : [...sizes(decimal), ...others(decimal), ...shared];
  };
  if (number !== undefined) return faulty(bareNumberFault(line, number, readingsOf));
  const [first, second] = allOf(pieces, 'percent');
  if (first === undefined) return attained(pieces);
  if (has(pieces, 'size')) return settleLevels(line, pieces);
  if (second === undefined || has(pieces, 'level')) return attained(percentsAsSizes(pieces));
  return faulty(twoPercentages(line, first, second));
};
