import type { Kysely } from 'kysely';
import type {
  RecordEntry,
  RecordedAnswer,
  RecordedAsking,
  RecordFilter,
  RecordLine,
} from '../terms/records.ts';
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

/** The askings that a filter lets through, with the content of their answers. */
const asked = (db: Kysely<Tables>, { ticker, sinceMs }: RecordFilter) => {
  let query = db
    .selectFrom('askings')
    .innerJoin('answers', 'answers.id', 'askings.answer_id')
    .selectAll('askings');
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
  return query;
};

/** The newest askings first, at most so many. */
export const list = async (
  db: Kysely<Tables>,
  filter: RecordFilter,
  most: number,
): Promise<readonly RecordLine[]> => {
  const rows = await asked(db, filter)
    .select(['answers.verb', 'answers.question'])
    .orderBy('asked_at_ms', 'desc')
    .orderBy('askings.number', 'desc')
    .limit(most)
    .execute();
  return rows.map(({ verb, question, ...row }) => {
    const { askedAtMs, place, from } = askingOf(row);
    return { id: row.answer_id, verb, question, askedAtMs, place, from };
  });
};

const tickersOf = async (db: Kysely<Tables>, answerId: string): Promise<readonly string[]> => {
  const rows = await db
    .selectFrom('answer_series')
    .select('ticker')
    .where('answer_id', '=', answerId)
    .orderBy('place')
    .execute();
  return rows.map(({ ticker }) => ticker);
};

/** Whole entries in the order in which they were kept, from after a number on, at most so many. */
export const page = async (
  db: Kysely<Tables>,
  filter: RecordFilter,
  afterNumber: number,
  most: number,
): Promise<readonly RecordEntry[]> => {
  const rows = await asked(db, filter)
    .select(['content', 'verb', 'question', 'as_of', 'method_version', 'body'])
    .where('askings.number', '>', afterNumber)
    .orderBy('askings.number')
    .limit(most)
    .execute();
  const entries: RecordEntry[] = [];
  for (const row of rows)
    entries.push({
      number: row.number,
      ids: await idsOf(db, row.answer_id),
      content: row.content,
      verb: row.verb,
      question: row.question,
      asOf: row.as_of,
      methodVersion: row.method_version,
      body: row.body,
      tickers: await tickersOf(db, row.answer_id),
      asking: askingOf(row),
    });
  return entries;
};
