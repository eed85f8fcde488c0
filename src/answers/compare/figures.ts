export type CompareFigures = {
  readonly kind: 'paired' | 'welch';
  /** Differences are first − second, ratios first / second. */
  readonly order: readonly [string, string];
  readonly firstMean: number;
  readonly secondMean: number;
  readonly difference: number;
  readonly lower: number;
  readonly upper: number;
  readonly t: number;
  readonly p: number;
  readonly degreesOfFreedom: number;
  readonly confidenceLevel: number;
  readonly spreadTest: 'brownForsythe' | 'pairedAbsoluteDeviation';
  readonly spreadStatistic: number | null;
  readonly spreadP: number | null;
  readonly firstDeviation: number;
  readonly secondDeviation: number;
  readonly deviationRatio: number | null;
  readonly ratioLower: number | null;
  readonly ratioUpper: number | null;
  readonly ratioMethod: 'bca' | 'stationary' | null;
  /** Whether the means, and the spreads, are told apart at the level, after adjusting for all pairs of the question. */
  readonly meansDiffer: boolean;
  readonly spreadsDiffer: boolean;
  /** Adjusted for all pairs of the question; null where there is only one. */
  readonly holmP: number | null;
  readonly holmSpreadP: number | null;
};
