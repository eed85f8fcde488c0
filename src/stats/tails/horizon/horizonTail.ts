import { problem } from '../../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../../terms/result.ts';
import type { ReturnType } from '../../../terms/returns.ts';
import type { FilteredTailFigures } from '../filtered/filteredTail.ts';
import type { HistoricalTailFigures } from '../historicalTail.ts';
import type { NormalTailFigures } from '../normalTail.ts';
import type { PeaksTailFigures } from '../peaks/peaksTail.ts';
import type { StudentTailFigures } from '../studentTail.ts';
import type {
  Interval,
  IntervalMethod,
  TailInput,
  TailModelName,
  TailNote,
  TailTarget,
} from '../tailFigures.ts';
import { type HeldPosition, moneyFractionOf, pathLossOf } from './internal/compounding.ts';
import { drawnIntervals, pathsPerDraw } from './internal/drawnIntervals.ts';
import { filteredHorizon } from './internal/filteredPaths.ts';
import { historicalHorizon } from './internal/historicalPaths.ts';
import { normalHorizon } from './internal/normalPaths.ts';
import type { HorizonModel, PathSource } from './internal/pathSource.ts';
import { peaksHorizon } from './internal/peaksPaths.ts';
import { monteCarloErrors, type SimulatedFigures, simulatedFigures } from './internal/simulatedFigures.ts';
import { simulateLosses } from './internal/simulatePaths.ts';
import { studentHorizon } from './internal/studentPaths.ts';

/** The one-day figures of any model, from which its paths are made. */
export type OneDayFigures =
  | HistoricalTailFigures
  | NormalTailFigures
  | StudentTailFigures
  | FilteredTailFigures
  | PeaksTailFigures;

export type HorizonInput = TailInput & {
  /** Days of trading, 1 to 250. */
  readonly horizonDays: number;
  readonly returnType: ReturnType;
  /** A short position's returns are those of the price, negated. */
  readonly position: HeldPosition;
};

/** Both figures of one kind: VaR and, where it exists, ES. */
export type FigurePair = { readonly var: number; readonly es: number | null };

export type HorizonFigures = {
  readonly model: TailModelName;
  readonly target: TailTarget;
  readonly horizonDays: number;
  /** Loss over the horizon: a sum of log returns or a compounded simple return, positive. */
  readonly var: number;
  readonly varInterval: Interval | null;
  readonly es: number | null;
  readonly esInterval: Interval | null;
  readonly intervalMethod: IntervalMethod | null;
  /** The same losses as fractions of the position's value in money. */
  readonly moneyFraction: FigurePair;
  /** Standard errors of the simulation itself, in the units of `var` and `es`. */
  readonly monteCarloError: FigurePair;
  /** √h·(one-day VaR + m) − h·m, m the model's mean daily return: trade practice, to be compared. */
  readonly shortcutVar: number;
  readonly notes: readonly TailNote[];
};

export const horizonPaths = 100_000;
const longestHorizonDays = 250;

const refuseHorizon = (days: number): Refusal | null =>
  Number.isInteger(days) && days >= 1 && days <= longestHorizonDays
    ? null
    : refuse(
        problem(
          'sizeOutside',
          `A horizon of ${days} days is outside what is simulated. Ask for a whole number of days from 1 to ${longestHorizonDays}.`,
        ),
      );

const modelOf = (oneDay: OneDayFigures, returns: Float64Array): Result<HorizonModel> => {
  switch (oneDay.model) {
    case 'historical':
      return succeed(historicalHorizon(returns));
    case 'normal':
      return succeed(normalHorizon(returns.length, oneDay.parameters));
    case 'student':
      return succeed(studentHorizon(returns.length, oneDay.parameters));
    case 'filtered':
      return filteredHorizon(returns, oneDay.parameters.kind);
    case 'peaks':
      return peaksHorizon(returns, oneDay.parameters);
  }
};

const noMean: TailNote = {
  figure: 'es',
  code: 'meanNotFinite',
  text: 'A day’s fitted tail is so heavy that the mean loss beyond VaR does not exist. Read VaR alone.',
  needs: null,
};

/**
 * How large is the loss over several days that one such span in so many exceeds, and the mean loss beyond it?
 * Convention: 100,000 simulated paths of daily returns under the model of the one-day figures: historical draws the returns
 * with equal chances, normal and student their distribution, filtered the residuals on a variance that each day moves on,
 * peaks the returns at or below the threshold and its tail. Simple returns compound, floored at −100% a day; log returns add.
 * VaR and ES are the historical figures of the paths' losses. Interval: 200 draws of the parameters with 5,000 paths each,
 * percentile ends; draws are resamples (historical), generalised pivots (normal), or refits to resamples of the fit (the rest).
 * Domain: the returns and tail level of `oneDay`; 1 to 250 days.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out, in the returns' own kind, and as
 * fractions of the money held.
 * Edges: no interval beyond 60 days; ES is null where a day's loss has no mean, unless compounding bounds the loss.
 * Days are independent but for the volatility of filtered.
 * Source: filtered paths: Barone-Adesi, Giannopoulos & Vosper 1999, Journal of Futures Markets 19, 583-602; generalised
 * pivots: Weerahandi 1993, Journal of the American Statistical Association 88, 899-905; the shortcut is trade practice.
 * Example: ten normal days of mean 0 and deviation 1% (log) have VaR 7.36% at 99%, as the shortcut has.
 */
export const horizonTail = (oneDay: OneDayFigures, input: HorizonInput): Result<HorizonFigures> => {
  const { returns, tailLevel, confidence, streams, horizonDays, returnType, position } = input;
  const refusal = refuseHorizon(horizonDays);
  if (refusal !== null) return refusal;
  const found = modelOf(oneDay, returns);
  if (!found.ok) return found;
  const model = found.value;
  const lossOf = pathLossOf(returnType, position);
  const lossesOf = (paths: PathSource, count: number): Float64Array =>
    simulateLosses(paths, lossOf, horizonDays, count, streams);
  const losses = lossesOf(model.paths, horizonPaths);
  const firstFigures = simulatedFigures(losses.slice(0, pathsPerDraw).sort(), tailLevel);
  losses.sort();
  const figures = simulatedFigures(losses, tailLevel);
  const errors = monteCarloErrors(losses, tailLevel, figures);
  const money = simulatedFigures(losses.map(moneyFractionOf(returnType, position)), tailLevel);
  const intervals = drawnIntervals({
    redraw: model.redraw,
    figuresOf: (paths) => simulatedFigures(lossesOf(paths, pathsPerDraw).sort(), tailLevel),
    shift: { var: figures.var - firstFigures.var, es: figures.es - firstFigures.es },
    horizonDays,
    confidence,
    streams,
  });
  const bounded = returnType === 'simple' && position === 'long';
  const hasMean = model.lossHasMean || bounded;
  const pair = ({ var: valueAtRisk, es }: SimulatedFigures): FigurePair => ({
    var: valueAtRisk,
    es: hasMean ? es : null,
  });
  return succeed({
    model: oneDay.model,
    target: oneDay.target,
    horizonDays,
    ...pair(figures),
    varInterval: intervals.var,
    esInterval: hasMean ? intervals.es : null,
    intervalMethod: intervals.var === null ? null : 'parameterDraws',
    moneyFraction: pair(money),
    monteCarloError: pair(errors),
    shortcutVar: Math.sqrt(horizonDays) * (oneDay.var + model.drift) - horizonDays * model.drift,
    notes: hasMean ? intervals.notes : [noMean, ...intervals.notes],
  });
};
