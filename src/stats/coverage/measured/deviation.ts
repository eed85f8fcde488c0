import type { CoverageCell } from '../cell.ts';

export const deviationCoverage: readonly CoverageCell[] = [];
