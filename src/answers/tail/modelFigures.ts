import type { CoverageProcess } from '../../stats/coverage/cell.ts';
import { measuredCoverage } from '../../stats/coverage/measuredCoverage.ts';
import { coverageProcessFor } from '../../stats/coverage/process.ts';
import { robustAutocorrelation } from '../../stats/dependence/autocorrelation.ts';
import { dependenceFoundBelow, volatilityClustering } from '../../stats/dependence/clustering.ts';
import { jarqueBera } from '../../stats/moments/jarqueBera.ts';
import { type Level, levelFraction } from '../../terms/level.ts';
import type { ReturnType } from '../../terms/returns.ts';
import { moneyLoss, type Position } from './exposure.ts';
import type { MeasuredShare, ParameterValue, RefusedModel, TailModelFigures } from './figures.ts';
import type { AnyTailFigures, RanModel } from './runModels.ts';

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

/** Which simulated process comes nearest to these returns: whose measured coverage is quoted. */
export const nearestProcess = (returns: Float64Array): CoverageProcess =>
  coverageProcessFor({
    dependent: robustAutocorrelation(returns).p < dependenceFoundBelow,
    clustered: volatilityClustering(returns).p < dependenceFoundBelow,
    fatTailed: returns.length >= 4 && jarqueBera(returns).p < 0.05,
  });

export type Quoting = {
  readonly process: CoverageProcess;
  readonly count: number;
  readonly tailLevel: Level;
  readonly confidence: Level;
};

const measuredShare = (
  model: AnyTailFigures['model'],
  { process, count, tailLevel, confidence }: Quoting,
): MeasuredShare => {
  const share = (figure: 'var' | 'es') =>
    measuredCoverage({
      interval: `tail.${model}.${figure}.${levelFraction(tailLevel)}`,
      process,
      count,
      level: confidence,
    })?.coverage ?? null;
  return { var: share('var'), es: share('es') };
};

/** A model's figures under the names of the answer, or its reason for having none. */
export const modelFigures = (
  { model, result }: RanModel<AnyTailFigures>,
  position: Position,
  returnType: ReturnType,
  quoting: Quoting,
): TailModelFigures | RefusedModel => {
  if (!result.ok) return refusedModel(model, result.problem);
  const figures = result.value;
  return {
    model,
    ok: true,
    var: figures.var,
    varLower: figures.varInterval?.lower ?? null,
    varUpper: figures.varInterval?.upper ?? null,
    varIntervalMethod: figures.varIntervalMethod,
    varAttainedLevel: figures.varAttainedLevel,
    es: figures.es,
    esLower: figures.esInterval?.lower ?? null,
    esUpper: figures.esInterval?.upper ?? null,
    esIntervalMethod: figures.esIntervalMethod,
    target: figures.target,
    measuredCoverage: measuredShare(model, quoting),
    monteCarloError: null,
    shortcutVar: null,
    varMoney: moneyLoss(figures.var, position, returnType),
    esMoney: moneyLoss(figures.es, position, returnType),
    parameters: parametersOf(figures),
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
