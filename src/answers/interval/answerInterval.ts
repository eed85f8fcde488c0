import type { IntervalQuestion, ReadQuestion } from '../../questions/question.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import type { Result } from '../../terms/result.ts';
import type { Answer } from '../answer.ts';
import { askOne } from '../askOne.ts';
import type { AnswerPolicy } from '../policy.ts';
import { answerMean } from './mean.ts';
import { answerRatio } from './ratio.ts';
import { answerVol } from './vol.ts';

const answers = { mean: answerMean, vol: answerVol, ratio: answerRatio } as const;

/** An interval for the mean, the standard deviation or their ratio. */
export const answerInterval = (
  read: ReadQuestion,
  question: IntervalQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<Answer> => {
  const asked = askOne(read, question, series, policy);
  return asked.ok ? answers[question.of](asked.value, question) : asked;
};
