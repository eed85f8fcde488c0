import { availableParallelism } from 'node:os';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { Answers } from '../../answers/answer.ts';
import { type AnswerJob, answerQuestion } from '../../answers/answerQuestion.ts';
import { isHeavy } from '../../answers/weight.ts';
import type { Result } from '../../terms/result.ts';
import type { Compute } from './compute.ts';
import type { WorkerJob } from './worker.ts';

type Pool = Piscina<WorkerJob, Result<Answers>>;

/** The channel lives as long as the job; its other end is handed to the worker. */
const runInPool = async (
  pool: Pool,
  job: AnswerJob,
  progress?: (words: string) => void,
): Promise<Result<Answers>> => {
  if (progress === undefined) return pool.run({ job, progress: null });
  const { port1: heard, port2: said } = new MessageChannel();
  heard.on('message', (words: unknown) => {
    if (typeof words === 'string') progress(words);
  });
  try {
    return await pool.run({ job, progress: said }, { transferList: [said] });
  } finally {
    heard.close();
  }
};

/** Light answers at once on this thread; heavy ones in worker threads, so that the bot keeps answering others. */
export const computeInPool = (workerFile = new URL('./worker.js', import.meta.url)): Compute => {
  const pool: Pool = new Piscina({
    filename: workerFile.href,
    minThreads: 1,
    maxThreads: Math.max(1, availableParallelism() - 1),
    idleTimeout: 60_000,
  });
  return {
    answer: async (job, progress) => (isHeavy(job) ? runInPool(pool, job, progress) : answerQuestion(job)),
    close: () => pool.close(),
  };
};
