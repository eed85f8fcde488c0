import type { Piece, Placed } from '../pieces/piece.ts';
import type { Found, Line } from '../recognisers/recogniser.ts';
import { recogniseAt } from '../recognisers/table.ts';
import type { Head } from './head.ts';

const unread: Piece = { kind: 'unread' };
const verb: Piece = { kind: 'verb' };

const pieceAt = (line: Line, head: Head, at: number): Found => {
  if (head.verbAt.has(at)) return { piece: verb, wordCount: 1, assumed: null };
  return (
    head.reader.recognise?.(line, at) ??
    recogniseAt(line, at) ?? { piece: unread, wordCount: 1, assumed: null }
  );
};

/** Every word of the line belongs to exactly one piece; what no recogniser knows is unread. */
export const placePieces = (line: Line, head: Head): readonly Placed[] => {
  const placed: Placed[] = [];
  let at = 0;
  while (at < line.words.length) {
    const { piece, wordCount, assumed } = pieceAt(line, head, at);
    placed.push({ piece, first: at, wordCount, assumed });
    at += wordCount;
  }
  return placed;
};
