import { type Level, levelText } from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { Side } from '../../terms/side.ts';

/** Ranks (from 1) of the lower and the upper end among the sorted replicates. */
export type EndRanks = { readonly lower: number; readonly upper: number };

/** The refusal for a level whose ends lie beyond the outermost resamples. */
export const refuseLevelBeyondResamples = (level: Level, replicates: number) =>
  refuse(
    problem(
      'levelOutside',
      `A bootstrap of ${replicates} resamples cannot reach ${levelText(level)}: fewer than one of them would lie beyond an end. Ask for a lower level.`,
    ),
  );

/**
 * Which order statistics bound an interval of the stated level?
 * Convention: k = (B + 1)·p and B + 1 − k, p the probability beyond one end (half of it each for two ends); where
 * (B + 1)·p is not whole, k is rounded down, which widens the interval. Counted in whole numbers.
 * Edges: refused where k would be 0.
 * Source: Efron & Tibshirani 1993, An Introduction to the Bootstrap, section 12.5 and 13.3.
 * Example: 9,999 resamples at 95%, both sides: ranks 250 and 9,750.
 */
export const endRanks = (level: Level, side: Side, replicates: number): Result<EndRanks> => {
  const scale = 10 ** level.places * (side === 'both' ? 2 : 1);
  const beyond = (replicates + 1) * (10 ** level.places - level.digits);
  const rank = (beyond - (beyond % scale)) / scale;
  if (rank < 1) return refuseLevelBeyondResamples(level, replicates);
  return succeed({ lower: rank, upper: replicates + 1 - rank });
};
