import { type AnswerJob, answerQuestion } from '../../answers/answerQuestion.ts';

/** The task of one worker thread. Price columns arrive as views on shared memory, never as copies. */
export default (job: AnswerJob) => answerQuestion(job);
