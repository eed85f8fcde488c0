import type { Level } from '../../terms/level.ts';
import type { Problem } from '../../terms/problem.ts';
import type { RandomStreams } from '../../terms/random.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { type DeviationRatio, deviationRatio } from './deviationRatio.ts';
import { holmAdjusted } from './holm.ts';
import { type MeanDifference, pairedMeanDifference, welchMeanDifference } from './meanDifference.ts';
import { brownForsytheTest, pairedSpreadTest, type SpreadTest } from './spread.ts';

export type CompareQuestion = {
  readonly first: ArrayLike<number>;
  readonly second: ArrayLike<number>;
  /** Two tickers on common dates are paired; two periods are not. */
  readonly paired: boolean;
  readonly level: Level;
  readonly streams: RandomStreams;
  readonly replicates?: number;
};

export type Comparison = {
  readonly kind: 'paired' | 'welch';
  readonly mean: MeanDifference;
  readonly spreadTest: 'brownForsythe' | 'pairedAbsoluteDeviation';
  /** null where the distances from the median do not vary, or there are fewer than 3. */
  readonly spread: SpreadTest | null;
  readonly ratio: DeviationRatio | null;
  /** Why there is no ratio. */
  readonly ratioProblem: Problem | null;
};

/**
 * Do two tickers, or two periods, differ in mean and in spread?
 *
 * Convention: first − second, first over second. Paired: paired t, paired t on the distances from the medians. Not paired:
 * Welch's t, Brown & Forsythe. The ratio of standard deviations as in deviationRatio.
 * Domain: at least 2 returns that move in each; refused otherwise. Below 10 there is no ratio.
 * Units: fractions per period; ratios without unit; p in 0..1.
 * Edges: a missing ratio or spread test does not take the rest away.
 * Source: see the parts.
 * Example: compare({ first: kelp, second: tarn, paired: true, level, streams }).
 */
export const compare = (question: CompareQuestion): Result<Comparison> => {
  const { first, second, paired, level } = question;
  const mean = paired
    ? pairedMeanDifference(first, second, level)
    : welchMeanDifference(first, second, level);
  if (!mean.ok) return mean;
  const ratio = deviationRatio(question);
  return succeed({
    kind: paired ? 'paired' : 'welch',
    mean: mean.value,
    spreadTest: paired ? 'pairedAbsoluteDeviation' : 'brownForsythe',
    spread: paired ? pairedSpreadTest(first, second) : brownForsytheTest([first, second]),
    ratio: ratio.ok ? ratio.value : null,
    ratioProblem: ratio.ok ? null : ratio.problem,
  });
};

/** p-values that hold although several comparisons are read at once; null where there was no test. */
export type AdjustedP = { readonly mean: number | null; readonly spread: number | null };

/** The p-values of several comparisons, those of the means and of the spreads each adjusted among themselves after Holm. */
export const adjustedForSeveral = (comparisons: readonly Comparison[]): AdjustedP[] => {
  const means = holmAdjusted(comparisons.map(({ mean }) => mean.p));
  const spreads = holmAdjusted(comparisons.map(({ spread }) => spread?.p ?? null));
  return comparisons.map((_, index) => ({ mean: means[index] ?? null, spread: spreads[index] ?? null }));
};
