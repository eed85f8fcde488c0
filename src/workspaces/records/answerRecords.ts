import { examinationReply, recordsReply } from '../../present/compose/records.ts';
import type { Reply } from '../../present/reply.ts';
import type { AgainQuestion, RecordQuestion, RecordsQuestion } from '../../questions/question.ts';
import type { InstantMs } from '../../terms/clock.ts';
import type { Day } from '../../terms/day.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Asker } from '../permissions.ts';
import { againOne, againTwo, type Recomputing } from './again.ts';
import { examine, type Reading, readLines, readRecord } from './reading.ts';

export type AnsweringRecords = Recomputing &
  Reading & {
    /** The instant at which a day begins where the desk is. */
    readonly dayStartMs: (day: Day) => InstantMs;
  };

/** So many lines are counted; the reply lists far fewer. */
const mostCounted = 1000;

const answerAgain = async (
  answering: AnsweringRecords,
  { ids: [firstId, secondId] }: AgainQuestion,
  reader: Asker,
): Promise<Result<Reply>> => {
  const first = await readRecord(answering, reader, firstId);
  if (!first.ok) return first;
  if (secondId === undefined) return againOne(answering, first.value);
  const second = await readRecord(answering, reader, secondId);
  return second.ok ? againTwo(first.value, second.value) : second;
};

const answerRecords = async (
  answering: AnsweringRecords,
  { ticker, since, verify }: RecordsQuestion,
  reader: Asker,
): Promise<Result<Reply>> => {
  const { store, dayStartMs, timeZone } = answering;
  if (verify) {
    const found = await examine(store);
    return found.ok ? succeed(examinationReply(found.value)) : found;
  }
  const sinceMs = since === null ? null : dayStartMs(since);
  const lines = await readLines(answering, reader, { ticker, sinceMs }, mostCounted);
  if (!lines.ok) return lines;
  const atLeast = lines.value.length === mostCounted;
  return succeed(recordsReply(lines.value, { ticker, since, atLeast }, timeZone));
};

/** Answers what is asked of the records. */
export const answerOfRecords = (
  answering: AnsweringRecords,
  question: RecordQuestion,
  reader: Asker,
): Promise<Result<Reply>> =>
  question.verb === 'again'
    ? answerAgain(answering, question, reader)
    : answerRecords(answering, question, reader);
