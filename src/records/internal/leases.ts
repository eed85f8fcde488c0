import { type ExpressionBuilder, sql } from 'kysely';
import type { InstantMs } from '../../terms/clock.ts';
import type { Lease } from '../../terms/delivery.ts';
import type { Database } from '../connection.ts';
import type { Tables } from '../database.ts';

type Leased = 'inbox' | 'deliveries' | 'subscription_claims';

/** Nobody has it, nobody any more, or this very holder. */
export const isFree =
  (holder: string, nowMs: InstantMs) =>
  <T extends Leased>(eb: ExpressionBuilder<Tables, T>) =>
    eb.or([
      eb(sql<string | null>`holder`, 'is', null),
      eb(sql<string>`holder`, '=', holder),
      eb(sql<number>`lease_until_ms`, '<', nowMs),
    ]);

/** Goes on holding what is under way, for as long as nobody else has taken it. */
export const renew = async (
  db: Database,
  table: Leased,
  keys: readonly string[],
  { holder, untilMs }: Lease,
): Promise<void> => {
  if (keys.length === 0) return;
  await db
    .updateTable(table)
    .set({ lease_until_ms: untilMs })
    .where('holder', '=', holder)
    .where('settled_at_ms', 'is', null)
    .where('key', 'in', [...keys])
    .execute();
};

/** Lets others take what this holder does not deal with any more. */
export const release = async (db: Database, table: Leased, holder: string): Promise<void> => {
  await db
    .updateTable(table)
    .set({ holder: null, lease_until_ms: 0 })
    .where('holder', '=', holder)
    .where('settled_at_ms', 'is', null)
    .execute();
};
