import { expectedBeyond, type Level, levelFraction, tailFraction } from '../../terms/level.ts';
import { holmAdjusted } from '../comparisons/holm.ts';
import { arithmeticMean } from '../moments/mean.ts';
import { dieboldMariano } from './dieboldMariano.ts';
import { jointLoss, quantileLoss } from './losses.ts';
import { canJudgeShortfall, type JudgedDays } from './shortfall.ts';

/** One model's place among the others. `meanJointLoss` is null where an ES is 0 or less, or infinite; both losses: lower is better. */
export type Standing = {
  readonly meanQuantileLoss: number;
  readonly meanJointLoss: number | null;
  /** Against the model with the lowest joint loss, Holm-adjusted over the models; descriptive, for that model was picked. */
  readonly dieboldMarianoP: number | null;
};

const leastExpected = 10;

const jointLosses = (days: JudgedDays, tail: number): Float64Array | null =>
  canJudgeShortfall(days.expectedShortfalls)
    ? days.losses.map((loss, day) =>
        jointLoss(loss, days.valuesAtRisk[day] as number, days.expectedShortfalls[day] as number, tail),
      )
    : null;

const indexOfLowest = (means: readonly (number | null)[]): number | null =>
  means.reduce<number | null>((best, mean, index) => {
    if (mean === null) return best;
    const lowest = best === null ? null : (means[best] ?? null);
    return lowest === null || mean < lowest ? index : best;
  }, null);

/**
 * Which model forecast the tail best, and could the order be chance?
 *
 * Convention: means of the quantile loss and of the joint loss of VaR and ES over the same days; every model's joint losses
 * are tested against those of the model with the lowest mean, adjusted after Holm.
 * Domain: every model judged on the same days with the same losses, at least one day.
 * Units: decimal fractions in; losses and probabilities out.
 * Edges: no p for the best model, for losses identical to its own, for a model without a joint loss, and for all where
 * fewer than 10 exceedances are expected: too few days decide then.
 * Source: see quantileLoss, jointLoss, dieboldMariano and holmAdjusted.
 * Example: standings([normalDays, studentDays], level) has one null p and one number.
 */
export const standings = (models: readonly JudgedDays[], tailLevel: Level): Standing[] => {
  const tail = tailFraction(tailLevel);
  const level = levelFraction(tailLevel);
  const joint = models.map((days) => jointLosses(days, tail));
  const meanJoint = joint.map((losses) => (losses === null ? null : arithmeticMean(losses)));
  const best = indexOfLowest(meanJoint);
  const bestLosses = best === null ? null : (joint[best] ?? null);
  const dayCount = models[0]?.losses.length ?? 0;
  const testable = expectedBeyond(dayCount, tailLevel) >= leastExpected;
  // The best model's losses are identical to its own, which is no test.
  const pValues = joint.map((losses) =>
    testable && losses !== null && bestLosses !== null
      ? (dieboldMariano(losses, bestLosses)?.p ?? null)
      : null,
  );
  const adjusted = holmAdjusted(pValues);
  return models.map(({ losses, valuesAtRisk }, index) => ({
    meanQuantileLoss: arithmeticMean(
      losses.map((loss, day) => quantileLoss(loss, valuesAtRisk[day] as number, level)),
    ),
    meanJointLoss: meanJoint[index] ?? null,
    dieboldMarianoP: adjusted[index] ?? null,
  }));
};
