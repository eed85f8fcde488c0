import type { Answers } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import type { Result } from '../../terms/result.ts';

/** Where answers are worked out. */
export type Compute = {
  readonly answer: (job: AnswerJob, progress?: (words: string) => void) => Promise<Result<Answers>>;
  readonly close: () => Promise<void>;
};
