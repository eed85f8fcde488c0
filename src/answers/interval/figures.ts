/** One end of an interval is null where the question was one-sided. */
export type Bounds = { readonly lower: number | null; readonly upper: number | null };

export type MeanFigures = {
  readonly mean: number;
  readonly sampleStandardDeviation: number;
  readonly standardError: number;
  readonly degreesOfFreedom: number;
  readonly confidenceLevel: number;
  readonly side: 'both' | 'above' | 'below';
  readonly criticalT: number;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly normalLower: number | null;
  readonly normalUpper: number | null;
  readonly predictionLower: number | null;
  readonly predictionUpper: number | null;
  readonly annualMean: number;
  readonly annualLower: number | null;
  readonly annualUpper: number | null;
  readonly lag1Autocorrelation: number | null;
  readonly ljungBoxQ: number | null;
  readonly ljungBoxP: number | null;
  readonly ljungBoxLags: number | null;
  readonly robustQ: number | null;
  readonly robustQP: number | null;
  readonly neweyWestLower: number | null;
  readonly neweyWestUpper: number | null;
  readonly bootstrapMethod: 'studentised' | 'stationary' | null;
  readonly bootstrapLower: number | null;
  readonly bootstrapUpper: number | null;
  readonly skewness: number | null;
  readonly excessKurtosis: number | null;
  readonly ladder: readonly ({ readonly confidenceLevel: number } & Bounds)[];
  readonly widths: readonly { readonly returnCount: number; readonly halfWidth: number }[];
  readonly trust: 'plain' | 'neweyWest' | 'bootstrap';
  /** The question asked for annual figures first. */
  readonly annualLeads: boolean;
};

export type VolFigures = {
  readonly sampleStandardDeviation: number;
  readonly confidenceLevel: number;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly bonettLower: number | null;
  readonly bonettUpper: number | null;
  readonly blockLower: number | null;
  readonly blockUpper: number | null;
  readonly excessKurtosis: number | null;
  readonly annualDeviation: number;
  readonly annualDeviationLower: number | null;
  readonly annualDeviationUpper: number | null;
  readonly trust: 'chiSquare' | 'bonett' | 'block';
};

export type RatioFigures = {
  readonly ratio: number;
  readonly annualRatio: number;
  readonly confidenceLevel: number;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly annualLower: number | null;
  readonly annualUpper: number | null;
};
