export type ClaimFigures = {
  readonly of: 'mean' | 'ratio';
  /** Per day. */
  readonly estimate: number;
  /** Per day, whatever it was claimed for. */
  readonly claimed: number;
  readonly claimedPer: 'day' | 'year';
  readonly side: 'both' | 'above' | 'below';
  readonly t: number;
  readonly p: number;
  readonly degreesOfFreedom: number;
  readonly verdict: 'consistent' | 'contradicted' | 'cannot tell';
  readonly decidedBy: 'plain' | 'neweyWest';
  readonly detectableAt80: number;
  readonly returnsNeeded: number | null;
  readonly confidenceLevel: number;
  readonly lower: number | null;
  readonly upper: number | null;
};
