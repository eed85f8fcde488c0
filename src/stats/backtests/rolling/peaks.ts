import { tailFraction } from '../../../terms/level.ts';
import { succeed } from '../../../terms/result.ts';
import { nextOpenDouble } from '../../random/draws.ts';
import { leastCounts, refuseTooFew } from '../../returns/leastCounts.ts';
import { quantileBeyond, shortfallBeyond } from '../../tails/peaks/internal/gpdTail.ts';
import { findPeaks, refuseLevelBelow } from '../../tails/peaks/internal/peaks.ts';
import { fitGpd } from '../../tails/peaks/peaksFit.ts';
import { estimationWindow, type StartForecaster } from './rollingForecaster.ts';

/** Day by day the figures of the tail fitted to the largest losses. */
export const startPeaks: StartForecaster = (span) => {
  const { firstDay, dayCount, estimationReturns, tailLevel } = span;
  const figure = 'A tail fitted to the largest losses';
  const tooFew = refuseTooFew(estimationReturns, leastCounts.peaks, figure);
  if (tooFew !== null) return tooFew;
  const tail = tailFraction(tailLevel);
  const thresholds = new Float64Array(dayCount);
  const shapes = new Float64Array(dayCount);
  const scales = new Float64Array(dayCount);
  const depths = new Float64Array(dayCount);
  return succeed({
    model: 'peaks',
    forecast: (day, into) => {
      const found = findPeaks(estimationWindow(span, day));
      if (!found.ok) return found.problem;
      const { threshold, excesses, count } = found.value;
      const tooLow = refuseLevelBelow(found.value, tailLevel);
      if (tooLow !== null) return tooLow.problem;
      const fit = fitGpd(excesses);
      if (!fit.ok) return fit.problem;
      const { shape, scale } = fit.value;
      const depth = Math.log(excesses.length / count / tail);
      into.valueAtRisk = threshold + scale * quantileBeyond(shape, depth);
      into.expectedShortfall = shape < 1 ? threshold + scale * shortfallBeyond(shape, depth) : null;
      const place = day - firstDay;
      thresholds[place] = threshold;
      shapes[place] = shape;
      scales[place] = scale;
      depths[place] = depth;
      return null;
    },
    // Beyond VaR the tail's chance is uniform below 1 − a, so its depth grows by a standard exponential number.
    drawBeyond: (day, random) => {
      const place = day - firstDay;
      const depth = (depths[place] as number) - Math.log(nextOpenDouble(random));
      return (
        (thresholds[place] as number) +
        (scales[place] as number) * quantileBeyond(shapes[place] as number, depth)
      );
    },
  });
};
