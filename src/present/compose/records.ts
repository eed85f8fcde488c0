import { type Day, isoFromDay } from '../../terms/day.ts';
import type { RecordExamination, RecordLine } from '../../terms/records.ts';
import { digits } from '../../wording/digits.ts';
import { counted, instantInWords } from '../../wording/words.ts';
import { type Reply, reply } from '../reply.ts';

/** Which records were asked for. `atLeast` says that there are more than were counted. */
export type RecordsAsked = {
  readonly ticker: string | null;
  readonly since: Day | null;
  readonly atLeast: boolean;
};

const mostListed = 10;

const lineOf = ({ id, question, askedAtMs }: RecordLine, timeZone: string): string =>
  `${instantInWords(askedAtMs, timeZone)}  ${id}  ${question}`;

/** The answers on record, the newest first. */
export const recordsReply = (
  lines: readonly RecordLine[],
  { ticker, since, atLeast }: RecordsAsked,
  timeZone: string,
): Reply => {
  const about = `${ticker === null ? '' : ` about ${ticker}`}${since === null ? '' : ` since ${isoFromDay(since)}`}`;
  if (lines.length === 0) return reply('record', `No answer is on record${about}.`);
  const shown = lines.slice(0, mostListed);
  const count = `${atLeast ? 'At least ' : ''}${counted(lines.length, 'answer')}`;
  const newest = shown.length < lines.length ? `; the newest ${shown.length} are listed` : '';
  return reply('record', `${count} on record${about}${newest}.`, {
    passages: [{ head: null, lines: shown.map((line) => lineOf(line, timeZone)) }],
  });
};

const mostFaults = 10;
const shownHash = 16;

/** What an examination of the records found. */
export const examinationReply = ({ answers, askings, deletions, head, faults }: RecordExamination): Reply => {
  const counts = `${counted(answers, 'answer')}, asked ${counted(askings, 'time')}, and the traces of ${counted(deletions, 'deletion')}`;
  const more = faults.length - mostFaults;
  const chain = `The chain ends in ${head.slice(0, shownHash)}`;
  if (faults.length === 0) return reply('record', `The records are whole: ${counts}.`, { quietLine: chain });
  return reply('record', `The records are not whole: ${counted(faults.length, 'fault')} in ${counts}.`, {
    passages: [
      {
        head: 'What is wrong',
        lines: [...faults.slice(0, mostFaults), ...(more > 0 ? [`and ${digits(more, 0)} more`] : [])],
      },
    ],
    quietLine: chain,
  });
};
