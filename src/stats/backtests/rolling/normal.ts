import { tailFraction } from '../../../terms/level.ts';
import { succeed } from '../../../terms/result.ts';
import { quantileMultiplier, shortfallMultiplier } from '../../losses/studentMultiplier.ts';
import { summariseReturns } from '../../moments/summary.ts';
import { leastCounts, refuseTooFew } from '../../returns/leastCounts.ts';
import { estimationWindow, type StartForecaster } from './rollingForecaster.ts';
import { drawStudentBeyond } from './studentTail.ts';

const figure = 'A normal tail figure';

/**
 * Day by day the figures of the normal tail. Mean and deviation are taken anew each day: sums carried along would cost
 * digits, and a window's two passes cost next to nothing beside the other models' fits.
 */
export const startNormal: StartForecaster = (span) => {
  const { firstDay, dayCount, estimationReturns } = span;
  const tooFew = refuseTooFew(estimationReturns, leastCounts.normalTail, figure);
  if (tooFew !== null) return tooFew;
  const tail = tailFraction(span.tailLevel);
  const quantile = quantileMultiplier(tail, Infinity);
  const shortfall = shortfallMultiplier(tail, Infinity);
  const means = new Float64Array(dayCount);
  const deviations = new Float64Array(dayCount);
  return succeed({
    model: 'normal',
    forecast: (day, into) => {
      const summary = summariseReturns(estimationWindow(span, day), leastCounts.normalTail, figure);
      if (!summary.ok) return summary.problem;
      const { mean, sampleStandardDeviation } = summary.value;
      into.valueAtRisk = quantile * sampleStandardDeviation - mean;
      into.expectedShortfall = shortfall * sampleStandardDeviation - mean;
      means[day - firstDay] = mean;
      deviations[day - firstDay] = sampleStandardDeviation;
      return null;
    },
    drawBeyond: (day, random) =>
      (deviations[day - firstDay] as number) * drawStudentBeyond(quantile, Infinity, random) -
      (means[day - firstDay] as number),
  });
};
