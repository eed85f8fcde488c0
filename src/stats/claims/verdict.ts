import type { Ends } from '../mean/ends.ts';

export type Verdict = 'consistent' | 'contradicted' | 'cannot tell';

export type Judged = {
  readonly claimed: number;
  readonly estimate: number;
  /** Of the true figure; a one-sided interval has one end. */
  readonly ends: Ends;
  /** The half-width up to which an interval around zero bears out a claim of zero, in the unit of the claim. */
  readonly smallestThatMatters: number;
};

const isInside = (value: number, { lower, upper }: Ends): boolean =>
  (lower === null || value >= lower) && (upper === null || value <= upper);

/** Of two ends the farther one, where they lie unevenly. */
const halfWidth = (estimate: number, { lower, upper }: Ends): number =>
  Math.max(lower === null ? 0 : estimate - lower, upper === null ? 0 : upper - estimate);

/**
 * Does the data bear out what was claimed?
 *
 * Convention: contradicted when the claimed figure lies outside the interval. Cannot tell when both it and zero lie inside;
 * for a claim of zero, when the half-width exceeds the smallest figure that matters. Else consistent. Ends belong to the
 * interval; a one-sided half-width is the distance from the estimate to the one end.
 * Domain: an interval with at least one end.
 * Units: all in the unit of the claim.
 * Edges: "consistent" never means proven: the whole interval is consistent with the data.
 * Source: own rule on the interval of the test (a two-sided test rejects exactly what lies outside).
 * Example: claimed 20 bp, interval −21 to +34 bp: cannot tell; −21 to +19 bp: contradicted; +5 to +34 bp: consistent.
 */
export const verdictOn = ({ claimed, estimate, ends, smallestThatMatters }: Judged): Verdict => {
  if (!isInside(claimed, ends)) return 'contradicted';
  if (claimed === 0) return halfWidth(estimate, ends) > smallestThatMatters ? 'cannot tell' : 'consistent';
  return isInside(0, ends) ? 'cannot tell' : 'consistent';
};
