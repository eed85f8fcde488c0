import { halfTailFraction, type Level } from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import type { RandomStreams } from '../../terms/random.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { normalCdf, normalQuantile } from '../distributions/normal.ts';
import { orderStatistic } from '../numerics/quantile.ts';
import { jackknifeAcceleration, wholeSamples } from './acceleration.ts';
import { independentDraw } from './draws.ts';
import { refuseLevelBeyondResamples } from './ranks.ts';
import { defaultReplicates, type ResampledStatistic, sortedReplicates } from './replicates.ts';

export type BcaQuestion = {
  /** The count of each sample that is drawn on its own; one number for paired samples. */
  readonly counts: readonly [number, ...number[]];
  /** Must take picks of any length, for each value is left out once; non-finite where it does not exist. */
  readonly statistic: ResampledStatistic;
  readonly level: Level;
  readonly streams: RandomStreams;
  readonly replicates?: number;
};

export type BcaInterval = {
  readonly estimate: number;
  readonly lower: number;
  readonly upper: number;
  /** z0: how far the median of the resamples lies from the estimate, in normal deviations. */
  readonly biasCorrection: number;
  readonly acceleration: number;
};

const unusable = () =>
  refuse(
    problem(
      'resamplesUnusable',
      'The resamples do not surround the estimate, so that no interval can be read from them: a few returns decide the whole figure. Ask for a longer window.',
    ),
  );

/** Share of the replicates below the estimate; a replicate equal to it counts half. */
const shareBelow = (replicates: Float64Array, estimate: number): number => {
  let below = 0;
  for (const value of replicates) below += value < estimate ? 1 : value === estimate ? 0.5 : 0;
  return below / replicates.length;
};

/** The lower-tail probability at which the sorted replicates are read; null beyond the pole of the correction. */
const adjusted = (normal: number, biasCorrection: number, acceleration: number): number | null => {
  const shifted = biasCorrection + normal;
  const stretch = 1 - acceleration * shifted;
  return stretch > 0 ? normalCdf(biasCorrection + shifted / stretch) : null;
};

/** ⌊(B + 1)·p⌋, where a product that is whole but for rounding stays whole. */
const rankBelow = (p: number, replicates: number): number => Math.floor((replicates + 1) * p + 1e-9);

/**
 * Between which ends does a ratio lie, allowing for the bias and the changing spread of its bootstrap distribution?
 * Convention: bias-corrected and accelerated percentile interval, two-sided, B = 9,999 resamples of independent values;
 * order statistics ⌊(B + 1)·p⌋ from below and, mirrored, from above; z0 from the share below the estimate with ties half.
 * Domain: a statistic of independent values; never of blocks. Samples are resampled each on its own, paired ones together.
 * Units: those of the statistic.
 * Edges: refused where an end lies beyond the outermost resample or where all resamples lie on one side of the estimate.
 * Source: Efron 1987, Journal of the American Statistical Association 82, 171-185; ranks as in Efron & Tibshirani 1993,
 * section 14.3.
 * Example: bcaInterval({ counts: [60], statistic: ([picks]) => logRatio(picks), level, streams }).
 */
export const bcaInterval = (question: BcaQuestion): Result<BcaInterval> => {
  const { counts, statistic, level, streams, replicates = defaultReplicates } = question;
  const whole = wholeSamples(counts);
  const estimate = statistic(whole);
  const acceleration = jackknifeAcceleration(whole, statistic);
  if (acceleration === null || !Number.isFinite(estimate)) return unusable();
  const [first, ...others] = counts;
  const draws = [independentDraw(first), ...others.map(independentDraw)] as const;
  const sorted = sortedReplicates({ draws, statistic, streams, replicates });
  const below = shareBelow(sorted, estimate);
  if (below === 0 || below === 1) return unusable();
  const biasCorrection = normalQuantile(below);
  const normal = normalQuantile(halfTailFraction(level));
  const fromBelow = adjusted(normal, biasCorrection, acceleration);
  const fromAbove = adjusted(normal, -biasCorrection, -acceleration);
  if (fromBelow === null || fromAbove === null) return unusable();
  const lowerRank = rankBelow(fromBelow, replicates);
  const upperRank = replicates + 1 - rankBelow(fromAbove, replicates);
  if (lowerRank < 1 || upperRank > replicates) return refuseLevelBeyondResamples(level, replicates);
  return succeed({
    estimate,
    lower: orderStatistic(sorted, lowerRank),
    upper: orderStatistic(sorted, upperRank),
    biasCorrection,
    acceleration,
  });
};
