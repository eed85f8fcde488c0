import type { Answers } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import { contentOf } from '../../answers/content.ts';
import type { AnswerPolicy } from '../../answers/policy.ts';
import type { StatisticalQuestion } from '../../questions/question.ts';
import { problem } from '../../terms/problem.ts';
import type { RecordedAnswer } from '../../terms/records.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';

const bodyVersion = 1;

/** An answer as it is kept: what it takes to work it out again, and what came out. */
export type RecordBody = {
  readonly bodyVersion: typeof bodyVersion;
  readonly question: StatisticalQuestion;
  readonly policy: AnswerPolicy;
  readonly answers: Answers;
};

/** The answer to a question, ready to be kept. */
export const toRecord = (
  { series, policy }: AnswerJob,
  question: StatisticalQuestion,
  answers: Answers,
): RecordedAnswer => {
  const [first, ...others] = answers;
  const body: RecordBody = { bodyVersion, question, policy, answers };
  return {
    ids: [first.id, ...others.map(({ id }) => id)],
    content: contentOf({ policy, answers }),
    verb: first.verb,
    question: first.question,
    asOf: first.asOf,
    methodVersion: first.methodVersion,
    body: JSON.stringify(body),
    series,
  };
};

/** What is on record, read back. A body of another form was kept by another version of the program. */
export const fromRecord = ({ ids, body }: Pick<RecordedAnswer, 'ids' | 'body'>): Result<RecordBody> => {
  // written by toRecord
  const read: RecordBody | { readonly bodyVersion: unknown } = JSON.parse(body);
  return 'answers' in read && read.bodyVersion === bodyVersion
    ? succeed(read)
    : refuse(
        problem(
          'storeUnavailable',
          `${ids[0]} was kept in a form that this version does not read. Use the version that kept it.`,
        ),
      );
};

/** The same question about the same prices, to be worked out again. */
export const jobOf = (record: RecordedAnswer, { question, policy }: RecordBody): AnswerJob => ({
  read: {
    question,
    canonical: record.question,
    assumed: [],
    wishes: [],
    position: { start: 0, end: record.question.length },
  },
  series: record.series,
  policy,
});
