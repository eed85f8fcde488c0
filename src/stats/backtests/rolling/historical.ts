import { ceilingOfCount, expectedBeyond } from '../../../terms/level.ts';
import { succeed } from '../../../terms/result.ts';
import { meanBeyond } from '../../losses/losses.ts';
import { refuseStill } from '../../returns/leastCounts.ts';
import { refuseTooFewForLevel } from '../../tails/historicalTail.ts';
import { createKeptTails } from './keptTails.ts';
import { estimationWindow, type StartForecaster } from './rollingForecaster.ts';
import { createSortedLosses } from './sortedLosses.ts';

const figure = 'A historical tail figure';

/** Day by day the figures of historicalTail; the sorted window changes by one loss a day. */
export const startHistorical: StartForecaster = (span) => {
  const { returns, firstDay, estimationReturns, tailLevel } = span;
  const tooFew = refuseTooFewForLevel(estimationReturns, tailLevel, figure);
  if (tooFew !== null) return tooFew;
  const rank = ceilingOfCount(estimationReturns, tailLevel);
  const beyond = expectedBeyond(estimationReturns, tailLevel);
  const sorted = createSortedLosses(estimationWindow(span, firstDay));
  const tails = createKeptTails(span);
  return succeed({
    model: 'historical',
    forecast: (day, into) => {
      if (day > firstDay)
        sorted.replace(
          0 - (returns[day - 1 - estimationReturns] as number),
          0 - (returns[day - 1] as number),
        );
      const still = refuseStill(estimationWindow(span, day), figure);
      if (still !== null) return still.problem;
      into.valueAtRisk = sorted.values[rank - 1] as number;
      into.expectedShortfall = meanBeyond(sorted.values, rank, beyond);
      tails.keep(day, sorted.values);
      return null;
    },
    drawBeyond: tails.draw,
  });
};
