import type { CreateTableBuilder, SchemaModule } from 'kysely';
import type { Migration } from './migration.ts';

const subscriptions = (schema: SchemaModule) => {
  const given = ['team', 'id', 'kind', 'owner', 'place', 'channel', 'questions', 'body'] as const;
  const empty: CreateTableBuilder<string, string> = schema.createTable('subscriptions');
  const table = given.reduce(
    (made, name) => made.addColumn(name, 'text', (column) => column.notNull()),
    empty,
  );
  return table
    .addColumn('number', 'integer', (column) => column.notNull())
    .addColumn('schedule', 'text')
    .addColumn('state', 'text', (column) => column.notNull())
    .addColumn('paused_why', 'text')
    .addColumn('revision', 'integer', (column) => column.notNull())
    .addColumn('created_at_ms', 'bigint', (column) => column.notNull())
    .addColumn('next_due_ms', 'bigint')
    .addColumn('settled_up_to_ms', 'bigint', (column) => column.notNull())
    .addColumn('awaiting_until_ms', 'bigint')
    .addColumn('memory', 'text', (column) => column.notNull())
    .addPrimaryKeyConstraint('subscriptions_key', ['team', 'id'])
    .execute();
};

const counters = (schema: SchemaModule) =>
  schema
    .createTable('subscription_counters')
    .addColumn('team', 'text', (column) => column.notNull())
    .addColumn('kind', 'text', (column) => column.notNull())
    .addColumn('last', 'integer', (column) => column.notNull())
    .addPrimaryKeyConstraint('subscription_counters_key', ['team', 'kind'])
    .execute();

const claims = (schema: SchemaModule) =>
  schema
    .createTable('subscription_claims')
    .addColumn('key', 'text', (column) => column.primaryKey())
    .addColumn('holder', 'text')
    .addColumn('lease_until_ms', 'bigint', (column) => column.notNull())
    .addColumn('settled_at_ms', 'bigint')
    .execute();

export const digestsAndWatches: Migration = async ({ schema }) => {
  await subscriptions(schema);
  await counters(schema);
  await claims(schema);
  const index = (name: string, columns: string[]) =>
    schema.createIndex(name).on('subscriptions').columns(columns).execute();
  await index('subscriptions_by_due', ['team', 'next_due_ms']);
  await index('subscriptions_by_awaiting', ['team', 'awaiting_until_ms']);
  await schema
    .createIndex('subscription_claims_by_settled')
    .on('subscription_claims')
    .column('settled_at_ms')
    .execute();
};
