import type { Answers } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import type { PictureData } from '../../answers/pictures/pictureData.ts';

/** What is to be drawn, as it reaches a worker thread: answers with their job, or what a picture shows. */
export type PictureOrder =
  | { readonly kind: 'answers'; readonly job: AnswerJob; readonly answers: Answers }
  | { readonly kind: 'data'; readonly data: PictureData };
