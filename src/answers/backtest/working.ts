import type { BacktestQuestion } from '../../questions/question.ts';
import type { Backtest } from '../../stats/backtests/backtest.ts';
import type { ModelVerdict } from '../../stats/backtests/judgedModel.ts';
import { coverageProcesses } from '../../stats/coverage/cell.ts';
import { rejectedWithTrueFigure, rollingSize, rollingSizeSetting } from '../../stats/coverage/rollingSize.ts';
import { expectedBeyond, levelText } from '../../terms/level.ts';
import { workingDigits } from '../../wording/digits.ts';
import { percent } from '../../wording/percent.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { WorkingStep } from '../answer.ts';
import { nearestProcess } from '../measured.ts';

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

/** What estimation alone does to the verdict on coverage: without it a rejection is read as more than it says. */
const chanceStep = (returns: Float64Array): WorkingStep => {
  const { process, rejected } = rollingSize(nearestProcess(returns));
  const { judgedDays, estimationReturns } = rollingSizeSetting;
  const shares = rejected.map(({ model, share }) => `${model} ${percent(share, 0)}`).join(', ');
  return {
    step: 'How often a rejection is chance',
    text:
      `on simulated ${coverageProcesses[process]}, ${judgedDays} days judged at 99% from ${estimationReturns} returns each, the coverage test at 5% rejects ` +
      `${shares} of the time; with the true figure ${percent(rejectedWithTrueFigure, 0)}`,
  };
};

/** Every test of every model. `returns` are those of the whole walk. */
export const backtestWorking = (
  found: Backtest,
  question: BacktestQuestion,
  dayCount: number,
  returns: Float64Array,
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
  chanceStep(returns),
];
