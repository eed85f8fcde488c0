import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import pg from 'pg';
import { openPostgres } from '../../src/records/openPostgres.ts';
import { openSqlite } from '../../src/records/openSqlite.ts';
import type { PostgresServer } from '../contracts/postgres.ts';
import { accepted } from '../laws/outcomes.ts';
import type { Place } from './morning.ts';

const unsettledIn = (table: string) =>
  `select count(*) as left_over from ${table} where settled_at_ms is null`;
const tables = ['inbox', 'deliveries'] as const;

/** Records in a new SQLite file. */
export const sqlitePlace = async (): Promise<Place> => {
  const folder = mkdtempSync(join(tmpdir(), 'leadsman-kills-'));
  const path = join(folder, 'records.db');
  await accepted(await openSqlite(path)).close();
  const query = (text: string): number => {
    const database = new Database(path, { readonly: true });
    const { left_over } = database.prepare<[], { left_over: number }>(text).get() ?? { left_over: 0 };
    database.close();
    return left_over;
  };
  return {
    path,
    url: null,
    unsettled: async () => tables.map((table) => query(unsettledIn(table))).reduce((sum, one) => sum + one),
    lock: async () => {
      const database = new Database(path, { timeout: 5_000 });
      database.exec('BEGIN IMMEDIATE');
      return async () => {
        database.exec('ROLLBACK');
        database.close();
      };
    },
    leave: async () => rmSync(folder, { recursive: true, force: true }),
  };
};

/** Records in an empty schema of a PostgreSQL server. */
export const postgresPlace = async (server: PostgresServer): Promise<Place> => {
  const url = await server.emptyUrl();
  await accepted(await openPostgres(url)).close();
  const connected = async (): Promise<pg.Client> => {
    const client = new pg.Client({ connectionString: url });
    await client.connect();
    return client;
  };
  const watching = await connected();
  return {
    path: null,
    url,
    unsettled: async () => {
      let left = 0;
      for (const table of tables)
        left += Number((await watching.query(unsettledIn(table))).rows[0]?.left_over);
      return left;
    },
    lock: async () => {
      const client = await connected();
      await client.query(`begin; lock table ${tables.join(', ')} in access exclusive mode`);
      return async () => {
        await client.query('rollback');
        await client.end();
      };
    },
    leave: () => watching.end(),
  };
};
