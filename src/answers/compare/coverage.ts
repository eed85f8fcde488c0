import type { Comparison } from '../../stats/comparisons/compare.ts';
import { pairedDifferences } from '../../stats/comparisons/meanDifference.ts';
import type { Level } from '../../terms/level.ts';
import type { Warning } from '../answer.ts';
import { coverageWarningsOn, nearestProcess, nearestProcessForMean, worseProcess } from '../measured.ts';
import type { ReturnSample } from '../sample.ts';

/**
 * What simulations say of the two intervals of a comparison. Two periods were simulated as the halves of a window, so their
 * count is that of both together.
 */
export const comparisonCoverage = (
  { kind, ratio }: Comparison,
  first: ReturnSample,
  second: ReturnSample,
  level: Level,
): readonly Warning[] => {
  const both = worseProcess(nearestProcess(first.returns), nearestProcess(second.returns));
  const paired = kind === 'paired';
  const count = paired ? first.returns.length : first.returns.length + second.returns.length;
  const dependent = [first.returns, second.returns].map(nearestProcessForMean).includes('autoregressive');
  const ofPeriods = dependent ? 'autoregressive' : both;
  const ofMean = paired ? nearestProcessForMean(pairedDifferences(first.returns, second.returns)) : ofPeriods;
  const ofRatio = ratio?.method === 'stationary' ? 'garchT' : both;
  return [
    ...coverageWarningsOn(
      `compare.${kind}.mean`,
      'this interval of the difference',
      { process: ofMean, count },
      level,
    ),
    ...(ratio === null
      ? []
      : coverageWarningsOn(
          `compare.${kind}.deviationRatio`,
          'this interval of the ratio of standard deviations',
          { process: ofRatio, count },
          level,
        )),
  ];
};
