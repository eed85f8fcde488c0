import type { Level } from '../../../../terms/level.ts';
import { type Result, succeed } from '../../../../terms/result.ts';
import { type GpdMaximum, maximiseGpd } from '../peaksFit.ts';
import { findPeaks, type Peaks, refuseLevelBelow } from './peaks.ts';

/** The fitted tail with the count beyond its threshold: the generalised Pareto likelihood times the binomial one. */
export type PeaksMaximum = {
  readonly peaks: Peaks;
  readonly gpd: GpdMaximum;
  readonly count: number;
  readonly beyond: number;
  /** Highest value of both log-likelihoods together, the Pareto part in units of the mean excess. */
  readonly value: number;
};

const binomialValue = (count: number, beyond: number): number =>
  beyond * Math.log(beyond / count) + (count - beyond) * Math.log1p(-beyond / count);

/** The fit to the largest losses, for levels beyond their threshold; a null level asks for none. */
export const maximisePeaks = (returns: Float64Array, tailLevel: Level | null): Result<PeaksMaximum> => {
  const found = findPeaks(returns);
  if (!found.ok) return found;
  const peaks = found.value;
  const refusal = tailLevel === null ? null : refuseLevelBelow(peaks, tailLevel);
  if (refusal !== null) return refusal;
  const gpd = maximiseGpd(peaks.excesses);
  if (!gpd.ok) return gpd;
  const { count } = peaks;
  const beyond = peaks.excesses.length;
  return succeed({
    peaks,
    gpd: gpd.value,
    count,
    beyond,
    value: gpd.value.value + binomialValue(count, beyond),
  });
};
