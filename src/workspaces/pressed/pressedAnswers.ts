import type { Answers } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import { type Reply, reply } from '../../present/reply.ts';
import type { StatisticalQuestion } from '../../questions/question.ts';
import { readMessage } from '../../questions/readMessage.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { type Pressing, readerOf } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import { isStatistical } from '../questionKinds.ts';
import { fromRecord, jobOf } from '../records/body.ts';
import { noSuchRecord, readRecord } from '../records/reading.ts';
import { workOut } from '../workOut.ts';

/** The answers under a button, with their question. `changed` says that they are not the very ones, where they are not. */
export type PressedAnswers = {
  readonly answers: Answers;
  readonly question: StatisticalQuestion;
  /** The job that they are the outcome of. */
  readonly job: AnswerJob;
  readonly changed: Reply | null;
};

const changedPrices = (answerId: string, todayId: string): Reply =>
  reply(
    'refusal',
    `The prices have changed since ${answerId} was given; what follows is of the same question today, ${todayId}.`,
  );

/** The same question on the prices of today: what is left where nothing is kept or the store is in trouble. */
const onToday = async (desk: Desk, pressing: Pressing): Promise<Result<PressedAnswers>> => {
  const { answerId, question } = pressing;
  const live = desk.snapshot();
  if (!live.ok) return live;
  const [read] = readMessage(question, desk.contextFor(live.value)).questions;
  if (read?.ok !== true || !isStatistical(read.value.question)) return noSuchRecord(answerId);
  const may = desk.permissions.mayAsk(readerOf(pressing), read.value.question.verb);
  if (!may.ok) return noSuchRecord(answerId);
  const worked = await workOut(desk, read.value, read.value.question, live.value);
  if (!worked.ok) return worked;
  const [{ id }] = worked.value.answers;
  return succeed({
    answers: worked.value.answers,
    job: worked.value.job,
    question: read.value.question,
    changed: id === answerId ? null : changedPrices(answerId, id),
  });
};

/**
 * What stands under a button, on record. Where the record was deleted, or whoever presses may not read it, the refusal
 * is the one of an id that never was.
 */
export const pressedAnswers = async (desk: Desk, pressing: Pressing): Promise<Result<PressedAnswers>> => {
  if (!desk.records.keeps) return onToday(desk, pressing);
  const found = await readRecord(
    { store: desk.records.store, permissions: desk.permissions },
    readerOf(pressing),
    pressing.answerId,
  );
  if (!found.ok)
    return found.problem.code === 'storeUnavailable' ? onToday(desk, pressing) : refuse(found.problem);
  const body = fromRecord(found.value.answer);
  if (!body.ok) return body;
  const { answers, question } = body.value;
  const job = jobOf(found.value.answer, body.value);
  return succeed({ answers, question, job, changed: null });
};
