import { type Result, succeed } from '../../terms/result.ts';
import type { Answers } from '../answer.ts';
import type { AnswerJob } from '../answerQuestion.ts';
import type { PictureData } from './pictureData.ts';

/** What the picture of these answers shows, from the job that they are the outcome of. Pure. */
export const pictureOf = (_job: AnswerJob, answers: Answers): Result<PictureData> =>
  succeed({ kind: 'figures', answers });
