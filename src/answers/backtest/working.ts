import type { BacktestQuestion } from '../../questions/question.ts';
import type { Backtest } from '../../stats/backtests/backtest.ts';
import type { ModelVerdict } from '../../stats/backtests/judgedModel.ts';
import { expectedBeyond, levelText } from '../../terms/level.ts';
import { workingDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { WorkingStep } from '../answer.ts';

const p = (value: number | null): string => (value === null ? 'not tested' : `p ${probabilityValue(value)}`);

const verdictText = (verdict: ModelVerdict): string =>
  [
    `${verdict.exceedances} exceedances, ${workingDigits(verdict.expected)} expected`,
    `coverage LR ${workingDigits(verdict.coverage.likelihoodRatio)} (${p(verdict.coverage.p)}; exact ${p(verdict.binomialP)})`,
    `independence LR ${workingDigits(verdict.independence.likelihoodRatio)} (${p(verdict.independence.p)}; exact ${p(verdict.independenceExactP)})`,
    `both LR ${workingDigits(verdict.conditional.likelihoodRatio)} (${p(verdict.conditional.p)})`,
    verdict.shortfallZ2 === null
      ? 'ES not tested'
      : `ES Z2 ${workingDigits(verdict.shortfallZ2)} (${p(verdict.shortfallP)})`,
  ].join('; ');

/** Every test of every model. */
export const backtestWorking = (
  found: Backtest,
  question: BacktestQuestion,
  dayCount: number,
): readonly WorkingStep[] => [
  {
    step: 'Days',
    text: `${dayCount} days, each judged by a figure at ${levelText(question.tailLevel)} made from the ${question.estimationReturns} returns before it; ${workingDigits(expectedBeyond(dayCount, question.tailLevel))} exceedances expected`,
  },
  { step: 'Exceedance', text: 'a loss strictly greater than the VaR of that day' },
  ...found.models.map((each) => ({
    step: each.model,
    text: each.ok ? verdictText(each) : each.problem.message,
  })),
];
