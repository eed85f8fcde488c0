import type { Side } from '../../terms/side.ts';
import { studentTCdf, studentTTwoSidedTail, studentTUpperTail } from '../distributions/studentT.ts';

/** How likely is a t at least as far off on the side that is looked at, were the claimed mean the true one? */
export const tProbability = (t: number, degreesOfFreedom: number, side: Side): number => {
  if (side === 'both') return studentTTwoSidedTail(t, degreesOfFreedom);
  return side === 'above' ? studentTUpperTail(t, degreesOfFreedom) : studentTCdf(t, degreesOfFreedom);
};
