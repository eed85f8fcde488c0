import type { CoverageCell } from '../cell.ts';

/** Written by `npm run coverage-table`; not to be edited. */
export const filteredTailCoverage: readonly CoverageCell[] = [
  ['tail.filtered.var.0.95', 'normal', 20, '0.95', 0.9942, 4000, 0],
  ['tail.filtered.var.0.95', 'normal', 60, '0.95', 0.9752, 4000, 0],
  ['tail.filtered.var.0.95', 'normal', 250, '0.95', 0.7023, 4000, 0],
  ['tail.filtered.var.0.95', 'studentT4', 20, '0.95', 0.9922, 4000, 0],
  ['tail.filtered.var.0.95', 'studentT4', 60, '0.95', 0.9725, 4000, 0],
  ['tail.filtered.var.0.95', 'studentT4', 250, '0.95', 0.6885, 4000, 0],
  ['tail.filtered.var.0.95', 'garchT', 20, '0.95', 0.9985, 4000, 0],
  ['tail.filtered.var.0.95', 'garchT', 60, '0.95', 0.9935, 4000, 0],
  ['tail.filtered.var.0.95', 'garchT', 250, '0.95', 0.857, 4000, 0],
  ['tail.filtered.es.0.95', 'normal', 250, '0.95', 0.6687, 4000, 0],
  ['tail.filtered.es.0.95', 'studentT4', 250, '0.95', 0.6727, 4000, 0],
  ['tail.filtered.es.0.95', 'garchT', 250, '0.95', 0.7995, 4000, 0],
  ['tail.filtered.var.0.975', 'normal', 60, '0.95', 0.9663, 4000, 0],
  ['tail.filtered.var.0.975', 'normal', 250, '0.95', 0.7382, 4000, 0],
  ['tail.filtered.var.0.975', 'studentT4', 60, '0.95', 0.958, 4000, 0],
  ['tail.filtered.var.0.975', 'studentT4', 250, '0.95', 0.7222, 4000, 0],
  ['tail.filtered.var.0.975', 'garchT', 60, '0.95', 0.9895, 4000, 0],
  ['tail.filtered.var.0.975', 'garchT', 250, '0.95', 0.8672, 4000, 0],
  ['tail.filtered.var.0.99', 'normal', 250, '0.95', 0.887, 4000, 0],
  ['tail.filtered.var.0.99', 'studentT4', 250, '0.95', 0.8945, 4000, 0],
  ['tail.filtered.var.0.99', 'garchT', 250, '0.95', 0.9683, 4000, 0],
];
