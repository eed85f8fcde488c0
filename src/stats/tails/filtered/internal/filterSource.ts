import type { Random } from '../../../../terms/random.ts';
import { type Result, succeed } from '../../../../terms/result.ts';
import { independentDraw } from '../../../bootstrap/draws.ts';
import { ewmaProcess } from '../../../volatility/ewma.ts';
import { fitGarch, type GarchFit, processOf, startRefits } from '../../../volatility/garch.ts';
import {
  type FilteredReturns,
  filterByGarch,
  type GarchProcess,
  rebuildReturns,
} from '../../../volatility/garchPath.ts';
import type { FilterKind } from '../filteredKinds.ts';

/** Where the returns have left the process: residuals to draw from, and the variance of the next day. */
export type FilterState = { readonly process: GarchProcess } & FilteredReturns;

/** A filter run over the returns, and how to run it over resampled ones. */
export type FilterSource = {
  readonly kind: FilterKind;
  /** Null for the exponentially weighted mean, which is not fitted. */
  readonly fit: GarchFit | null;
  readonly state: FilterState;
  /** Resamples of which an interval is made. Each of GARCH is a fit of its own. */
  readonly replicates: number;
  /**
   * The state after the path was rebuilt from resampled residuals and filtered anew. The next day's variance is that of
   * the returns as they were, under the parameters of the resample: the past is known, the parameters are not.
   * Null where the refit failed. Its residuals stand in an array that the next resample writes anew.
   */
  readonly resample: (random: Random) => FilterState | null;
};

const ewmaReplicates = 999;
const garchReplicates = 199;

const stateOf = (returns: Float64Array, process: GarchProcess): FilterState => ({
  process,
  ...filterByGarch(returns, process),
});

const sourceOf = (
  kind: FilterKind,
  returns: Float64Array,
  fit: GarchFit | null,
  replicates: number,
  refit: (rebuilt: Float64Array) => GarchProcess | null,
): FilterSource => {
  const state = stateOf(returns, fit === null ? ewmaProcess : processOf(fit));
  const draw = independentDraw(returns.length);
  const picks = new Uint32Array(returns.length);
  const rebuilt = new Float64Array(returns.length);
  const refiltered = new Float64Array(returns.length);
  const resample = (random: Random): FilterState | null => {
    draw.fill(random, picks);
    rebuildReturns(returns, state.process, state.residuals, picks, rebuilt);
    const refitted = refit(rebuilt);
    if (refitted === null) return null;
    const { mu, residuals } = filterByGarch(rebuilt, refitted, refiltered);
    const { nextVariance } = refitted === state.process ? state : filterByGarch(returns, refitted);
    return { process: refitted, mu, residuals, nextVariance };
  };
  return { kind, fit, state, replicates, resample };
};

/** The filter of one kind. `near` is a GARCH fit to nearly the same returns. Refusals are those of the fit. */
export const filterSource = (
  returns: Float64Array,
  kind: FilterKind,
  near?: GarchFit,
): Result<FilterSource> => {
  if (kind === 'ewma') return succeed(sourceOf(kind, returns, null, ewmaReplicates, () => ewmaProcess));
  const fitted = fitGarch(returns, near === undefined ? {} : { near });
  if (!fitted.ok) return fitted;
  const fit = fitted.value;
  return succeed(sourceOf(kind, returns, fit, garchReplicates, startRefits(returns.length, fit)));
};
