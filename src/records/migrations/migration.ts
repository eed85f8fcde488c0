import type { Database } from '../connection.ts';

/** The few types whose names differ between databases. */
export type ColumnTypes = { readonly bytes: 'blob' | 'bytea' };

/** One step of the tables. It runs in a transaction of its own; one that was released is never changed. */
export type Migration = (db: Database, types: ColumnTypes) => Promise<void>;
