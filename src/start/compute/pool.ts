import { availableParallelism } from 'node:os';
import { Piscina } from 'piscina';
import type { Answers } from '../../answers/answer.ts';
import { type AnswerJob, answerQuestion } from '../../answers/answerQuestion.ts';
import { isHeavy } from '../../answers/weight.ts';
import type { Result } from '../../terms/result.ts';
import type { Compute } from './compute.ts';

/** Light answers at once on this thread; heavy ones in worker threads, so that the bot keeps answering others. */
export const computeInPool = (): Compute => {
  const pool = new Piscina<AnswerJob, Result<Answers>>({
    filename: new URL('./worker.js', import.meta.url).href,
    minThreads: 1,
    maxThreads: Math.max(1, availableParallelism() - 1),
    idleTimeout: 60_000,
  });
  return {
    answer: async (job) => (isHeavy(job) ? pool.run(job) : answerQuestion(job)),
    close: () => pool.close(),
  };
};
