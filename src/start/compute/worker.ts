import type { MessagePort } from 'node:worker_threads';
import { type AnswerJob, answerQuestion } from '../../answers/answerQuestion.ts';

/** A job as it reaches a worker thread; what is said on the way goes through the port. */
export type WorkerJob = { readonly job: AnswerJob; readonly progress: MessagePort | null };

/** The task of one worker thread. Price columns arrive as views on shared memory, never as copies. */
export default ({ job, progress }: WorkerJob) =>
  answerQuestion(job, progress === null ? undefined : (words) => progress.postMessage(words));
