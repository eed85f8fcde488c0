import type { CoverageCell } from '../cell.ts';

export const ratioCoverage: readonly CoverageCell[] = [];
