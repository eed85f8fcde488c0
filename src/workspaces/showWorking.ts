import type { Answers } from '../answers/answer.ts';
import { workingReplies } from '../present/answerReply.ts';
import { type Button, type Reply, reply } from '../present/reply.ts';
import { readMessage } from '../questions/readMessage.ts';
import type { Desk } from './desk.ts';
import { isStatistical } from './questionKinds.ts';
import { fromRecord } from './records/body.ts';
import { type Reader, readRecord } from './records/reading.ts';
import { workOut } from './workOut.ts';

/** The very answers that a reply shows, where they are on record. */
const onRecord = async (desk: Desk, answerId: string, reader: Reader): Promise<Answers | null> => {
  const found = await readRecord(desk.records.store, reader, answerId);
  const body = found.ok ? fromRecord(found.value.answer) : found;
  return body.ok ? body.value.answers : null;
};

/** The same question on the prices of today; null where it has no answer on them. */
const onToday = async (desk: Desk, text: string): Promise<Answers | null> => {
  const live = desk.snapshot();
  if (!live.ok) return null;
  const [read] = readMessage(text, desk.contextFor(live.value)).questions;
  if (read?.ok !== true || !isStatistical(read.value.question)) return null;
  const worked = await workOut(desk, read.value, read.value.question, live.value);
  return worked.ok ? worked.value.answers : null;
};

/** The working of the answer that a button stands under. */
export const showWorking = async (
  desk: Desk,
  { answerId, question }: Pick<Button, 'answerId' | 'question'>,
  reader: Reader,
): Promise<readonly Reply[]> => {
  const kept = await onRecord(desk, answerId, reader);
  if (kept !== null) return workingReplies(kept);
  const today = await onToday(desk, question);
  if (today === null)
    return [
      reply(
        'refusal',
        `${answerId} cannot be worked out again on the prices of today. Ask the question anew.`,
      ),
    ];
  const [{ id }] = today;
  const changed = reply(
    'refusal',
    `The prices have changed since ${answerId} was given; this is the working of the same question today, ${id}.`,
  );
  return [...(id === answerId ? [] : [changed]), ...workingReplies(today)];
};
