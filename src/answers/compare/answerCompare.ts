import type { CompareQuestion, ReadQuestion } from '../../questions/question.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { Answers, CompareAnswer } from '../answer.ts';
import type { AnswerPolicy } from '../policy.ts';
import { comparePeriods } from './periods.ts';
import { compareTickers } from './tickers.ts';

const asAnswers = (answers: readonly CompareAnswer[]): Result<Answers> => {
  const [first, ...others] = answers;
  return first === undefined
    ? refuse(problem('missingPart', 'A comparison needs two tickers. Write for example: compare KELP TARN.'))
    : succeed([first, ...others]);
};

/** Do two tickers, every pair of several, or two periods of one differ? */
export const answerCompare = (
  read: ReadQuestion,
  question: CompareQuestion,
  series: readonly PriceSeries[],
  policy: AnswerPolicy,
): Result<Answers> => {
  const found =
    question.between === 'tickers'
      ? compareTickers(read, question, series, policy)
      : comparePeriods(read, question, series, policy);
  return found.ok ? asAnswers(found.value) : found;
};
