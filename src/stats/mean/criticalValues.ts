import { halfTailFraction, type Level, tailFraction } from '../../terms/level.ts';
import type { Side } from '../../terms/side.ts';
import { normalQuantile } from '../distributions/normal.ts';
import { studentTQuantile } from '../distributions/studentT.ts';

/** The probability that lies beyond each end: all of 1 − level for one end, half of it for two. */
const beyondEachEnd = (level: Level, side: Side): number =>
  side === 'both' ? halfTailFraction(level) : tailFraction(level);

/** How many standard errors an end lies away, by Student's distribution. Below 50% a one-sided value is negative. */
export const criticalT = (level: Level, side: Side, degreesOfFreedom: number): number =>
  -studentTQuantile(beyondEachEnd(level, side), degreesOfFreedom);

/** The same by the normal distribution, as if the standard deviation were known. */
export const criticalNormal = (level: Level, side: Side): number =>
  -normalQuantile(beyondEachEnd(level, side));
