import type { ReadQuestion, TailQuestion } from '../../questions/question.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import type { TailInput } from '../../stats/tails/tailFigures.ts';
import { levelFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { TailAnswer, TailBeyondAnswer } from '../answer.ts';
import { askOne } from '../askOne.ts';
import { type Asked, enclose } from '../envelope.ts';
import { nearestProcess } from '../measured.ts';
import type { AnswerPolicy } from '../policy.ts';
import { answerBeyond } from './beyond.ts';
import { type Position, positionOf } from './exposure.ts';
import type { RefusedModel, TailModelFigures } from './figures.ts';
import { modelFigures } from './modelFigures.ts';
import {
  horizonNotes,
  leadingOf,
  modelNotes,
  modelsOf,
  refusedAltogether,
  returnsOfPosition,
} from './models.ts';
import { runTails } from './runModels.ts';
import { tailWarnings } from './warnings.ts';
import { tailWorking } from './working.ts';

const sources = [
  'VaR and ES: Acerbi & Tasche (2002), Journal of Banking & Finance 26',
  'peaks: McNeil & Frey (2000), Journal of Empirical Finance 7',
  'filtered: Bollerslev (1986, 1987); Barone-Adesi, Giannopoulos & Vosper (1999); EWMA 0.94 is trade practice, without a source',
  'Coverage of the intervals: own simulations, kept with the program',
] as const;

const answerFigures = (
  asked: Asked,
  question: TailQuestion,
  series: PriceSeries,
  position: Position,
): Result<TailAnswer> => {
  const { sample, identity } = asked;
  const input: TailInput = {
    returns: returnsOfPosition(sample.returns, position),
    tailLevel: question.tailLevel,
    confidence: question.confidence,
    streams: createStreams(identity.seedBytes),
  };
  const ran = runTails(modelsOf(question), input, {
    horizonDays: question.horizonDays,
    returnType: question.returnType,
    position: position.position,
  });
  const refused = refusedAltogether(ran);
  if (refused !== null) return refused;
  const quoting = {
    process: nearestProcess(input.returns),
    count: input.returns.length,
    tailLevel: question.tailLevel,
    confidence: question.confidence,
  };
  const models: readonly (TailModelFigures | RefusedModel)[] = ran.map((each) =>
    modelFigures(each, position, question.returnType, quoting),
  );
  const confidenceLevel = levelFraction(question.confidence);
  const leading = leadingOf(models);
  return succeed(
    enclose(asked, {
      kind: 'tail',
      verb: 'tail',
      figures: {
        tailLevel: levelFraction(question.tailLevel),
        confidenceLevel,
        horizonDays: question.horizonDays,
        ...position,
        models,
      },
      warnings: tailWarnings({
        models,
        leading,
        sample,
        input,
        meaning: series.meaning,
        confidence: question.confidence,
        oneDay: question.horizonDays === 1,
      }),
      notes: [...modelNotes(ran), ...horizonNotes(ran)],
      method: question.model === null ? 'five tail models' : `the ${question.model} tail model`,
      sources,
      working: tailWorking(asked, question, ran),
    }),
  );
};

/** How much can be lost, and how unsure that figure is; or how rare a stated loss is. */
export const answerTail = (
  read: ReadQuestion,
  question: TailQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<TailAnswer | TailBeyondAnswer> => {
  const asked = askOne(read, question, series, policy);
  if (!asked.ok) return asked;
  const lastClose = asked.value.sample.closes.at(-1) ?? 0;
  const position = positionOf(question.exposure, series.ticker, lastClose, series.meaning);
  if (!position.ok) return position;
  return question.beyond === null
    ? answerFigures(asked.value, question, series, position.value)
    : answerBeyond(asked.value, question, question.beyond, series, position.value);
};
