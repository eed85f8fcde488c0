import type { Level } from '../../../terms/level.ts';
import type { Problem } from '../../../terms/problem.ts';
import type { Random } from '../../../terms/random.ts';
import type { TailModelName } from '../../tails/tailFigures.ts';

/** One day's figures as losses in decimal fractions; `expectedShortfall` is null where the model's tail has no mean. */
export type DayForecast = { valueAtRisk: number; expectedShortfall: number | null };

/** Which days are forecast from what. Day t of `returns` is forecast from returns t − estimationReturns … t − 1. */
export type RollingSpan = {
  readonly returns: Float64Array;
  readonly firstDay: number;
  readonly dayCount: number;
  readonly estimationReturns: number;
  readonly tailLevel: Level;
};

/**
 * One model walked through the days. `forecast` is called once for each day, in order and without a gap, and writes the
 * day's figures into `into`, or says why there are none. `drawBeyond` then draws a loss beyond that day's VaR from that
 * day's forecast; its mean is the day's ES. A forecaster remembers what its draws need and what the next fit starts from.
 */
export type RollingForecaster = {
  readonly model: TailModelName;
  readonly forecast: (dayIndex: number, into: DayForecast) => Problem | null;
  readonly drawBeyond: (dayIndex: number, random: Random) => number;
};
