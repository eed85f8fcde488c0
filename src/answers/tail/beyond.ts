import type { TailQuestion } from '../../questions/question.ts';
import { measuredCoverage } from '../../stats/coverage/measuredCoverage.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { isoFromDay } from '../../terms/day.ts';
import { type Level, levelFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { workingDigits } from '../../wording/digits.ts';
import { percent } from '../../wording/percent.ts';
import type { TailBeyondAnswer } from '../answer.ts';
import { type Asked, enclose } from '../envelope.ts';
import { coverageWarningsOn, nearestProcess, type Simulated } from '../measured.ts';
import type { ReturnSample } from '../sample.ts';
import { endsText, returnsStep } from '../working.ts';
import type { Position } from './exposure.ts';
import type { BeyondModelFigures, RefusedModel } from './figures.ts';
import { refusedModel } from './modelFigures.ts';
import { leadingOf, modelNotes, modelsOf, refusedAltogether, returnsOfPosition } from './models.ts';
import { runBeyond } from './runModels.ts';
import { adjustmentWarnings } from './warnings.ts';

const daysOf = ({ days }: ReturnSample, returns: Float64Array, threshold: number): readonly string[] =>
  [...returns].flatMap((value, index) =>
    -value >= threshold ? [isoFromDay(days[index + 1] as number)] : [],
  );

type Ran = ReturnType<typeof runBeyond>[number];

/** Chances at which intervals of a chance were simulated; the nearest, on the scale of ratios, is quoted. */
const simulatedChances = ['0.05', '0.01'] as const;

const coveredAs = ({ model, probability }: Pick<BeyondModelFigures, 'model' | 'probability'>) => {
  const [larger, smaller] = simulatedChances;
  const boundary = Math.sqrt(Number(larger) * Number(smaller));
  return `beyond.${model}.${probability > boundary ? larger : smaller}` as const;
};

const figuresOf = (
  { model, result }: Ran,
  simulated: Simulated,
  level: Level,
): BeyondModelFigures | RefusedModel => {
  if (!result.ok) return refusedModel(model, result.problem);
  const { probability, interval, intervalMethod, meanReturnSessions, target } = result.value;
  return {
    model,
    ok: true,
    probability,
    lower: interval?.lower ?? null,
    upper: interval?.upper ?? null,
    intervalMethod,
    meanReturnSessions,
    target,
    measuredCoverage:
      measuredCoverage({ interval: coveredAs({ model, probability }), ...simulated, level })?.coverage ??
      null,
  };
};

const stepOf = ({ model, result }: Ran) => ({
  step: model,
  text: result.ok
    ? `chance ${workingDigits(result.value.probability)}, ${endsText(result.value.interval ?? { lower: null, upper: null })}${result.value.intervalMethod === null ? '' : ` (${result.value.intervalMethod})`}`
    : result.problem.message,
});

/** How rare a daily loss of at least the threshold is, by each model. */
export const answerBeyond = (
  asked: Asked,
  question: TailQuestion,
  threshold: number,
  series: PriceSeries,
  position: Position,
): Result<TailBeyondAnswer> => {
  const { sample, identity } = asked;
  const returns = returnsOfPosition(sample.returns, position);
  const streams = createStreams(identity.seedBytes);
  const ran = runBeyond(modelsOf(question), { returns, threshold, confidence: question.confidence, streams });
  const refused = refusedAltogether(ran);
  if (refused !== null) return refused;
  const days = daysOf(sample, returns, threshold);
  const { confidence } = question;
  const simulated = { process: nearestProcess(returns), count: returns.length };
  const models = ran.map((each) => figuresOf(each, simulated, confidence));
  const leading = leadingOf(models);
  return succeed(
    enclose(asked, {
      kind: 'tail beyond',
      verb: 'tail',
      figures: {
        threshold,
        confidenceLevel: levelFraction(question.confidence),
        position: position.position,
        models,
        days,
      },
      warnings: [
        ...(leading === null
          ? []
          : coverageWarningsOn(
              coveredAs(leading),
              `this interval of the ${leading.model} chance`,
              simulated,
              confidence,
            )),
        ...adjustmentWarnings(series.meaning),
      ],
      notes: modelNotes(ran),
      method: 'chance of a daily loss by each tail model',
      sources: [
        'historical: Clopper & Pearson (1934), Biometrika 26',
        'student and peaks: profile likelihood; normal: noncentral t',
        'peaks: McNeil & Frey (2000), Journal of Empirical Finance 7',
      ],
      working: [
        returnsStep(sample, asked.returnType),
        {
          step: 'Days on which it happened',
          text: `${days.length} of ${returns.length} with a loss of at least ${percent(threshold)}`,
        },
        ...ran.map(stepOf),
      ],
    }),
  );
};
