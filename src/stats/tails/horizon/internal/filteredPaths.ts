import { type Result, succeed } from '../../../../terms/result.ts';
import { nextIndex } from '../../../random/draws.ts';
import type { FilterKind } from '../../filtered/filteredKinds.ts';
import { type FilterState, filterSource } from '../../filtered/internal/filterSource.ts';
import type { HorizonModel, PathSource } from './pathSource.ts';

/** Residuals drawn with equal chances on a variance that each day's own return moves on. */
const filtered =
  ({ process, residuals, nextVariance }: FilterState): PathSource =>
  (random, into) => {
    const { mu, omega, alpha, beta } = process;
    let variance = nextVariance;
    for (let day = 0; day < into.length; day += 1) {
      const deviation = Math.sqrt(variance) * (residuals[nextIndex(random, residuals.length)] as number);
      into[day] = mu + deviation;
      variance = omega + alpha * deviation * deviation + beta * variance;
    }
  };

/** Days from the volatility reached; a parameter draw is the state after the path was rebuilt and refitted. */
export const filteredHorizon = (returns: Float64Array, kind: FilterKind): Result<HorizonModel> => {
  const found = filterSource(returns, kind);
  if (!found.ok) return found;
  const { state, resample } = found.value;
  return succeed({
    paths: filtered(state),
    drift: state.mu,
    lossHasMean: true,
    redraw: (random) => {
      const redrawn = resample(random);
      return redrawn === null ? null : filtered(redrawn);
    },
  });
};
