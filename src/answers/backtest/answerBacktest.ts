import type { BacktestQuestion, ReadQuestion } from '../../questions/question.ts';
import { type Backtest, backtest } from '../../stats/backtests/backtest.ts';
import type { ModelVerdict } from '../../stats/backtests/judgedModel.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { expectedBeyond, levelFraction } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { counted } from '../../wording/words.ts';
import type { BacktestAnswer, Note, Warning } from '../answer.ts';
import { feedWarnings } from '../askOne.ts';
import { enclose, spanOf } from '../envelope.ts';
import { identify } from '../identity.ts';
import type { AnswerPolicy } from '../policy.ts';
import { refusedModel } from '../tail/modelFigures.ts';
import { modelsOf } from '../tail/models.ts';
import { adjustmentWarnings } from '../tail/warnings.ts';
import type { BacktestFigures, JudgedModel } from './figures.ts';
import { dateOf, type Judged, judgedDays } from './judgedDays.ts';
import { backtestWorking } from './working.ts';

const judgedModel = (verdict: ModelVerdict, judged: Judged): JudgedModel => ({
  model: verdict.model,
  ok: true,
  days: verdict.forecasts.days.length,
  exceedances: verdict.exceedances,
  expected: verdict.expected,
  exceedanceDates: verdict.exceedanceDays.map((place) => dateOf(judged, place)),
  coverageLR: verdict.coverage.likelihoodRatio,
  coverageP: verdict.coverage.p,
  binomialP: verdict.binomialP,
  independenceLR: verdict.independence.likelihoodRatio,
  independenceP: verdict.independence.p,
  independenceExactP: verdict.independenceExactP,
  conditionalLR: verdict.conditional.likelihoodRatio,
  conditionalP: verdict.conditional.p,
  zone: verdict.trafficLight?.zone ?? null,
  zoneIsOurExtension: verdict.trafficLight?.ourExtension ?? null,
  esZ2: verdict.shortfallZ2,
  esP: verdict.shortfallP,
  meanQuantileLoss: verdict.standing?.meanQuantileLoss ?? null,
  meanJointLoss: verdict.standing?.meanJointLoss ?? null,
  dieboldMarianoP: verdict.standing?.dieboldMarianoP ?? null,
});

const figuresOf = (found: Backtest, question: BacktestQuestion, judged: Judged): BacktestFigures => ({
  tailLevel: levelFraction(question.tailLevel),
  days: judged.dayCount,
  window: question.estimationReturns,
  commonDays: found.commonDays,
  models: found.models.map((each) =>
    each.ok ? judgedModel(each, judged) : refusedModel(each.model, each.problem),
  ),
});

const fewExpected = 5;

const warningsOf = (question: BacktestQuestion, judged: Judged, series: PriceSeries): readonly Warning[] => {
  const expected = expectedBeyond(judged.dayCount, question.tailLevel);
  return [
    ...(expected < fewExpected
      ? [
          {
            code: 'fewExceedancesExpected',
            text: `only ${expected.toPrecision(2)} exceedances are expected in ${counted(judged.dayCount, 'day')}: a bad model is hard to tell from a good one. Ask for more days or a lower level.`,
          },
        ]
      : []),
    ...adjustmentWarnings(series.meaning),
  ];
};

const notesOf = (found: Backtest): readonly Note[] =>
  found.models.flatMap((each): readonly Note[] => {
    if (!each.ok)
      return [
        { figure: each.model, code: each.problem.code, text: `${each.model}: ${each.problem.message}` },
      ];
    return each.firstRefusal === null
      ? []
      : [
          {
            figure: each.model,
            code: each.firstRefusal.code,
            text: `${each.model} gave no figure on ${counted(each.refusedDays, 'day')}: ${each.firstRefusal.message}`,
          },
        ];
  });

export type Progress = (words: string) => void;

/** Did the tail figures hold up, made day by day from nothing but what was known? */
export const answerBacktest = (
  read: ReadQuestion,
  question: BacktestQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
  progress?: Progress,
): Result<BacktestAnswer> => {
  const found = judgedDays(series, question);
  if (!found.ok) return found;
  const judged = found.value;
  const { whole, firstDay, dayCount } = judged;
  const from = firstDay - question.estimationReturns;
  const used = {
    ...whole,
    days: whole.days.subarray(from, firstDay + dayCount + 1),
    closes: whole.closes.subarray(from, firstDay + dayCount + 1),
  };
  const identity = identify(read.canonical, [used]);
  const outcome = backtest({
    returns: whole.returns,
    firstDay,
    dayCount,
    estimationReturns: question.estimationReturns,
    tailLevel: question.tailLevel,
    models: modelsOf(question),
    streams: createStreams(identity.seedBytes),
    listener:
      progress === undefined ? {} : { progress: (done, all) => progress(`${done} of ${all} days walked`) },
  });
  if (outcome === null)
    throw new Error('answerBacktest: ended before its time although nothing can cancel it');
  if (!outcome.ok) return outcome;
  const models = outcome.value.models;
  const [first] = models;
  if (first !== undefined && !first.ok && models.every(({ ok }) => !ok)) return refuse(first.problem);
  const span = {
    ...spanOf({
      ...whole,
      from: whole.days[firstDay + 1] as number,
      to: whole.days[firstDay + dayCount] as number,
      returns: whole.returns.subarray(firstDay, firstDay + dayCount),
    }),
    cutToHistory: judged.cut,
  };
  return succeed(
    enclose(
      {
        read,
        window: question.window,
        returnType: question.returnType,
        span,
        meaning: series.meaning,
        feedWarnings: feedWarnings(series, used),
        identity,
        policy,
      },
      {
        kind: 'backtest',
        verb: 'backtest',
        figures: figuresOf(outcome.value, question, judged),
        warnings: warningsOf(question, judged, series),
        notes: notesOf(outcome.value),
        method: `rolling backtest, ${question.estimationReturns} returns behind each day`,
        sources: [
          'Coverage: Kupiec (1995), Journal of Derivatives 3; independence: Christoffersen (1998), International Economic Review 39',
          'Traffic light: Basel Committee on Banking Supervision (1996)',
          'ES: Acerbi & Szekely (2014), Risk; league: Patton, Ziegel & Chen (2019), Diebold & Mariano (1995)',
        ],
        working: backtestWorking(
          outcome.value,
          question,
          judged.dayCount,
          whole.returns.subarray(from, firstDay + dayCount),
        ),
      },
    ),
  );
};
