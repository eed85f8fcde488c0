import type { SchemaModule } from 'kysely';
import { sql } from 'kysely';
import { emptyHead } from '../internal/chain.ts';
import type { ColumnTypes, Migration } from './migration.ts';

const priceColumns = (schema: SchemaModule, { bytes }: ColumnTypes) =>
  schema
    .createTable('price_columns')
    .addColumn('digest', 'text', (column) => column.primaryKey())
    .addColumn('ticker', 'text', (column) => column.notNull())
    .addColumn('price_count', 'integer', (column) => column.notNull())
    .addColumn('packed', sql.raw(bytes), (column) => column.notNull())
    .execute();

const answers = async (schema: SchemaModule) => {
  const columns = ['content', 'verb', 'question', 'as_of', 'method_version', 'body'] as const;
  const table = schema
    .createTable('answers')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('number', 'integer', (column) => column.notNull().unique());
  await columns
    .reduce((made, name) => made.addColumn(name, 'text', (column) => column.notNull()), table)
    .execute();
  await schema
    .createTable('answer_ids')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('answer_id', 'text', (column) => column.notNull().references('answers.id'))
    .addColumn('place', 'integer', (column) => column.notNull())
    .execute();
  await schema
    .createTable('answer_series')
    .addColumn('answer_id', 'text', (column) => column.notNull().references('answers.id'))
    .addColumn('place', 'integer', (column) => column.notNull())
    .addColumn('ticker', 'text', (column) => column.notNull())
    .addColumn('prices', 'text', (column) => column.notNull().references('price_columns.digest'))
    .addColumn('about', 'text', (column) => column.notNull())
    .addPrimaryKeyConstraint('answer_series_key', ['answer_id', 'place'])
    .execute();
};

const askings = async (schema: SchemaModule) => {
  const from = ['team', 'channel', 'person', 'message', 'thread'] as const;
  const said = ['words', 'reply_text', 'bot_version', 'node_version', 'settings_hash'] as const;
  const table = schema
    .createTable('askings')
    .addColumn('number', 'integer', (column) => column.primaryKey())
    .addColumn('answer_id', 'text', (column) => column.notNull().references('answers.id'))
    .addColumn('asked_at_ms', 'bigint', (column) => column.notNull())
    .addColumn('place', 'text', (column) => column.notNull());
  const withFrom = from.reduce((made, name) => made.addColumn(name, 'text'), table);
  await said
    .reduce((made, name) => made.addColumn(name, 'text', (column) => column.notNull()), withFrom)
    .execute();
};

const chain = async (schema: SchemaModule) => {
  const texts = ['kind', 'subject', 'digest', 'previous', 'hash'] as const;
  const table = schema.createTable('chain').addColumn('number', 'integer', (column) => column.primaryKey());
  await texts
    .reduce((made, name) => made.addColumn(name, 'text', (column) => column.notNull()), table)
    .execute();
  await schema
    .createTable('chain_head')
    .addColumn('name', 'text', (column) => column.primaryKey())
    .addColumn('length', 'integer', (column) => column.notNull())
    .addColumn('hash', 'text', (column) => column.notNull())
    .execute();
};

const lookUps = async (schema: SchemaModule) => {
  await schema.createIndex('askings_by_instant').on('askings').column('asked_at_ms').execute();
  await schema.createIndex('askings_by_answer').on('askings').column('answer_id').execute();
  await schema.createIndex('answer_ids_by_answer').on('answer_ids').column('answer_id').execute();
  await schema.createIndex('answer_series_by_ticker').on('answer_series').column('ticker').execute();
  await schema.createIndex('answer_series_by_prices').on('answer_series').column('prices').execute();
};

export const answersOnRecord: Migration = async (db, types) => {
  await priceColumns(db.schema, types);
  await answers(db.schema);
  await askings(db.schema);
  await chain(db.schema);
  await lookUps(db.schema);
  await db.insertInto('chain_head').values({ name: 'head', length: 0, hash: emptyHead }).execute();
};
