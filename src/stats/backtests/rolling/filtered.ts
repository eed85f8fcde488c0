import { ceilingOfCount, expectedBeyond } from '../../../terms/level.ts';
import type { Problem } from '../../../terms/problem.ts';
import { type Result, succeed } from '../../../terms/result.ts';
import { meanBeyond, worstLossesLast } from '../../losses/losses.ts';
import { refuseStill } from '../../returns/leastCounts.ts';
import { filteredKinds } from '../../tails/filtered/filteredKinds.ts';
import { refuseTooFewForLevel } from '../../tails/historicalTail.ts';
import { filterByEwma } from '../../volatility/ewma.ts';
import { fitGarch, type GarchFit, processOf } from '../../volatility/garch.ts';
import { type FilteredReturns, filterByGarch } from '../../volatility/garchPath.ts';
import { createKeptTails } from './keptTails.ts';
import { estimationWindow, type StartForecaster } from './rollingForecaster.ts';

/** Days for which fitted GARCH parameters are used; the variance is updated every day all the same. */
export const daysBetweenRefits = 20;

const figure = 'A filtered tail figure';

type Filter = (window: Float64Array, day: number) => Result<FilteredReturns>;

/**
 * Refits on every twentieth day, and on every day after one on which no fit could be had. Each fit is the whole search: a
 * climb from the last fit alone is several times faster, but now and then stays on a lower summit (2 of 272 windows of four
 * share indices), and the figures of a day would then depend on where the walk began.
 */
const createGarchFilter = (): Filter => {
  let fit: GarchFit | null = null;
  let fittedOn = 0;
  return (window, day) => {
    if (fit === null || day - fittedOn >= daysBetweenRefits) {
      const refit = fitGarch(window);
      if (!refit.ok) return refit;
      fit = refit.value;
      fittedOn = day;
    }
    return succeed(filterByGarch(window, processOf(fit)));
  };
};

/** Day by day the figures of the filtered tail: EWMA below 500 returns in the window, GARCH from there up. */
export const startFiltered: StartForecaster = (span) => {
  const { firstDay, dayCount, estimationReturns, tailLevel } = span;
  const tooFew = refuseTooFewForLevel(estimationReturns, tailLevel, figure);
  if (tooFew !== null) return tooFew;
  const rank = ceilingOfCount(estimationReturns, tailLevel);
  const beyond = expectedBeyond(estimationReturns, tailLevel);
  const tails = createKeptTails(span);
  const deviations = new Float64Array(dayCount);
  const means = new Float64Array(dayCount);
  const filter: Filter =
    filteredKinds(estimationReturns)[0] === 'ewma'
      ? (window) => succeed(filterByEwma(window))
      : createGarchFilter();
  return succeed({
    model: 'filtered',
    forecast: (day, into): Problem | null => {
      const window = estimationWindow(span, day);
      const filtered = refuseStill(window, figure) ?? filter(window, day);
      if (!filtered.ok) return filtered.problem;
      const { mu, residuals, nextVariance } = filtered.value;
      const deviation = Math.sqrt(nextVariance);
      const losses = worstLossesLast(residuals, rank);
      into.valueAtRisk = deviation * (losses[rank - 1] as number) - mu;
      into.expectedShortfall = deviation * meanBeyond(losses, rank, beyond) - mu;
      tails.keep(day, losses);
      deviations[day - firstDay] = deviation;
      means[day - firstDay] = mu;
      return null;
    },
    drawBeyond: (day, random) =>
      (deviations[day - firstDay] as number) * tails.draw(day, random) - (means[day - firstDay] as number),
  });
};
