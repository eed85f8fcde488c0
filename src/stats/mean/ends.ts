import type { Side } from '../../terms/side.ts';

/** The ends of an interval; the end that a one-sided interval does not have is null. */
export type Ends = { readonly lower: number | null; readonly upper: number | null };

/** Keeps the ends that the side asks for: `above` has a lower end only, `below` an upper end only. */
export const endsOnSide = (lower: number, upper: number, side: Side): Ends => ({
  lower: side === 'below' ? null : lower,
  upper: side === 'above' ? null : upper,
});

/** centre ± halfWidth, on the side asked. */
export const endsAround = (centre: number, halfWidth: number, side: Side): Ends =>
  endsOnSide(centre - halfWidth, centre + halfWidth, side);
