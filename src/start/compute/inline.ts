import { answerQuestion } from '../../answers/answerQuestion.ts';
import type { Compute } from './compute.ts';

/** Works answers out on the calling thread: for one-shot use, where nobody else waits. */
export const computeInline = (): Compute => ({
  answer: async (job, progress) => answerQuestion(job, progress),
  close: async () => {},
});
