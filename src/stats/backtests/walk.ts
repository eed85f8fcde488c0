import type { Problem } from '../../terms/problem.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { TailModelName } from '../tails/tailFigures.ts';
import type { ModelDays } from './judgedModel.ts';
import { startFiltered } from './rolling/filtered.ts';
import { startHistorical } from './rolling/historical.ts';
import { startNormal } from './rolling/normal.ts';
import { startPeaks } from './rolling/peaks.ts';
import type {
  DayForecast,
  RollingForecaster,
  RollingSpan,
  StartForecaster,
} from './rolling/rollingForecaster.ts';
import { startStudent } from './rolling/student.ts';

const starters: Readonly<Record<TailModelName, StartForecaster>> = {
  historical: startHistorical,
  normal: startNormal,
  student: startStudent,
  filtered: startFiltered,
  peaks: startPeaks,
};

/** Heard while a long walk goes on: called now and then and never awaited. */
export type WalkListener = {
  readonly progress?: (daysDone: number, dayCount: number) => void;
  /** True ends the walk at once. */
  readonly cancelled?: () => boolean;
};

/** One model's forecasts as they are made; `figured` says on which days there was one. */
export type WalkedModel = {
  readonly forecaster: RollingForecaster;
  readonly valuesAtRisk: Float64Array;
  readonly expectedShortfalls: Float64Array;
  readonly figured: Uint8Array;
  refusedDays: number;
  firstRefusal: Problem | null;
};

const daysBetweenReports = 25;

const startModel = (model: TailModelName, span: RollingSpan): Result<WalkedModel> => {
  const started = starters[model](span);
  if (!started.ok) return started;
  return succeed({
    forecaster: started.value,
    valuesAtRisk: new Float64Array(span.dayCount),
    expectedShortfalls: new Float64Array(span.dayCount),
    figured: new Uint8Array(span.dayCount),
    refusedDays: 0,
    firstRefusal: null,
  });
};

const forecastDay = (walked: WalkedModel, day: number, place: number, into: DayForecast): void => {
  const refusal = walked.forecaster.forecast(day, into);
  if (refusal !== null) {
    walked.refusedDays += 1;
    walked.firstRefusal ??= refusal;
    return;
  }
  walked.figured[place] = 1;
  walked.valuesAtRisk[place] = into.valueAtRisk;
  walked.expectedShortfalls[place] = into.expectedShortfall ?? Infinity;
};

export type Walk = { readonly model: TailModelName; readonly outcome: Result<WalkedModel> };

/** One pass over the days, every model on each; null where the listener ended it. A model that cannot start is refused. */
export const walk = (
  models: readonly TailModelName[],
  span: RollingSpan,
  listener: WalkListener,
): readonly Walk[] | null => {
  const walks = models.map((model) => ({ model, outcome: startModel(model, span) }));
  const walking = walks.flatMap(({ outcome }) => (outcome.ok ? [outcome.value] : []));
  const into: DayForecast = { valueAtRisk: 0, expectedShortfall: 0 };
  for (let place = 0; place < span.dayCount; place += 1) {
    if (place % daysBetweenReports === 0) {
      if (listener.cancelled?.() === true) return null;
      listener.progress?.(place, span.dayCount);
    }
    for (const walked of walking) forecastDay(walked, span.firstDay + place, place, into);
  }
  listener.progress?.(span.dayCount, span.dayCount);
  return walks;
};

/** The forecasts of the days that pass, beside the losses that then came. */
export const chosenDays = (
  { valuesAtRisk, expectedShortfalls }: WalkedModel,
  { returns, firstDay, dayCount }: RollingSpan,
  passes: (place: number) => boolean,
): ModelDays => {
  const places = Array.from({ length: dayCount }, (_, place) => place).filter(passes);
  return {
    days: Int32Array.from(places, (place) => firstDay + place),
    losses: Float64Array.from(places, (place) => 0 - (returns[firstDay + place] as number)),
    valuesAtRisk: Float64Array.from(places, (place) => valuesAtRisk[place] as number),
    expectedShortfalls: Float64Array.from(places, (place) => expectedShortfalls[place] as number),
  };
};
