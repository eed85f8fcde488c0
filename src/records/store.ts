import type { Kysely } from 'kysely';
import type { InstantMs } from '../terms/clock.ts';
import { problem } from '../terms/problem.ts';
import type {
  RecordEntry,
  RecordExamination,
  RecordedAnswer,
  RecordedAsking,
  RecordFilter,
  RecordLine,
} from '../terms/records.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Tables } from './database.ts';
import { type Found, find, list, page } from './find.ts';
import { forgetBefore } from './forget.ts';
import { contentOf, keep } from './keep.ts';
import { verify } from './verify.ts';

/** The records. Whatever the machinery beneath does wrong comes back as a problem, never as an exception. */
export type Store = {
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
  /** Writes a whole copy to a file while the store goes on. */
  readonly backUp: (path: string) => Promise<Result<null>>;
  readonly close: () => Promise<void>;
};

export const storeProblem = (error: unknown) =>
  problem(
    'storeUnavailable',
    `The store of records cannot be used: ${error instanceof Error ? error.message : String(error)}. ` +
      'The operator has to look at its file.',
  );

const guarded = async <T>(run: () => Promise<T>): Promise<Result<T>> => {
  try {
    return succeed(await run());
  } catch (error) {
    return refuse(storeProblem(error));
  }
};

export const makeStore = (db: Kysely<Tables>, copyTo: (path: string) => Promise<unknown>): Store => ({
  contentOf: (id) => guarded(() => contentOf(db, id)),
  keep: (answer, asking) =>
    guarded(async () => {
      await keep(db, answer, asking);
      return null;
    }),
  find: (id) => guarded(() => find(db, id)),
  list: (filter, most) => guarded(() => list(db, filter, most)),
  page: (filter, afterNumber, most) => guarded(() => page(db, filter, afterNumber, most)),
  verify: () => guarded(() => verify(db)),
  forgetBefore: (beforeMs) => guarded(() => forgetBefore(db, beforeMs)),
  backUp: (path) =>
    guarded(async () => {
      await copyTo(path);
      return null;
    }),
  close: () => db.destroy(),
});
