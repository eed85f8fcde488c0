import { closeSync, mkdirSync, openSync, renameSync } from 'node:fs';
import { dirname } from 'node:path';
import Database from 'better-sqlite3';
import { type Driver, Kysely, SqliteDialect } from 'kysely';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { type Connection, storeProblem } from './connection.ts';
import type { Tables } from './database.ts';
import { migrate } from './migrations.ts';
import { makeStore, type Store } from './store.ts';

/** The driver waits on this thread, so a store locked by another process must not hold answers up for long. */
const lockWaitMs = 250;

const inMemory = ':memory:';

/** A new file is for its owner alone: it holds what people asked. */
const makeFile = (path: string): void => {
  mkdirSync(dirname(path), { recursive: true });
  closeSync(openSync(path, 'a', 0o600));
};

/** WAL lets readers go on beside a writer; FULL makes what was kept survive a loss of power. */
const prepare = (database: Database.Database): void => {
  database.pragma('journal_mode = WAL');
  database.pragma('synchronous = FULL');
  database.pragma('foreign_keys = ON');
};

/** A full disk ends a transaction by itself, and to end it again would fail and hide the reason. */
class Dialect extends SqliteDialect {
  readonly #database: Database.Database;

  constructor(database: Database.Database) {
    super({ database });
    this.#database = database;
  }

  override createDriver(): Driver {
    const driver = super.createDriver();
    const rollBack = driver.rollbackTransaction.bind(driver);
    driver.rollbackTransaction = async (connection) => {
      if (this.#database.inTransaction) await rollBack(connection);
    };
    return driver;
  }
}

/** The copy takes its name once it is whole, so that a copy cut short never replaces the one before. */
const copyTo = async (database: Database.Database, path: string): Promise<void> => {
  const unfinished = `${path}.new`;
  makeFile(unfinished);
  await database.backup(unfinished);
  renameSync(unfinished, path);
};

/** Opens an SQLite file, which is made where there is none, or `null`: a database in memory. */
export const connectSqlite = async (path: string | null): Promise<Result<Connection>> => {
  let database: Database.Database | null = null;
  try {
    if (path !== null) makeFile(path);
    const opened = new Database(path ?? inMemory, { timeout: lockWaitMs });
    database = opened;
    prepare(opened);
    const db = new Kysely<Tables>({ dialect: new Dialect(opened) });
    await migrate(db, { bytes: 'blob' });
    return succeed({ db, copyTo: (to) => copyTo(opened, to), close: () => db.destroy() });
  } catch (error) {
    database?.close();
    return refuse(storeProblem(error));
  }
};

/** The store in an SQLite file, or in memory. */
export const openSqlite = async (path: string | null): Promise<Result<Store>> => {
  const connected = await connectSqlite(path);
  return connected.ok ? succeed(makeStore(connected.value)) : connected;
};
