import type { IntervalQuestion, ReadQuestion } from '../../questions/question.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import type { Result } from '../../terms/result.ts';
import type { Answer } from '../answer.ts';
import { identify } from '../identity.ts';
import type { AnswerPolicy } from '../policy.ts';
import { sampleReturns } from '../sample.ts';
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
  const sample = sampleReturns(series, question);
  if (!sample.ok) return sample;
  const { window, returnType } = question;
  const identity = identify(read.canonical, [sample.value]);
  return answers[question.of](
    { read, window, returnType, sample: sample.value, meaning: series.meaning, identity, policy },
    question,
  );
};
