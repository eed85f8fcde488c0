import type { TailModelName } from '../../stats/tails/tailFigures.ts';
import type { RefusedModel } from '../tail/figures.ts';

export type JudgedModel = {
  readonly model: TailModelName;
  readonly ok: true;
  /** Days on which the model gave a figure. */
  readonly days: number;
  readonly exceedances: number;
  readonly expected: number;
  readonly exceedanceDates: readonly string[];
  readonly coverageLR: number;
  readonly coverageP: number;
  readonly binomialP: number;
  readonly independenceLR: number;
  readonly independenceP: number;
  readonly independenceExactP: number | null;
  readonly conditionalLR: number;
  readonly conditionalP: number;
  readonly zone: 'green' | 'yellow' | 'red' | null;
  /** The zones are the supervisor’s for 250 days at 99% and ours elsewhere. */
  readonly zoneIsOurExtension: boolean | null;
  readonly esZ2: number | null;
  readonly esP: number | null;
  readonly meanQuantileLoss: number | null;
  readonly meanJointLoss: number | null;
  readonly dieboldMarianoP: number | null;
};

export type BacktestFigures = {
  readonly tailLevel: number;
  /** Days judged. */
  readonly days: number;
  /** Returns behind each day’s figure. */
  readonly window: number;
  /** Days on which every model gave a figure: those over which they are ranked. */
  readonly commonDays: number;
  readonly models: readonly (JudgedModel | RefusedModel)[];
};
