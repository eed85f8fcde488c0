import type { Kysely, Transaction } from 'kysely';
import type { RecordedAnswer, RecordedAsking } from '../terms/records.ts';
import type { Tables } from './database.ts';
import { appendEntry, lockChain } from './internal/chain.ts';
import { answerDigest, askingDigest } from './internal/digest.ts';
import { answerRow, askingRow, packSeries } from './internal/rows.ts';

const insertAnswer = async (change: Transaction<Tables>, answer: RecordedAnswer): Promise<void> => {
  const row = answerRow(answer);
  const packed = answer.series.map(packSeries);
  const series = packed.map(({ prices, about }) => ({ ticker: prices.ticker, prices: prices.digest, about }));
  const number = await appendEntry(change, 'answer', row.id, answerDigest(row, answer.ids, series));
  await change
    .insertInto('answers')
    .values({ ...row, number })
    .execute();
  await change
    .insertInto('answer_ids')
    .values(answer.ids.map((id, place) => ({ id, answer_id: row.id, place })))
    .execute();
  for (const [place, { prices }] of packed.entries()) {
    // the same prices serve every answer that was made from them
    await change
      .insertInto('price_columns')
      .values(prices)
      .onConflict((conflict) => conflict.column('digest').doNothing())
      .execute();
    const own = series[place];
    if (own !== undefined)
      await change
        .insertInto('answer_series')
        .values({ ...own, answer_id: row.id, place })
        .execute();
  }
};

/** The content that is on record under an id; null where the id is free. */
export const contentOf = async (db: Kysely<Tables>, id: string): Promise<string | null> => {
  const row = await db
    .selectFrom('answer_ids')
    .innerJoin('answers', 'answers.id', 'answer_ids.answer_id')
    .select('answers.content')
    .where('answer_ids.id', '=', id)
    .executeTakeFirst();
  return row?.content ?? null;
};

/** Keeps the answer, unless it is on record already, and that it was given. All of it or nothing. */
export const keep = (db: Kysely<Tables>, answer: RecordedAnswer, asking: RecordedAsking): Promise<void> =>
  db.transaction().execute(async (change) => {
    await lockChain(change);
    const [id] = answer.ids;
    const row = askingRow(id, asking);
    const digest = askingDigest(row);
    const known = await change
      .selectFrom('answers')
      .select('content')
      .where('id', '=', id)
      .executeTakeFirst();
    if (known === undefined) await insertAnswer(change, answer);
    else if (known.content !== answer.content) throw new Error(`keep: ${id} is on record with other content`);
    const number = await appendEntry(change, 'asking', id, digest);
    await change
      .insertInto('askings')
      .values({ ...row, number })
      .execute();
  });
