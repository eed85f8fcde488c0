import type { Kysely } from 'kysely';
import type { RecordedAnswer, RecordedAsking, RecordFilter, RecordLine } from '../terms/records.ts';
import type { Tables } from './database.ts';
import { askingOf, unpackSeries } from './internal/rows.ts';

const idsOf = async (db: Kysely<Tables>, answerId: string): Promise<RecordedAnswer['ids']> => {
  const rows = await db
    .selectFrom('answer_ids')
    .select('id')
    .where('answer_id', '=', answerId)
    .orderBy('place')
    .execute();
  return [answerId, ...rows.slice(1).map(({ id }) => id)];
};

const seriesOf = async (db: Kysely<Tables>, answerId: string) => {
  const rows = await db
    .selectFrom('answer_series')
    .innerJoin('price_columns', 'price_columns.digest', 'answer_series.prices')
    .select(['answer_series.ticker', 'answer_series.about', 'price_columns.packed'])
    .where('answer_id', '=', answerId)
    .orderBy('place')
    .execute();
  return rows.map(({ ticker, about, packed }) => unpackSeries(ticker, about, packed));
};

/** An answer with every time that it was given, the first first. */
export type Found = { readonly answer: RecordedAnswer; readonly askings: readonly RecordedAsking[] };

/** The record that an id names; null where there is none. */
export const find = async (db: Kysely<Tables>, id: string): Promise<Found | null> => {
  const row = await db
    .selectFrom('answer_ids')
    .innerJoin('answers', 'answers.id', 'answer_ids.answer_id')
    .selectAll('answers')
    .where('answer_ids.id', '=', id)
    .executeTakeFirst();
  if (row === undefined) return null;
  const askings = await db
    .selectFrom('askings')
    .selectAll()
    .where('answer_id', '=', row.id)
    .orderBy('number')
    .execute();
  const answer = {
    ids: await idsOf(db, row.id),
    content: row.content,
    verb: row.verb,
    question: row.question,
    asOf: row.as_of,
    methodVersion: row.method_version,
    body: row.body,
    series: await seriesOf(db, row.id),
  };
  return { answer, askings: askings.map(askingOf) };
};

/** The newest askings first, at most so many. */
export const list = async (
  db: Kysely<Tables>,
  { ticker, sinceMs }: RecordFilter,
  most: number,
): Promise<readonly RecordLine[]> => {
  let query = db
    .selectFrom('askings')
    .innerJoin('answers', 'answers.id', 'askings.answer_id')
    .selectAll('askings')
    .select('answers.question');
  if (sinceMs !== null) query = query.where('asked_at_ms', '>=', sinceMs);
  if (ticker !== null)
    query = query.where(({ exists, selectFrom }) =>
      exists(
        selectFrom('answer_series')
          .select('place')
          .whereRef('answer_series.answer_id', '=', 'answers.id')
          .where('answer_series.ticker', '=', ticker),
      ),
    );
  const rows = await query
    .orderBy('asked_at_ms', 'desc')
    .orderBy('askings.number', 'desc')
    .limit(most)
    .execute();
  return rows.map(({ question, ...row }) => {
    const { askedAtMs, place, from } = askingOf(row);
    return { id: row.answer_id, question, askedAtMs, place, from };
  });
};
