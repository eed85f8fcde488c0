import type { Answers } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import { renamed } from '../../answers/content.ts';
import type { Reply } from '../../present/reply.ts';
import { inWords } from '../../present/words.ts';
import type { StatisticalQuestion } from '../../questions/question.ts';
import type { InstantMs } from '../../terms/clock.ts';
import type { RecordedAnswer } from '../../terms/records.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Asker } from '../permissions.ts';
import { toRecord } from './body.ts';
import type { DeskRecords, RecordStore } from './ports.ts';

/** An answer that was just worked out, and how it is shown. */
export type Given = {
  readonly job: AnswerJob;
  readonly question: StatisticalQuestion;
  readonly answers: Answers;
  readonly replyTo: (answers: Answers) => Reply;
  readonly asking: Asker & { readonly words: string; readonly askedAtMs: InstantMs };
};

export type Kept = { readonly answers: Answers; readonly reply: Reply };

/** Each longer than the one before: two answers that share one hardly ever share the next. */
const longerLengths = [12, 14, 16, 18, 20] as const;

const isFree = async (store: RecordStore, record: RecordedAnswer): Promise<Result<boolean>> => {
  for (const id of record.ids) {
    const content = await store.contentOf(id);
    if (!content.ok) return content;
    if (content.value !== null && content.value !== record.content) return succeed(false);
  }
  return succeed(true);
};

/** The answers under ids that no other content has. */
const underFreeIds = async (
  store: RecordStore,
  { job, question, answers }: Given,
): Promise<Result<Answers>> => {
  let named = answers;
  for (const length of longerLengths) {
    const record = toRecord(job, question, named);
    const free = await isFree(store, record);
    if (!free.ok) return free;
    if (free.value) break;
    named = renamed(answers, record.content, length);
  }
  return succeed(named);
};

const notOnRecord = (given: Reply): Reply => ({
  ...given,
  quietLine: `${given.quietLine === null ? '' : `${given.quietLine}. `}Not kept on record: the store cannot be written now`,
});

/** Keeps an answer and that it was given. What the store does wrong never takes the answer from who asked for it. */
export const keepAnswer = async (
  { store, keeps, versions, tell }: DeskRecords,
  given: Given,
): Promise<Kept> => {
  const unkept = { answers: given.answers, reply: given.replyTo(given.answers) };
  if (!keeps) return unkept;
  const named = await underFreeIds(store, given);
  if (named.ok) {
    const reply = given.replyTo(named.value);
    const record = toRecord(given.job, given.question, named.value);
    const kept = await store.keep(record, { ...given.asking, replyText: inWords(reply), versions });
    if (kept.ok) return { answers: named.value, reply };
    tell(`The answer ${record.ids[0]} was given but not kept: ${kept.problem.message}`);
  } else tell(`The answer ${given.answers[0].id} was given but not kept: ${named.problem.message}`);
  return { ...unkept, reply: notOnRecord(unkept.reply) };
};
