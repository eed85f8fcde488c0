import type { Answers } from '../answers/answer.ts';
import type { AnswerJob } from '../answers/answerQuestion.ts';
import type { PictureData } from '../answers/pictures/pictureData.ts';
import type { Result } from '../terms/result.ts';

/** A drawn picture, ready to be shown: the file, what it shows in words, and what it is called. */
export type Picture = {
  readonly png: Uint8Array;
  readonly altText: string;
  readonly title: string;
  readonly fileName: string;
};

/** The picture of answers, from the job that they are the outcome of; a problem where they have none. */
export type Draw = (job: AnswerJob, answers: Answers) => Promise<Result<Picture>>;

/** Who draws. */
export type Drawing = {
  readonly draw: Draw;
  /** A picture of what was gathered elsewhere: the feed, a digest. */
  readonly drawData: (data: PictureData) => Promise<Result<Picture>>;
};
