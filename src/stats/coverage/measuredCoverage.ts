import { type Level, levelFraction } from '../../terms/level.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import type { CoverageProcess, CoveredInterval } from './cell.ts';
import { coverageTable } from './table.ts';

export type CoverageQuestion = {
  readonly interval: CoveredInterval;
  readonly process: CoverageProcess;
  /** Returns in the window at hand. */
  readonly count: number;
  readonly level: Level;
};

export type MeasuredCoverage = {
  /** Share of the simulated intervals that held the truth, 0..1. */
  readonly coverage: number;
  /** The count of returns at which it was measured, the nearest to the one asked. */
  readonly count: number;
  readonly replications: number;
  /** More than three points off the level: the reply must say the share. */
  readonly misses: boolean;
};

const worthSaying = 0.03;

/** Below 500 returns the filter is an exponentially weighted mean, from there up GARCH: two intervals under one name. */
const sameProcedure = (interval: CoveredInterval, first: number, second: number): boolean =>
  !interval.includes('.filtered.') || first < leastCounts.garch === second < leastCounts.garch;

const distance = (first: number, second: number): number => Math.abs(Math.log(first / second));

/**
 * How often did an interval of this kind hold the truth in simulations?
 * Convention: the cell of this interval, process and level whose count of returns is nearest, on the scale of ratios, among
 * counts at which the interval is made the same way.
 * Domain: at least 1 return; null where nothing was measured for the interval, the process or the level.
 * Units: shares in 0..1.
 * Edges: `misses` compares with the level and 0.03; a share of 4,000 samples has a standard error of 0.0034 at 0.95.
 * Source: own simulations, made by `npm run coverage-table`.
 * Example: measuredCoverage({ interval: 'mean.plain', process: 'normal', count: 60, level }).coverage is near 0.95.
 */
export const measuredCoverage = (question: CoverageQuestion): MeasuredCoverage | null => {
  const { interval, process, count, level } = question;
  const asked = levelFraction(level);
  let nearest: MeasuredCoverage | null = null;
  for (const [name, made, at, text, coverage, replications] of coverageTable) {
    if (name !== interval || made !== process || Number(text) !== asked) continue;
    if (!sameProcedure(name, at, count)) continue;
    if (nearest !== null && distance(at, count) >= distance(nearest.count, count)) continue;
    nearest = { coverage, count: at, replications, misses: Math.abs(coverage - asked) > worthSaying };
  }
  return nearest;
};
