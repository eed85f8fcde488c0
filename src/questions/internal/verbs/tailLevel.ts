import { type Level, levelText } from '../../../terms/level.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf } from '../pieces/piece.ts';
import type { Taking } from './taking.ts';
import { faultAtPiece, type VerbLine } from './verbReader.ts';

const complementOf = ({ digits, places }: Level): Level => ({ digits: 10 ** places - digits, places });

/** The level of a tail figure. Under 50% it would be a gain, and its complement is what is meant as a rule. */
export const takeTailLevel = (taking: Taking, line: VerbLine, fallback: Level): Attempt<Level> => {
  const [placed] = allOf(line.pieces, 'level');
  const level = taking.orDefault(placed?.piece.level ?? null, fallback, levelText(fallback));
  if (placed === undefined || 2 * level.digits >= 10 ** level.places) return attained(level);
  const complement = levelText(complementOf(level));
  const says = `is under 50%, which is not a tail. Write ${complement} for the worst ${levelText(level)} of days.`;
  const instead = [`at ${complement}`, `beyond ${levelText(level)}`];
  return faulty(faultAtPiece(line, placed, { code: 'levelOutside', says, instead }));
};
