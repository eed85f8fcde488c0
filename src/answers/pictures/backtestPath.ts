import type { BacktestQuestion } from '../../questions/question.ts';
import { walk } from '../../stats/backtests/walk.ts';
import { binomialCdf } from '../../stats/distributions/binomial.ts';
import type { TailModelName } from '../../stats/tails/tailFigures.ts';
import type { Day } from '../../terms/day.ts';
import { tailFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { type Judged, judgedDays } from '../backtest/judgedDays.ts';
import { thinned } from './buckets.ts';
import type { BacktestPath, CountStep, PathStep } from './pictureData.ts';

/** One day that was judged; no figure where the model gave none. */
type JudgedDay = { readonly day: Day; readonly value: number; readonly valueAtRisk: number | null };

const bandLevel = 0.95;

/** No more steps than can be told apart across the picture. */
const mostSteps = 300;

const stepsOf = (days: readonly JudgedDay[]): readonly PathStep[] =>
  thinned(days, mostSteps, (some) => {
    const last = some[some.length - 1] as JudgedDay;
    const values = some.map(({ value }) => value);
    return {
      day: last.day,
      low: Math.min(...values),
      high: Math.max(...values),
      valueAtRisk: last.valueAtRisk,
    };
  });

const exceeds = ({ value, valueAtRisk }: JudgedDay): boolean =>
  valueAtRisk !== null && 0 - value > valueAtRisk;

/** The least count that at most this many trials stay under with the probability; counts never fall as trials are added. */
const bandEnd = (from: number, trials: number, tail: number, probability: number): number => {
  let count = from;
  while (binomialCdf(count, trials, tail) < probability) count += 1;
  return count;
};

const countsOf = (days: readonly JudgedDay[], tail: number): readonly CountStep[] => {
  const figured = days.filter(({ valueAtRisk }) => valueAtRisk !== null);
  let count = 0;
  const counted = figured.map((each, place) => {
    count += exceeds(each) ? 1 : 0;
    return { day: each.day, count, trials: place + 1 };
  });
  let [lower, upper] = [0, 0];
  return thinned(counted, mostSteps, (some) => {
    const last = some[some.length - 1] as (typeof counted)[number];
    lower = bandEnd(lower, last.trials, tail, (1 - bandLevel) / 2);
    upper = bandEnd(upper, last.trials, tail, (1 + bandLevel) / 2);
    return { day: last.day, count: last.count, expected: tail * last.trials, lower, upper };
  });
};

const daysWith = ({ whole, firstDay, dayCount }: Judged, figures: Float64Array, figured: Uint8Array) =>
  Array.from(
    { length: dayCount },
    (_, place): JudgedDay => ({
      day: whole.days[firstDay + place + 1] as number,
      value: whole.returns[firstDay + place] as number,
      valueAtRisk: figured[place] === 1 ? (figures[place] as number) : null,
    }),
  );

/** The returns of the days that a backtest judged, beside one model’s figure of each day, and the count as it grew. */
export const backtestPath = (
  question: BacktestQuestion,
  series: PriceSeries,
  model: TailModelName,
): Result<BacktestPath> => {
  const found = judgedDays(series, question);
  if (!found.ok) return found;
  const { whole, firstDay, dayCount } = found.value;
  const { estimationReturns, tailLevel } = question;
  const span = { returns: whole.returns, firstDay, dayCount, estimationReturns, tailLevel };
  const [walked] = walk([model], span, {}) ?? [];
  if (walked === undefined) throw new Error('backtestPath: the walk ended although nothing can cancel it');
  if (!walked.outcome.ok) return walked.outcome;
  const { valuesAtRisk, figured } = walked.outcome.value;
  const days = daysWith(found.value, valuesAtRisk, figured);
  return succeed({
    model,
    steps: stepsOf(days),
    exceedances: days.filter(exceeds).map(({ day, value }) => ({ day, value })),
    counts: countsOf(days, tailFraction(tailLevel)),
    bandLevel,
  });
};
