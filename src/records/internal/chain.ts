import type { Transaction } from 'kysely';
import type { EntryKind, Tables } from '../database.ts';
import { entryHash } from './digest.ts';

/**
 * The first statement of every change. It takes the database’s lock for writing before anything is read, so two writers
 * stand in line instead of building on the same head.
 */
export const lockChain = async (change: Transaction<Tables>): Promise<void> => {
  await change
    .updateTable('chain_head')
    .set(({ ref }) => ({ length: ref('length') }))
    .where('name', '=', 'head')
    .execute();
};

const takeNumber = (change: Transaction<Tables>) =>
  change
    .updateTable('chain_head')
    .set(({ eb }) => ({ length: eb('length', '+', 1) }))
    .where('name', '=', 'head')
    .returning(['length as number', 'hash as previous'])
    .executeTakeFirstOrThrow();

/** Adds an entry at the end of the chain; its number. `digest` vouches for the row that the entry is about. */
export const appendEntry = async (
  change: Transaction<Tables>,
  kind: EntryKind,
  subject: string,
  digest: string,
): Promise<number> => {
  const { number, previous } = await takeNumber(change);
  const entry = { number, kind, subject, digest, previous };
  const hash = entryHash(entry);
  await change
    .insertInto('chain')
    .values({ ...entry, hash })
    .execute();
  await change.updateTable('chain_head').set({ hash }).where('name', '=', 'head').execute();
  return number;
};

/** What the chain begins on. */
export const emptyHead = '0'.repeat(64);
