import type { TailModelName } from '../tails/tailFigures.ts';
import type { CoverageProcess } from './cell.ts';

/** Processes on which rolling backtests were simulated. */
export type RollingProcess = Extract<CoverageProcess, 'normal' | 'studentT4' | 'garchT'>;

/**
 * One simulated model: process, model, histories in which it was judged, share of days beyond VaR, and share of histories
 * that Kupiec's chi-square verdict rejects at 5%.
 */
export type RollingSizeCell = readonly [
  process: RollingProcess,
  model: TailModelName,
  histories: number,
  beyondShare: number,
  rejectedShare: number,
];
