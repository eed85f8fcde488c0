import type { Database } from './connection.ts';
import { answersOnRecord } from './migrations/1-answers.ts';
import { inboxAndDeliveries } from './migrations/2-inboxAndDeliveries.ts';
import { digestsAndWatches } from './migrations/3-subscriptions.ts';
import { askingsByPlace } from './migrations/4-askingsByPlace.ts';
import { pinsAndMoves } from './migrations/5-pins.ts';
import type { ColumnTypes, Migration } from './migrations/migration.ts';

/** In the order in which they are made; a migration that was ever released is never changed. */
export const migrations: readonly Migration[] = [
  answersOnRecord,
  inboxAndDeliveries,
  digestsAndWatches,
  askingsByPlace,
  pinsAndMoves,
];

const versionOf = async (db: Database): Promise<number> => {
  await db.schema
    .createTable('schema_versions')
    .ifNotExists()
    .addColumn('version', 'integer', (column) => column.primaryKey())
    .execute();
  const { version } = await db
    .selectFrom('schema_versions')
    .select(({ fn }) => fn.max('version').as('version'))
    .executeTakeFirstOrThrow();
  return version ?? 0;
};

/** A store that a newer version of the program has made over. */
export class StoreTooNew extends Error {}

/** Notes a version first, which makes other starts wait; whether it was this start that noted it. */
const claimed = async (change: Database, version: number): Promise<boolean> => {
  const { numInsertedOrUpdatedRows } = await change
    .insertInto('schema_versions')
    .values({ version })
    .onConflict((conflict) => conflict.column('version').doNothing())
    .executeTakeFirstOrThrow();
  return numInsertedOrUpdatedRows === 1n;
};

/**
 * Brings the tables to this version of the program. Each migration and the note that it was made are one transaction:
 * whatever interrupts them, the next start goes on where the last one ended, and of several starts at once one makes it.
 */
export const migrate = async (db: Database, types: ColumnTypes): Promise<void> => {
  const made = await versionOf(db);
  if (made > migrations.length)
    throw new StoreTooNew(
      `the records are of version ${made}, and this program knows up to ${migrations.length}`,
    );
  for (const [index, migration] of migrations.entries()) {
    if (index < made) continue;
    await db.transaction().execute(async (change) => {
      if (await claimed(change, index + 1)) await migration(change, types);
    });
  }
};
