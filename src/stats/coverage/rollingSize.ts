import type { TailModelName } from '../tails/tailFigures.ts';
import type { CoverageProcess } from './cell.ts';
import { rollingSizeMeasured } from './measured/rollingSize.ts';
import type { RollingProcess } from './rollingSizeCell.ts';

/** 250 days judged at 99%, each by the figure of the 250 returns before it. */
export const rollingSizeSetting = { judgedDays: 250, estimationReturns: 250, tailLevel: '0.99' } as const;

/** Rejections with the true VaR in the place of an estimate: those of 250 independent days, enumerated. */
export const rejectedWithTrueFigure = 0.0948;

const nearest = (process: CoverageProcess): RollingProcess => {
  if (process === 'garchT' || process === 'normal') return process;
  return process === 'autoregressive' ? 'normal' : 'studentT4';
};

export type RollingSize = {
  readonly process: RollingProcess;
  readonly rejected: readonly { readonly model: TailModelName; readonly share: number }[];
};

/**
 * How often does a backtest reject a model although nothing changed but the returns it was estimated from?
 * Convention: the share of simulated histories that Kupiec's verdict rejects at 5%, every model by itself.
 * Domain: any process of the coverage table; the simulated one that comes nearest is returned with its shares.
 * Units: shares in 0..1.
 * Edges: peaks is refused on many histories and judged on the others.
 * Source: own simulations, made by `npm run coverage-table`; 1,000 histories, so a share near 0.1 has a standard error of 0.01.
 * Example: rollingSize('normal') has 0.055 for the historical model.
 */
export const rollingSize = (process: CoverageProcess): RollingSize => {
  const simulated = nearest(process);
  return {
    process: simulated,
    rejected: rollingSizeMeasured.flatMap(([made, model, , , share]) =>
      made === simulated ? [{ model, share }] : [],
    ),
  };
};
