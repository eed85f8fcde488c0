import { ceilingOfCount, expectedBeyond, type Level, levelFraction } from '../../../../terms/level.ts';
import { meanBeyond } from '../../../losses/losses.ts';
import { orderStatistic } from '../../../numerics/quantile.ts';

export type SimulatedFigures = { readonly var: number; readonly es: number };

/** The historical figures of simulated losses, ascending. */
export const simulatedFigures = (losses: Float64Array, tailLevel: Level): SimulatedFigures => {
  const rank = ceilingOfCount(losses.length, tailLevel);
  return {
    var: orderStatistic(losses, rank),
    es: meanBeyond(losses, rank, expectedBeyond(losses.length, tailLevel)),
  };
};

/**
 * Standard errors of both figures for independent paths. VaR: half the distance between the losses one binomial standard
 * deviation of ranks away on either side (David & Nagaraja 2003, section 7.1). ES: the variance of mean excesses over VaR,
 * [mean (l − VaR)² beyond it − (1−a)·(ES − VaR)²]/(n(1−a)).
 */
export const monteCarloErrors = (
  losses: Float64Array,
  tailLevel: Level,
  figures: SimulatedFigures,
): SimulatedFigures => {
  const count = losses.length;
  const rank = ceilingOfCount(count, tailLevel);
  const beyond = expectedBeyond(count, tailLevel);
  const ranks = Math.ceil(Math.sqrt(beyond * levelFraction(tailLevel)));
  const above = Math.min(count, rank + ranks);
  const below = Math.max(1, rank - ranks);
  let squares = 0;
  for (let index = rank; index < count; index += 1) squares += ((losses[index] as number) - figures.var) ** 2;
  const excess = figures.es - figures.var;
  return {
    var: (orderStatistic(losses, above) - orderStatistic(losses, below)) / 2,
    es: Math.sqrt((squares / beyond - (beyond / count) * excess * excess) / beyond),
  };
};
