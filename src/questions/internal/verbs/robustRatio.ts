import type { Fault } from '../faults/fault.ts';
import { allOf, firstOf } from '../pieces/piece.ts';
import { faultAtPiece, type VerbLine } from './verbReader.ts';

/** A dependence-proof interval exists for means and deviations; asked for a ratio it would be ignored silently. */
export const robustRatio = (line: VerbLine): Fault | null => {
  const [robust] = allOf(line.pieces, 'robust');
  if (robust === undefined || firstOf(line.pieces, 'of')?.of !== 'ratio') return null;
  const says = 'does not go with ratio: there is no dependence-proof interval of a ratio. Leave it out.';
  return faultAtPiece(line, robust, { code: 'notForVerb', says, instead: [''] });
};
