import { independentDraw } from '../../../bootstrap/draws.ts';
import { arithmeticMean } from '../../../moments/mean.ts';
import { nextIndex } from '../../../random/draws.ts';
import type { HorizonModel, PathSource } from './pathSource.ts';

const resampled =
  (returns: Float64Array): PathSource =>
  (random, into) => {
    for (let day = 0; day < into.length; day += 1)
      into[day] = returns[nextIndex(random, returns.length)] as number;
  };

/** Days drawn from the returns with equal chances; a parameter draw is a resample of the returns. */
export const historicalHorizon = (returns: Float64Array): HorizonModel => {
  const draw = independentDraw(returns.length);
  const picks = new Uint32Array(returns.length);
  return {
    paths: resampled(returns),
    drift: arithmeticMean(returns),
    lossHasMean: true,
    redraw: (random) => {
      draw.fill(random, picks);
      return resampled(Float64Array.from(picks, (pick) => returns[pick] as number));
    },
  };
};
