import { attained, faulty } from '../faults/fault.ts';
import { allOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { faultAtPiece, type VerbReader } from './verbReader.ts';

/** Puts one result at the head of a discussion, or takes it away: the one that an id names, else the last one there. */
const pinning = (verb: 'pin' | 'unpin'): VerbReader => ({
  verb,
  takes: new Set(['recordId']),
  tickers: { least: 0, most: 0 },
  settle: settleLevels,
  read: (line) => {
    const [first, second] = allOf(line.pieces, 'recordId');
    if (second !== undefined) {
      const says = `is a second id, and ${verb} takes one. Leave one out.`;
      return faulty(faultAtPiece(line, second, { code: 'notForVerb', says, instead: [''] }));
    }
    return attained({ questions: [{ verb, id: first?.piece.id ?? null }], assumed: [] });
  },
});

export const pin = pinning('pin');
export const unpin = pinning('unpin');
