import type { CoverageProcess } from './cell.ts';

/** What was found in the returns at hand. */
export type FoundInReturns = {
  /** robustAutocorrelation has p < 0.05. */
  readonly dependent: boolean;
  /** volatilityClustering has p < 0.05. */
  readonly clustered: boolean;
  /** Excess kurtosis above 2·√(24/n), or Jarque-Bera below 0.05. */
  readonly fatTailed: boolean;
};

/** The simulated process that comes nearest to the returns at hand, whose measured coverage is therefore quoted. */
export const coverageProcessFor = ({ dependent, clustered, fatTailed }: FoundInReturns): CoverageProcess => {
  if (clustered) return 'garchT';
  if (dependent) return 'autoregressive';
  return fatTailed ? 'studentT4' : 'normal';
};
