import { attained, faulty } from '../faults/fault.ts';
import { allOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { faultAtPiece, missing, type VerbReader } from './verbReader.ts';

export const again: VerbReader = {
  verb: 'again',
  takes: new Set(['recordId']),
  tickers: { least: 0, most: 0 },
  settle: settleLevels,
  read: (line) => {
    const [first, second, third] = allOf(line.pieces, 'recordId');
    if (first === undefined)
      return faulty(
        missing(line, 'again needs the id of an answer. It stands below each, such as R-7Q2M9K4TXD.', []),
      );
    if (third !== undefined) {
      const says = 'is a third id, and two at most are compared. Leave one out.';
      return faulty(faultAtPiece(line, third, { code: 'notForVerb', says, instead: [''] }));
    }
    const { id } = first.piece;
    const ids = second === undefined ? ([id] as const) : ([id, second.piece.id] as const);
    return attained({ questions: [{ verb: 'again', ids }], assumed: [] });
  },
};
