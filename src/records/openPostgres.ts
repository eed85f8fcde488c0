import { Kysely, PostgresDialect, sql } from 'kysely';
import pg from 'pg';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { type Connection, storeProblem } from './connection.ts';
import type { Tables } from './database.ts';
import { masked } from './internal/maskedUrl.ts';
import { migrate } from './migrations.ts';
import { makeStore, type Store } from './store.ts';

const mostConnections = 8;
const connectWithinMs = 3_000;
/** A statement that waits longer than this, for a lock or for the server, fails and can be tried anew. */
const statementWithinMs = 10_000;

/** Any number that no other program takes on the same database; it stands for "tables of Leadsman are being made". */
const migrationLock = 1_279_607_380;

/** Whole numbers of 64 bits arrive as text by default; ours are instants in milliseconds, which a number holds. */
const readTypes: pg.CustomTypesConfig = {
  getTypeParser: (type, format) =>
    type === pg.types.builtins.INT8 ? Number : pg.types.getTypeParser(type, format ?? 'text'),
};

/** Several copies that start at once make the tables one after the other. */
const migrateAlone = (db: Kysely<Tables>): Promise<void> =>
  db.connection().execute(async (one) => {
    await sql`select pg_advisory_lock(${migrationLock}::bigint)`.execute(one);
    try {
      await migrate(one, { bytes: 'bytea' });
    } finally {
      await sql`select pg_advisory_unlock(${migrationLock}::bigint)`.execute(one);
    }
  });

const noCopy = async (): Promise<never> => {
  throw new Error('these records are in PostgreSQL, which has its own way to be copied: run pg_dump there');
};

/** Opens a PostgreSQL database by its address, which may hold a password and is shown nowhere. */
export const connectPostgres = async (url: string): Promise<Result<Connection>> => {
  const pool = new pg.Pool({
    connectionString: url,
    max: mostConnections,
    connectionTimeoutMillis: connectWithinMs,
    statement_timeout: statementWithinMs,
    query_timeout: 2 * statementWithinMs,
    types: readTypes,
  });
  // a connection that breaks is replaced at the next use; where a statement was under way, that fails and says why
  pool.on('error', () => {});
  pool.on('connect', (client) => client.on('error', () => {}));
  const db = new Kysely<Tables>({ dialect: new PostgresDialect({ pool }) });
  try {
    await migrateAlone(db);
    return succeed({ db, copyTo: noCopy, close: () => db.destroy() });
  } catch (error) {
    await db.destroy();
    return refuse(masked(storeProblem(error), url));
  }
};

/** The store in a PostgreSQL database. */
export const openPostgres = async (url: string): Promise<Result<Store>> => {
  const connected = await connectPostgres(url);
  return connected.ok ? succeed(makeStore(connected.value)) : connected;
};
