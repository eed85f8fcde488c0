import type { InstantMs } from '../terms/clock.ts';
import type {
  RecordEntry,
  RecordExamination,
  RecordedAnswer,
  RecordedAsking,
  RecordFilter,
  RecordLine,
} from '../terms/records.ts';
import type { Result } from '../terms/result.ts';
import type { Access } from './connection.ts';
import { type Found, find, list, page } from './find.ts';
import { forgetBefore } from './forget.ts';
import { contentOf, keep } from './keep.ts';
import { verify } from './verify.ts';

/** The answers on record and their askings, with the chain that vouches for them. */
export type AnswerStore = {
  /** The content that is on record under an id; null where the id is free. */
  readonly contentOf: (id: string) => Promise<Result<string | null>>;
  /** Keeps the answer, unless it is on record already, and that it was given. All of it or nothing. */
  readonly keep: (answer: RecordedAnswer, asking: RecordedAsking) => Promise<Result<null>>;
  readonly find: (id: string) => Promise<Result<Found | null>>;
  /** The newest askings first, at most so many. */
  readonly list: (filter: RecordFilter, most: number) => Promise<Result<readonly RecordLine[]>>;
  /** Whole entries in the order in which they were kept, from after a number on, at most so many. */
  readonly page: (
    filter: RecordFilter,
    afterNumber: number,
    most: number,
  ) => Promise<Result<readonly RecordEntry[]>>;
  readonly verify: () => Promise<Result<RecordExamination>>;
  /** Deletes what was asked before an instant and nobody asked since; the number of askings deleted. */
  readonly forgetBefore: (beforeMs: InstantMs) => Promise<Result<number>>;
};

export const answerStore = ({ read, write }: Access): AnswerStore => ({
  contentOf: (id) => read((db) => contentOf(db, id)),
  keep: (answer, asking) =>
    write(async (db) => {
      await keep(db, answer, asking);
      return null;
    }),
  find: (id) => read((db) => find(db, id)),
  list: (filter, most) => read((db) => list(db, filter, most)),
  page: (filter, afterNumber, most) => read((db) => page(db, filter, afterNumber, most)),
  verify: () => read(verify),
  forgetBefore: (beforeMs) => write((db) => forgetBefore(db, beforeMs)),
});
