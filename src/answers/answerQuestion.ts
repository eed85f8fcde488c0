import type { ReadQuestion } from '../questions/question.ts';
import type { PriceSeries } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Answer, Answers } from './answer.ts';
import { answerBacktest } from './backtest/answerBacktest.ts';
import { answerClaim } from './claim/answerClaim.ts';
import { answerCompare } from './compare/answerCompare.ts';
import { answerInterval } from './interval/answerInterval.ts';
import { answerNeed } from './need/answerNeed.ts';
import type { AnswerPolicy } from './policy.ts';
import { answerShape } from './shape/answerShape.ts';
import { answerTail } from './tail/answerTail.ts';

/** A question with the prices it is about, in the order of its tickers. Plain data: it can be handed to another thread. */
export type AnswerJob = {
  readonly read: ReadQuestion;
  readonly series: readonly PriceSeries[];
  readonly policy: AnswerPolicy;
};

/** The verbs that this version answers with figures. */
export const answeredVerbs = ['interval', 'claim', 'need', 'compare', 'tail', 'shape', 'backtest'] as const;

const single = (found: Result<Answer>): Result<Answers> => (found.ok ? succeed([found.value]) : found);

/** Answers a question. Pure: the same job gives the same answer to the last bit on one major version of the engine. */
export const answerQuestion = (
  { read, series, policy }: AnswerJob,
  progress?: (words: string) => void,
): Result<Answers> => {
  const [first] = series;
  if (first === undefined)
    return refuse(problem('noTicker', 'The question names no ticker. Add one, such as KELP.'));
  switch (read.question.verb) {
    case 'interval':
      return single(answerInterval(read, read.question, first, policy));
    case 'claim':
      return single(answerClaim(read, read.question, first, policy));
    case 'need':
      return single(answerNeed(read, read.question, first, policy));
    case 'tail':
      return single(answerTail(read, read.question, first, policy));
    case 'shape':
      return single(answerShape(read, read.question, first, policy));
    case 'backtest':
      return single(answerBacktest(read, read.question, first, policy, progress));
    case 'compare':
      return answerCompare(read, read.question, series, policy);
    default:
      return refuse(
        problem('verbNotBuilt', `${read.question.verb} cannot be asked yet. Ask help for what can.`, {
          suggestion: 'help',
        }),
      );
  }
};
