import type { Size } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, has } from '../pieces/piece.ts';
import { faultAtPiece, missing, type VerbLine } from './verbReader.ts';

/** Beyond these a size is a slip: a day that doubles the price, a year that multiplies it by eleven. */
const mostPer = { day: 1, year: 10 } as const;

/** The size of the line, per day or with `a year` per year, refused where no return has that size. */
export const checkedSize = (line: VerbLine): Attempt<Size> => {
  const [placed] = allOf(line.pieces, 'size');
  if (placed === undefined)
    return faulty(missing(line, 'A size is missing. Add one, such as 5bp or 0.2%.', ['5bp']));
  const per = has(line.pieces, 'annual') ? 'year' : 'day';
  const { fraction } = placed.piece;
  if (Math.abs(fraction) < mostPer[per]) return attained({ fraction, per });
  const says = `is too large. Give a size under ${mostPer[per] * 100}% a ${per}.`;
  return faulty(faultAtPiece(line, placed, { code: 'sizeOutside', says, instead: ['20bp'] }));
};
