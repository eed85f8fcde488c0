import { levelText } from '../../../terms/level.ts';
import type { Fault, Repair } from '../faults/fault.ts';
import type { PieceKind, Placed } from '../pieces/piece.ts';
import { faultAt, type Line } from '../recognisers/recogniser.ts';
import { faultAtPiece, type VerbReader } from '../verbs/verbReader.ts';
import { quotedTickers } from './quotedTickers.ts';

/** Pieces that every verb passes over. */
const anywhere: ReadonlySet<PieceKind> = new Set(['verb', 'filler']);

/** What a piece could be for a verb that does not take it so: a confidence is a level where no other is meant. */
const otherwise = ({ piece }: Placed, reader: VerbReader): readonly string[] =>
  piece.kind === 'confidence' && reader.takes.has('level') ? [`at ${levelText(piece.level)}`, ''] : [''];

const notForVerb = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null => {
  const placed = pieces.find(({ piece }) => !anywhere.has(piece.kind) && !reader.takes.has(piece.kind));
  if (placed === undefined) return null;
  const says = `does not go with ${reader.verb}. Leave it out; help ${reader.verb} says what goes.`;
  return faultAtPiece(line, placed, { code: 'notForVerb', says, instead: otherwise(placed, reader) });
};

/** Pieces with the same key say the same thing twice, or two things in one place; null where that is no matter. */
const keyOf = ({ piece }: Placed): string | null => {
  if (piece.kind === 'ticker') return `ticker ${piece.ticker}`;
  if (piece.kind === 'wish') return `wish ${piece.wish}`;
  if (piece.kind === 'recordId') return `record ${piece.id}`;
  return anywhere.has(piece.kind) ? null : piece.kind;
};

const firstRepeated = (pieces: readonly Placed[]): { first: Placed; second: Placed } | null => {
  const seen = new Map<string, Placed>();
  for (const second of pieces) {
    const key = keyOf(second);
    const first = key === null ? undefined : seen.get(key);
    if (first !== undefined) return { first, second };
    if (key !== null) seen.set(key, second);
  }
  return null;
};

const repeated = (line: Line, pieces: readonly Placed[]): Fault | null => {
  const twice = firstRepeated(pieces);
  if (twice === null) return null;
  const { first, second } = twice;
  const says = 'says again, or otherwise, what was said before it. Leave one of the two out.';
  const fault = faultAt(line, second.first, second.wordCount, { code: 'repeated', says, instead: [''] });
  const dropFirst: Repair = [{ first: first.first, wordCount: first.wordCount, text: '' }];
  return { ...fault, repairs: [...quotedTickers(line), ...fault.repairs, dropFirst] };
};

/** What stands in the line although the verb has no use for it, or stands there twice. */
export const checkPieces = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null =>
  notForVerb(line, reader, pieces) ?? repeated(line, pieces);
