import { problem } from '../../terms/problem.ts';
import type { RecordEntry, RecordExamination, RecordFilter, RecordLine } from '../../terms/records.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import type { Asker, Permissions } from '../permissions.ts';
import type { OnRecord, RecordStore } from './ports.ts';

/** Records, and who may read which: every way to a record goes through the functions of this file. */
export type Reading = {
  readonly store: RecordStore;
  readonly permissions: Pick<Permissions, 'mayRead'>;
};

/** Who wants to read a record. */
export type Reader = Asker;

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
  { store, permissions }: Reading,
  reader: Asker,
  id: string,
): Promise<Result<OnRecord>> => {
  const found = await store.find(id);
  if (!found.ok) return found;
  if (found.value === null) return noSuchRecord(id);
  const { answer, askings: all } = found.value;
  const askings = all.filter(({ place, from }) =>
    permissions.mayRead(reader, { verb: answer.verb, place, from }),
  );
  return askings.length === 0 ? noSuchRecord(id) : succeed({ answer, askings });
};

/** What was asked, the newest first, of at most so many askings those that the reader may see. */
export const readLines = async (
  { store, permissions }: Reading,
  reader: Asker,
  filter: RecordFilter,
  most: number,
): Promise<Result<readonly RecordLine[]>> => {
  const lines = await store.list(filter, most);
  return lines.ok ? succeed(lines.value.filter((line) => permissions.mayRead(reader, line))) : lines;
};

/** Whole entries for a reader: those of a page that they may see. */
export const readable = (
  permissions: Reading['permissions'],
  reader: Asker,
  entries: readonly RecordEntry[],
): readonly RecordEntry[] =>
  entries.filter(({ verb, asking: { place, from } }) => permissions.mayRead(reader, { verb, place, from }));

/** Counts and hashes only: an examination shows no record to anybody. */
export const examine = (store: RecordStore): Promise<Result<RecordExamination>> => store.verify();
