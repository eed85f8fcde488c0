import type { CoverageProcess } from '../../stats/coverage/cell.ts';
import { measuredCoverage } from '../../stats/coverage/measuredCoverage.ts';
import { leastCounts } from '../../stats/returns/leastCounts.ts';
import type { HorizonFigures } from '../../stats/tails/horizon/horizonTail.ts';
import { type Level, levelFraction } from '../../terms/level.ts';
import type { ReturnType } from '../../terms/returns.ts';
import { moneyLoss, type Position } from './exposure.ts';
import type { MeasuredShare, ParameterValue, RefusedModel, TailModelFigures } from './figures.ts';
import type { AnyTailFigures, RanTail } from './runModels.ts';

export const orInfinity = (value: number): number | 'infinity' =>
  value === Number.POSITIVE_INFINITY ? 'infinity' : value;

const parameterValue = (value: number | null): ParameterValue => (value === null ? null : orInfinity(value));

/** The parameters under the names of the answer, flat, intervals as two ends. */
const parametersOf = (figures: AnyTailFigures): Readonly<Record<string, ParameterValue>> => {
  switch (figures.model) {
    case 'student': {
      const { nuInterval, nu, location, scale, normalLimit, logLikelihood } = figures.parameters;
      return {
        location,
        scale,
        nu: orInfinity(nu),
        nuLower: parameterValue(nuInterval.lower),
        nuUpper: parameterValue(nuInterval.upper),
        normalLimit,
        logLikelihood,
      };
    }
    case 'peaks': {
      const { threshold, exceedances, shape, shapeInterval, scale } = figures.parameters;
      return {
        threshold,
        exceedances,
        shape,
        shapeLower: shapeInterval.lower,
        shapeUpper: shapeInterval.upper,
        scale,
      };
    }
    case 'filtered':
      return figures.parameters.kind === 'ewma'
        ? { ...figures.parameters }
        : { ...figures.parameters, nu: orInfinity(figures.parameters.nu) };
    default:
      return { ...figures.parameters };
  }
};

export type Quoting = {
  readonly process: CoverageProcess;
  readonly count: number;
  readonly tailLevel: Level;
  readonly confidence: Level;
};

/** Where both filters stand side by side each is quoted from the counts at which it stands alone. */
const countOf = (figures: AnyTailFigures, count: number): number => {
  if (figures.model !== 'filtered') return count;
  const { garch } = leastCounts;
  return figures.parameters.kind === 'ewma' ? Math.min(count, garch - 1) : Math.max(count, garch);
};

const measuredShare = (
  figures: AnyTailFigures,
  { process, count, tailLevel, confidence }: Quoting,
): MeasuredShare => {
  const share = (figure: 'var' | 'es') =>
    measuredCoverage({
      interval: `tail.${figures.model}.${figure}.${levelFraction(tailLevel)}`,
      process,
      count: countOf(figures, count),
      level: confidence,
    })?.coverage ?? null;
  return { var: share('var'), es: share('es') };
};

/** Figures of one day, from the model itself. */
const oneDayFigures = (
  figures: AnyTailFigures,
  position: Position,
  returnType: ReturnType,
  quoting: Quoting,
) => ({
  var: figures.var,
  varLower: figures.varInterval?.lower ?? null,
  varUpper: figures.varInterval?.upper ?? null,
  varIntervalMethod: figures.varIntervalMethod,
  varAttainedLevel: figures.varAttainedLevel,
  es: figures.es,
  esLower: figures.esInterval?.lower ?? null,
  esUpper: figures.esInterval?.upper ?? null,
  esIntervalMethod: figures.esIntervalMethod,
  measuredCoverage: measuredShare(figures, quoting),
  monteCarloError: null,
  shortcutVar: null,
  varMoney: moneyLoss(figures.var, position, returnType),
  esMoney: moneyLoss(figures.es, position, returnType),
});

/** Figures of several days, simulated; the coverage of their intervals is not measured. */
const horizonFigures = (horizon: HorizonFigures, { amount }: Position) => {
  const inMoney = (fraction: number | null) =>
    amount === null || fraction === null ? null : Math.abs(amount.amount) * fraction;
  return {
    var: horizon.var,
    varLower: horizon.varInterval?.lower ?? null,
    varUpper: horizon.varInterval?.upper ?? null,
    varIntervalMethod: horizon.intervalMethod,
    varAttainedLevel: null,
    es: horizon.es,
    esLower: horizon.esInterval?.lower ?? null,
    esUpper: horizon.esInterval?.upper ?? null,
    esIntervalMethod: horizon.esInterval === null ? null : horizon.intervalMethod,
    measuredCoverage: { var: null, es: null },
    monteCarloError: horizon.monteCarloError,
    shortcutVar: horizon.shortcutVar,
    varMoney: inMoney(horizon.moneyFraction.var),
    esMoney: inMoney(horizon.moneyFraction.es),
  };
};

/** A model's figures under the names of the answer, or its reason for having none. */
export const modelFigures = (
  { model, result, horizon }: RanTail,
  position: Position,
  returnType: ReturnType,
  quoting: Quoting,
): TailModelFigures | RefusedModel => {
  if (!result.ok) return refusedModel(model, result.problem);
  if (horizon !== null && !horizon.ok) return refusedModel(model, horizon.problem);
  return {
    model,
    ok: true,
    target: result.value.target,
    ...(horizon === null
      ? oneDayFigures(result.value, position, returnType, quoting)
      : horizonFigures(horizon.value, position)),
    parameters: parametersOf(result.value),
  };
};

export const refusedModel = (
  model: RefusedModel['model'],
  { code, message, needs }: RefusedModel['problem'],
): RefusedModel => ({
  model,
  ok: false,
  problem: { code, message, needs },
});
