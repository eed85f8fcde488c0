import type { Level } from '../../../terms/level.ts';
import type { Problem } from '../../../terms/problem.ts';
import type { Random } from '../../../terms/random.ts';
import type { Result } from '../../../terms/result.ts';
import type { TailModelName } from '../../tails/tailFigures.ts';

/** One day's figures as losses in decimal fractions; `expectedShortfall` is null where the model's tail has no mean. */
export type DayForecast = { valueAtRisk: number; expectedShortfall: number | null };

/** Which days are forecast from what. Day t is forecast from returns t − estimationReturns … t − 1 and from nothing else. */
export type RollingSpan = {
  /** In time order; the first day judged has at least `estimationReturns` of them before it. */
  readonly returns: Float64Array;
  readonly firstDay: number;
  readonly dayCount: number;
  readonly estimationReturns: number;
  readonly tailLevel: Level;
};

/**
 * One model walked through the days. `forecast` is called once for each day, in order and without a gap, and writes that
 * day's figures into `into`, or says why there are none. Afterwards `drawBeyond` draws a loss beyond that day's VaR from
 * that day's forecast; the mean of such draws is the day's ES. Days are indices into the returns.
 */
export type RollingForecaster = {
  readonly model: TailModelName;
  readonly forecast: (day: number, into: DayForecast) => Problem | null;
  readonly drawBeyond: (day: number, random: Random) => number;
};

/** Refused where the estimation window is too short for the model on every day. */
export type StartForecaster = (span: RollingSpan) => Result<RollingForecaster>;

/** The returns that day `day` is forecast from; a view, not a copy. */
export const estimationWindow = ({ returns, estimationReturns }: RollingSpan, day: number): Float64Array =>
  returns.subarray(day - estimationReturns, day);
