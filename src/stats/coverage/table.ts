import type { CoverageCell } from './cell.ts';
import { beyondCoverage } from './measured/beyond.ts';
import { comparisonCoverage } from './measured/comparison.ts';
import { deviationCoverage } from './measured/deviation.ts';
import { deviationLevelsCoverage } from './measured/deviationLevels.ts';
import { filteredGarchTailCoverage } from './measured/filteredGarchTail.ts';
import { filteredTailCoverage } from './measured/filteredTail.ts';
import { historicalTailCoverage } from './measured/historicalTail.ts';
import { meanCoverage } from './measured/mean.ts';
import { meanLevelsCoverage } from './measured/meanLevels.ts';
import { normalTailCoverage } from './measured/normalTail.ts';
import { peaksTailCoverage } from './measured/peaksTail.ts';
import { ratioCoverage } from './measured/ratio.ts';
import { studentNuCoverage } from './measured/studentNu.ts';
import { studentTailCoverage } from './measured/studentTail.ts';
import { studentTailLevelsCoverage } from './measured/studentTailLevels.ts';

/** All cells that were measured. Each file under measured/ is written by one suite of `npm run coverage-table`. */
export const coverageTable: readonly CoverageCell[] = [
  ...meanCoverage,
  ...deviationCoverage,
  ...ratioCoverage,
  ...historicalTailCoverage,
  ...normalTailCoverage,
  ...studentTailCoverage,
  ...studentNuCoverage,
  ...peaksTailCoverage,
  ...filteredTailCoverage,
  ...beyondCoverage,
  ...comparisonCoverage,
  ...deviationLevelsCoverage,
  ...filteredGarchTailCoverage,
  ...meanLevelsCoverage,
  ...studentTailLevelsCoverage,
];
