import {
  ceilingOfCount,
  expectedBeyond,
  halfTailFraction,
  type Level,
  leastCountBeyond,
  levelFraction,
  levelText,
} from '../../terms/level.ts';
import { problem } from '../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import { lossesAscending, meanBeyond } from '../losses/losses.ts';
import { orderStatistic } from '../numerics/quantile.ts';
import { refuseStill } from '../returns/leastCounts.ts';
import { historicalEsInterval } from './internal/historicalEsInterval.ts';
import { boundingRanks, countThatBoundsAbove, countThatBoundsBelow } from './internal/rankInterval.ts';
import type { Interval, TailFigures, TailInput, TailNote } from './tailFigures.ts';

export type HistoricalTailParameters = {
  /** Rank of VaR among the losses, ascending from 1. */
  readonly rank: number;
  readonly lowerRank: number | null;
  readonly upperRank: number | null;
};

export type HistoricalTailFigures = TailFigures<'historical', HistoricalTailParameters>;

/** The refusal for so few returns that none is expected beyond the level, or null. */
export const refuseTooFewForLevel = (count: number, level: Level, figure: string): Refusal | null => {
  const least = leastCountBeyond(level);
  if (count >= least) return null;
  return refuse(
    problem(
      'notEnoughTail',
      `${figure} at ${levelText(level)} needs at least ${least} returns, so that one is expected beyond it, and there ` +
        `${count === 1 ? 'is 1' : `are ${count}`}. Ask for a window of ${least} days or more, or for a lower level.`,
      { needs: least },
    ),
  );
};

const openEndNotes = (
  interval: Interval,
  count: number,
  { tailLevel, confidence }: TailInput,
): TailNote[] => {
  const notes: TailNote[] = [];
  const level = levelText(tailLevel);
  if (interval.upper === null) {
    const needs = countThatBoundsAbove(tailLevel, halfTailFraction(confidence));
    const text = `${count} returns cannot bound a ${level} figure from above; ${needs} would.`;
    notes.push({ figure: 'varInterval', code: 'upperEndUnbounded', text, needs });
  }
  if (interval.lower === null) {
    const needs = countThatBoundsBelow(tailLevel, halfTailFraction(confidence));
    const text = `${count} returns cannot bound a ${level} figure from below; ${needs} would.`;
    notes.push({ figure: 'varInterval', code: 'lowerEndUnbounded', text, needs });
  }
  return notes;
};

/**
 * How large was the loss that only one day in so many exceeded, and the mean loss beyond it?
 * Convention: losses ascending l(1..n), k = ⌈n·a⌉, VaR = l(k) (type 1 of Hyndman & Fan 1996);
 * ES = [Σ_{i>k} l(i) + (k − n·a)·l(k)]/(n(1−a)). VaR interval from ranks: the largest lower and the smallest upper rank
 * beyond each of which the binomial probability is at most (1−c)/2, with the level that this pair attains. ES interval:
 * percentile bootstrap, 9,999 resamples, where n(1−a) is at least 10.
 * Domain: finite returns that differ, at least ⌈1/(1−a)⌉.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out; the attained level in 0..1.
 * Edges: an end that no rank can bound is null, with the count of returns that would; returns are taken as independent.
 * Source: ES by Acerbi & Tasche 2002, Journal of Banking & Finance 26, 1487-1503; rank interval David & Nagaraja 2003,
 * Order Statistics, section 7.1; bootstrap Efron 1979.
 * Example: of 100 returns at 95%, VaR is the 95th loss from below and ES the mean of the five above it.
 */
export const historicalTail = (input: TailInput): Result<HistoricalTailFigures> => {
  const { returns, tailLevel, confidence } = input;
  const count = returns.length;
  const figure = 'A historical tail figure';
  const refusal = refuseTooFewForLevel(count, tailLevel, figure) ?? refuseStill(returns, figure);
  if (refusal !== null) return refusal;
  const losses = lossesAscending(returns);
  const rank = ceilingOfCount(count, tailLevel);
  const ranks = boundingRanks(count, levelFraction(tailLevel), halfTailFraction(confidence));
  const lossAt = (place: number | null) => (place === null ? null : orderStatistic(losses, place));
  const varInterval: Interval = { lower: lossAt(ranks.lower), upper: lossAt(ranks.upper) };
  const shortfall = historicalEsInterval(losses, input);
  return succeed({
    model: 'historical',
    target: 'unconditional',
    var: orderStatistic(losses, rank),
    varInterval,
    varIntervalMethod: 'orderStatistics',
    varAttainedLevel: ranks.attained,
    es: meanBeyond(losses, rank, expectedBeyond(count, tailLevel)),
    esInterval: shortfall.interval,
    esIntervalMethod: shortfall.interval === null ? null : 'percentileBootstrap',
    parameters: { rank, lowerRank: ranks.lower, upperRank: ranks.upper },
    notes: [...openEndNotes(varInterval, count, input), ...shortfall.notes],
  });
};
