/** Both ends of an interval for a standard deviation; 0 ≤ lower ≤ upper. */
export type DeviationEnds = { readonly lower: number; readonly upper: number };
