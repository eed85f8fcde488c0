import type { CoverageProcess, CoveredInterval } from '../stats/coverage/cell.ts';
import { measuredCoverage } from '../stats/coverage/measuredCoverage.ts';
import { coverageProcessFor } from '../stats/coverage/process.ts';
import { robustAutocorrelation } from '../stats/dependence/autocorrelation.ts';
import { dependenceFoundBelow, volatilityClustering } from '../stats/dependence/clustering.ts';
import { centralMoments } from '../stats/moments/centralMoments.ts';
import { jarqueBera } from '../stats/moments/jarqueBera.ts';
import { leastCounts } from '../stats/returns/leastCounts.ts';
import { type Level, levelText } from '../terms/level.ts';
import { percent } from '../wording/percent.ts';
import type { Warning } from './answer.ts';

/** Differences of two series that move can all be the same, and have no tails then. */
const haveTails = (returns: Float64Array): boolean =>
  returns.length >= leastCounts.kurtosis && centralMoments(returns).m2 > 0;

/** Which simulated process comes nearest to these returns: its measured coverage is quoted. */
export const nearestProcess = (returns: Float64Array): CoverageProcess =>
  coverageProcessFor({
    dependent: robustAutocorrelation(returns).p < dependenceFoundBelow,
    clustered: volatilityClustering(returns).p < dependenceFoundBelow,
    fatTailed: haveTails(returns) && jarqueBera(returns).p < 0.05,
  });

/** The same for an interval of a mean, to which dependence does more than clustering, and which clustering would hide. */
export const nearestProcessForMean = (returns: Float64Array): CoverageProcess =>
  robustAutocorrelation(returns).p < dependenceFoundBelow ? 'autoregressive' : nearestProcess(returns);

/** From the process under which intervals hold least often to the one under which they hold best. */
const worstFirst: readonly CoverageProcess[] = [
  'garchT',
  'autoregressive',
  'exponential',
  'studentT3',
  'studentT4',
  'normal',
];

/** Where two series differ, the one that is harder on an interval is quoted. */
export const worseProcess = (first: CoverageProcess, second: CoverageProcess): CoverageProcess =>
  worstFirst.indexOf(first) < worstFirst.indexOf(second) ? first : second;

export type Simulated = { readonly process: CoverageProcess; readonly count: number };

/** An interval of ours whose simulations missed its level by more than three points says so, with the share. */
export const coverageWarningsOn = (
  interval: CoveredInterval,
  called: string,
  { process, count }: Simulated,
  level: Level,
): readonly Warning[] => {
  const measured = measuredCoverage({ interval, process, count, level });
  if (measured === null || !measured.misses) return [];
  return [
    {
      code: 'coverageMisses',
      text: `in simulations of returns like these, ${measured.count} at a time, ${called} at ${levelText(level)} held the truth ${percent(measured.coverage, 0)} of the time.`,
    },
  ];
};

/** The same for an interval made from these returns. */
export const coverageWarnings = (
  interval: CoveredInterval,
  called: string,
  returns: Float64Array,
  level: Level,
): readonly Warning[] =>
  coverageWarningsOn(interval, called, { process: nearestProcess(returns), count: returns.length }, level);
