import type { CoverageCell } from '../cell.ts';

/** Written by `npm run coverage-table`; not to be edited. */
export const studentNuCoverage: readonly CoverageCell[] = [
  ['tail.student.nu', 'normal', 20, '0.95', 0.9875, 4000, 0],
  ['tail.student.nu', 'normal', 60, '0.95', 0.9835, 4000, 0],
  ['tail.student.nu', 'normal', 250, '0.95', 0.979, 4000, 0],
  ['tail.student.nu', 'normal', 1000, '0.95', 0.981, 4000, 0],
  ['tail.student.nu', 'studentT4', 20, '0.95', 0.9798, 4000, 0],
  ['tail.student.nu', 'studentT4', 60, '0.95', 0.9325, 4000, 0],
  ['tail.student.nu', 'studentT4', 250, '0.95', 0.9455, 4000, 0],
  ['tail.student.nu', 'studentT4', 1000, '0.95', 0.9513, 4000, 0],
];
