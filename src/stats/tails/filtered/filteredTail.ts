import { type Result, succeed } from '../../../terms/result.ts';
import { refuseStill } from '../../returns/leastCounts.ts';
import type { GarchFit } from '../../volatility/garch.ts';
import { refuseTooFewForLevel } from '../historicalTail.ts';
import type { TailFigures, TailInput } from '../tailFigures.ts';
import { type FilterKind, filteredKinds } from './filteredKinds.ts';
import { describeFilter, type FilteredTailParameters, filterNotes } from './internal/filterDescription.ts';
import { filterSource } from './internal/filterSource.ts';
import { resampledFigures } from './internal/resampledFigures.ts';
import { stateFigures } from './internal/stateFigures.ts';

export type { FilteredTailParameters } from './internal/filterDescription.ts';

export type FilteredTailFigures = TailFigures<'filtered', FilteredTailParameters>;

export type FilterOptions = {
  /** Default: the first of {@link filteredKinds}. */
  readonly kind?: FilterKind;
  /** A GARCH fit to nearly the same returns, from which the search starts. */
  readonly near?: GarchFit;
};

/**
 * How large will the loss be that the next day exceeds with a small chance, given how volatile the market now is?
 * Convention: returns are divided by their own day's deviation (see filteredKinds for how it is followed), the historical
 * VaR and ES of the residuals' losses are taken, multiplied by the next day's deviation, and mu is taken off. Interval: residuals are
 * resampled, the path rebuilt from them and filtered anew (GARCH refitted, 199 times; the exponentially weighted mean
 * 999 times), and the next day's deviation taken from the true past under the refitted parameters; percentile ends.
 * Domain: finite returns that differ, at least ⌈1/(1−a)⌉; for GARCH the domain of fitGarch.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out, for the next day alone.
 * Edges: VaR has no upper end where so many residuals cannot bound their quantile, ES no interval with fewer than 10
 * residuals expected beyond the level; resamples that cannot be refitted are replaced, and said. The interval of the
 * exponentially weighted mean takes its weight as given, so it leaves out the error of the deviation itself.
 * Source: Barone-Adesi, Giannopoulos & Vosper 1999, Journal of Futures Markets 19, 583-602; interval: Christoffersen &
 * Gonçalves 2005, Journal of Risk 7, and Pascual, Romo & Ruiz 2006, Computational Statistics & Data Analysis 50, 2293-2312.
 * Example: after a day of twice the usual size both figures are larger than the historical ones.
 */
export const filteredTail = (input: TailInput, options: FilterOptions = {}): Result<FilteredTailFigures> => {
  const { returns, tailLevel } = input;
  const figure = 'A filtered tail figure';
  const refusal = refuseTooFewForLevel(returns.length, tailLevel, figure) ?? refuseStill(returns, figure);
  if (refusal !== null) return refusal;
  const found = filterSource(returns, options.kind ?? filteredKinds(returns.length)[0], options.near);
  if (!found.ok) return found;
  const source = found.value;
  const figures = stateFigures(source.state, tailLevel);
  const { varInterval, esInterval, notes } = resampledFigures(source, input);
  return succeed({
    model: 'filtered',
    target: 'nextDay',
    var: figures.var,
    varInterval,
    varIntervalMethod: varInterval === null ? null : 'residualBootstrap',
    varAttainedLevel: null,
    es: figures.es,
    esInterval,
    esIntervalMethod: esInterval === null ? null : 'residualBootstrap',
    parameters: describeFilter(source),
    notes: [...filterNotes(source), ...notes],
  });
};
