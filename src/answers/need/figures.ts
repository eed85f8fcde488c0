export type NeedFigures = {
  /** The half-width wanted, per day, and the returns until the interval is that narrow. */
  readonly halfWidth: number;
  readonly halfWidthReturns: number;
  readonly halfWidthReturnsLower: number;
  readonly halfWidthReturnsUpper: number;
  /** The difference to be detected, per day, and the returns until it is found with the stated power. */
  readonly detect: number;
  readonly detectReturns: number;
  readonly detectReturnsLower: number;
  readonly detectReturnsUpper: number;
  readonly power: number;
  readonly confidenceLevel: number;
  readonly sampleStandardDeviation: number;
  /** Years of the returns until the difference is detected. */
  readonly yearsNeeded: number;
  readonly halfWidthYears: number;
  /** What the returns’ dependence multiplies all counts by; at least 1. */
  readonly dependenceFactor: number;
};
