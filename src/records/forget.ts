import type { Kysely, Transaction } from 'kysely';
import type { InstantMs } from '../terms/clock.ts';
import type { Tables } from './database.ts';
import { appendEntry, lockChain } from './internal/chain.ts';

const deletedAtOnce = 200;

/** What vouched for a row goes on standing in the chain; this says that the row was taken out on purpose. */
const noteDeletion = (change: Transaction<Tables>, number: number) =>
  appendEntry(change, 'deletion', String(number), '');

const deleteUnasked = async (change: Transaction<Tables>): Promise<void> => {
  const unasked = await change
    .selectFrom('answers')
    .select(['id', 'number'])
    .where(({ not, exists, selectFrom }) =>
      not(exists(selectFrom('askings').select('askings.number').whereRef('answer_id', '=', 'answers.id'))),
    )
    .execute();
  for (const { id, number } of unasked) {
    await noteDeletion(change, number);
    await change.deleteFrom('answer_ids').where('answer_id', '=', id).execute();
    await change.deleteFrom('answer_series').where('answer_id', '=', id).execute();
    await change.deleteFrom('answers').where('id', '=', id).execute();
  }
  await change
    .deleteFrom('price_columns')
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(selectFrom('answer_series').select('place').whereRef('prices', '=', 'price_columns.digest')),
      ),
    )
    .execute();
};

const forgetSome = (db: Kysely<Tables>, beforeMs: InstantMs): Promise<number> =>
  db.transaction().execute(async (change) => {
    await lockChain(change);
    const old = await change
      .selectFrom('askings')
      .select('number')
      .where('asked_at_ms', '<', beforeMs)
      .orderBy('number')
      .limit(deletedAtOnce)
      .execute();
    for (const { number } of old) {
      await noteDeletion(change, number);
      await change.deleteFrom('askings').where('number', '=', number).execute();
    }
    if (old.length > 0) await deleteUnasked(change);
    return old.length;
  });

/**
 * Deletes what was asked before an instant, the answers that nobody asked for since, and the prices that no answer rests
 * on any more; the number of askings deleted. The chain keeps a trace of each.
 */
export const forgetBefore = async (db: Kysely<Tables>, beforeMs: InstantMs): Promise<number> => {
  let forgotten = 0;
  for (;;) {
    const some = await forgetSome(db, beforeMs);
    forgotten += some;
    if (some < deletedAtOnce) return forgotten;
  }
};
