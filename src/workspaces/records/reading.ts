import { problem } from '../../terms/problem.ts';
import {
  type AskedFrom,
  askedFromNowhere,
  type RecordEntry,
  type RecordExamination,
  type RecordFilter,
  type RecordLine,
} from '../../terms/records.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import type { OnRecord, RecordStore } from './ports.ts';

/** Who wants to read a record, and where what they read will be seen. */
export type Reader = { readonly place: string; readonly from: AskedFrom };

/** Whoever runs the bot and reads its file. */
export const operator: Reader = { place: 'operator', from: askedFromNowhere };

/** Whether a reader may see what was asked there: the one place that decides it. Everybody may, for now. */
export const mayRead = (_reader: Reader, _record: Pick<RecordLine, 'place' | 'from'>): boolean => true;

/** Said of an id that does not exist and of one that may not be read, so that neither tells of the other. */
export const noSuchRecord = (id: string): Refusal =>
  refuse(
    problem(
      'unknownRecord',
      `There is no answer ${id} on record that can be shown here. The id stands below each answer; records lists them.`,
      { suggestion: 'records' },
    ),
  );

/** The record that an id names, with those of its askings that the reader may see. */
export const readRecord = async (
  store: RecordStore,
  reader: Reader,
  id: string,
): Promise<Result<OnRecord>> => {
  const found = await store.find(id);
  if (!found.ok) return found;
  const askings = (found.value?.askings ?? []).filter((asking) => mayRead(reader, asking));
  return found.value === null || askings.length === 0
    ? noSuchRecord(id)
    : succeed({ answer: found.value.answer, askings });
};

/** What was asked, the newest first, of at most so many askings those that the reader may see. */
export const readLines = async (
  store: RecordStore,
  reader: Reader,
  filter: RecordFilter,
  most: number,
): Promise<Result<readonly RecordLine[]>> => {
  const lines = await store.list(filter, most);
  return lines.ok ? succeed(lines.value.filter((line) => mayRead(reader, line))) : lines;
};

/** Whole entries for a reader: those of a page that they may see. */
export const readable = (reader: Reader, entries: readonly RecordEntry[]): readonly RecordEntry[] =>
  entries.filter(({ asking }) => mayRead(reader, asking));

/** Counts and hashes only: an examination shows no record to anybody. */
export const examine = (store: RecordStore): Promise<Result<RecordExamination>> => store.verify();
