import type { CoverageCell } from '../cell.ts';

export const meanCoverage: readonly CoverageCell[] = [];
