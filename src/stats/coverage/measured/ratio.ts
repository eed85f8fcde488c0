import type { CoverageCell } from '../cell.ts';

/** Written by `npm run coverage-table`; not to be edited. */
export const ratioCoverage: readonly CoverageCell[] = [
  ['ratio.noncentralT', 'normal', 20, '0.95', 0.9513, 4000, 0],
  ['ratio.noncentralT', 'normal', 60, '0.95', 0.948, 4000, 0],
  ['ratio.noncentralT', 'normal', 250, '0.95', 0.956, 4000, 0],
  ['ratio.noncentralT', 'normal', 1000, '0.95', 0.9487, 4000, 0],
  ['ratio.noncentralT', 'studentT4', 20, '0.95', 0.9525, 4000, 0],
  ['ratio.noncentralT', 'studentT4', 60, '0.95', 0.9525, 4000, 0],
  ['ratio.noncentralT', 'studentT4', 250, '0.95', 0.9513, 4000, 0],
  ['ratio.noncentralT', 'studentT4', 1000, '0.95', 0.958, 4000, 0],
  ['ratio.noncentralT', 'garchT', 20, '0.95', 0.9425, 4000, 0],
  ['ratio.noncentralT', 'garchT', 60, '0.95', 0.954, 4000, 0],
  ['ratio.noncentralT', 'garchT', 250, '0.95', 0.9417, 4000, 0],
  ['ratio.noncentralT', 'garchT', 1000, '0.95', 0.9445, 4000, 0],
];
