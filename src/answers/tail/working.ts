import type { TailQuestion } from '../../questions/question.ts';
import { expectedBeyond, levelText } from '../../terms/level.ts';
import { workingDigits } from '../../wording/digits.ts';
import type { WorkingStep } from '../answer.ts';
import type { Asked } from '../envelope.ts';
import { endsText, returnsStep } from '../working.ts';
import type { AnyTailFigures, RanModel, RanTail } from './runModels.ts';

const parametersText = (figures: AnyTailFigures): string => {
  switch (figures.model) {
    case 'historical':
      return `loss number ${figures.parameters.rank} of the ascending ones`;
    case 'normal':
      return `mean ${workingDigits(figures.parameters.mean)}, s ${workingDigits(figures.parameters.sampleStandardDeviation)}; VaR = −mean + z·s`;
    case 'student': {
      const { location, scale, nu, nuInterval } = figures.parameters;
      const written = nu === Number.POSITIVE_INFINITY ? 'infinite (the bell curve)' : workingDigits(nu);
      const upper = nuInterval.upper === Number.POSITIVE_INFINITY ? null : nuInterval.upper;
      return `location ${workingDigits(location)}, scale ${workingDigits(scale)}, degrees of freedom ${written} (${endsText({ lower: nuInterval.lower, upper })})`;
    }
    case 'filtered':
      return figures.parameters.kind === 'ewma'
        ? `EWMA with ${figures.parameters.lambda}; next day’s standard deviation ${workingDigits(figures.parameters.nextDayDeviation)}`
        : `GARCH(1,1): omega ${workingDigits(figures.parameters.omega)}, alpha ${workingDigits(figures.parameters.alpha)}, beta ${figures.parameters.beta === null ? 'none' : workingDigits(figures.parameters.beta)}; next day’s standard deviation ${workingDigits(figures.parameters.nextDayDeviation)}`;
    case 'peaks':
      return `${figures.parameters.exceedances} losses above ${workingDigits(figures.parameters.threshold)}; tail shape ${workingDigits(figures.parameters.shape)} (${endsText(figures.parameters.shapeInterval)}), scale ${workingDigits(figures.parameters.scale)}`;
  }
};

const stepOf = ({ model, result }: RanModel<AnyTailFigures>): WorkingStep => {
  if (!result.ok) return { step: model, text: result.problem.message };
  const figures = result.value;
  const noEnds = { lower: null, upper: null };
  const es =
    figures.es === null ? 'none' : `${workingDigits(figures.es)} (${endsText(figures.esInterval ?? noEnds)})`;
  return {
    step: model,
    text: `${parametersText(figures)}; VaR ${workingDigits(figures.var)} (${endsText(figures.varInterval ?? noEnds)}), ES ${es}`,
  };
};

const horizonStep = (days: number, model: string, horizon: RanTail['horizon']): readonly WorkingStep[] => {
  if (horizon === null) return [];
  if (!horizon.ok) return [{ step: `${model}, ${days} days`, text: horizon.problem.message }];
  const { var: valueAtRisk, es, varInterval, monteCarloError, shortcutVar } = horizon.value;
  return [
    {
      step: `${model}, ${days} days`,
      text:
        `100,000 simulated paths: VaR ${workingDigits(valueAtRisk)} ± ${workingDigits(monteCarloError.var)} (error of the simulation)` +
        `${varInterval === null ? '' : `, ${endsText(varInterval)}`}; ES ${es === null ? 'none' : workingDigits(es)}; ` +
        `the trade’s shortcut √h·(VaR + m) − h·m gives ${workingDigits(shortcutVar)}`,
    },
  ];
};

/** Each model with its parameters and figures. */
export const tailWorking = (
  asked: Asked,
  question: TailQuestion,
  ran: readonly RanTail[],
): readonly WorkingStep[] => [
  returnsStep(asked.sample, asked.returnType),
  {
    step: 'Days beyond the level',
    text: `n·(1 − level) = ${workingDigits(expectedBeyond(asked.sample.returns.length, question.tailLevel))} returns are expected beyond ${levelText(question.tailLevel)}; losses are −r, positive`,
  },
  ...ran.map(stepOf),
  ...ran.flatMap(({ model, horizon }) => horizonStep(question.horizonDays, model, horizon)),
];
