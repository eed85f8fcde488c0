import type { Kysely } from 'kysely';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Tables } from './database.ts';

export type Database = Kysely<Tables>;

/** An open database, brought to this version of the program. */
export type Connection = {
  readonly db: Database;
  /** Writes a whole copy to a file while the database is in use. */
  readonly copyTo: (path: string) => Promise<void>;
  readonly close: () => Promise<void>;
};

/** Does a piece of work on the database. Whatever goes wrong there comes back as a problem, never as an exception. */
export type Run = <T>(work: (db: Database) => Promise<T>) => Promise<Result<T>>;

/** The two are apart because a full or locked store can still be read: what is read says nothing of writing. */
export type Access = { readonly read: Run; readonly write: Run };

export const storeProblem = (error: unknown) =>
  problem(
    'storeUnavailable',
    `The store of records cannot be used: ${error instanceof Error ? error.message : String(error)}. ` +
      'The operator has to look at it.',
  );

const guarded =
  (db: Database): Run =>
  async (work) => {
    try {
      return succeed(await work(db));
    } catch (error) {
      return refuse(storeProblem(error));
    }
  };

export const accessTo = ({ db }: Pick<Connection, 'db'>): Access => {
  const run = guarded(db);
  return { read: run, write: run };
};
