import type { NumberOrInfinity } from '../tail/figures.ts';

export type ShapeFigures = {
  readonly skewness: number;
  readonly excessKurtosis: number;
  readonly jarqueBera: number;
  readonly jarqueBeraP: number;
  readonly jarqueBeraSimulatedP: number | null;
  readonly andersonDarlingNormal: number;
  readonly andersonDarlingNormalP: number;
  readonly andersonDarlingStudent: number | null;
  readonly andersonDarlingStudentP: number | null;
  readonly likelihoodRatio: number | null;
  readonly likelihoodRatioP: number | null;
  readonly nu: NumberOrInfinity | null;
  readonly nuLower: NumberOrInfinity | null;
  readonly nuUpper: NumberOrInfinity | null;
  readonly normalLimit: boolean | null;
  readonly confidenceLevel: number;
  /** How many times as often as the bell curve the fitted t crosses so many standard deviations downward. */
  readonly tailMultiples: readonly { readonly deviations: number; readonly multiple: number }[];
};
