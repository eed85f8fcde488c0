import { tailFraction } from '../../../terms/level.ts';
import { succeed } from '../../../terms/result.ts';
import { quantileMultiplier, shortfallMultiplier } from '../../losses/studentMultiplier.ts';
import { leastCounts, refuseTooFew } from '../../returns/leastCounts.ts';
import { fitStudent, type StudentParameters } from '../../tails/studentFit.ts';
import { estimationWindow, type StartForecaster } from './rollingForecaster.ts';
import { drawStudentBeyond } from './studentTail.ts';

/** Day by day the figures of the Student tail; each fit climbs from the day before's. */
export const startStudent: StartForecaster = (span) => {
  const { firstDay, dayCount, estimationReturns } = span;
  const tooFew = refuseTooFew(estimationReturns, leastCounts.studentTail, 'A Student fit');
  if (tooFew !== null) return tooFew;
  const tail = tailFraction(span.tailLevel);
  const locations = new Float64Array(dayCount);
  const scales = new Float64Array(dayCount);
  const nus = new Float64Array(dayCount);
  const quantiles = new Float64Array(dayCount);
  let yesterday: StudentParameters | undefined;
  return succeed({
    model: 'student',
    forecast: (day, into) => {
      const fit = fitStudent(estimationWindow(span, day), yesterday);
      yesterday = fit.ok ? fit.value : undefined;
      if (!fit.ok) return fit.problem;
      const { location, scale, nu } = fit.value;
      const quantile = quantileMultiplier(tail, nu);
      into.valueAtRisk = scale * quantile - location;
      into.expectedShortfall = nu > 1 ? scale * shortfallMultiplier(tail, nu) - location : null;
      const place = day - firstDay;
      locations[place] = location;
      scales[place] = scale;
      nus[place] = nu;
      quantiles[place] = quantile;
      return null;
    },
    drawBeyond: (day, random) => {
      const place = day - firstDay;
      const beyond = drawStudentBeyond(quantiles[place] as number, nus[place] as number, random);
      return (scales[place] as number) * beyond - (locations[place] as number);
    },
  });
};
