import type { CreateTableBuilder, SchemaModule } from 'kysely';
import type { Migration } from './migration.ts';

const leased = (schema: SchemaModule, name: string): CreateTableBuilder<string, string> =>
  schema
    .createTable(name)
    .addColumn('key', 'text', (column) => column.primaryKey())
    .addColumn('holder', 'text')
    .addColumn('lease_until_ms', 'bigint', (column) => column.notNull())
    .addColumn('settled_at_ms', 'bigint');

const inbox = (schema: SchemaModule) =>
  leased(schema, 'inbox')
    .addColumn('message_key', 'text')
    .addColumn('kind', 'text', (column) => column.notNull())
    .addColumn('asked_at_ms', 'bigint', (column) => column.notNull())
    .addColumn('body', 'text', (column) => column.notNull())
    .addColumn('tries', 'integer', (column) => column.notNull())
    .addColumn('editing', 'text')
    .execute();

const deliveries = (schema: SchemaModule) =>
  leased(schema, 'deliveries')
    .addColumn('delivery_id', 'text', (column) => column.notNull().unique())
    .addColumn('team', 'text', (column) => column.notNull())
    .addColumn('channel', 'text', (column) => column.notNull())
    .addColumn('thread', 'text')
    .addColumn('content', 'text', (column) => column.notNull())
    .addColumn('urgent', 'integer', (column) => column.notNull())
    .addColumn('expires_at_ms', 'bigint')
    .addColumn('created_at_ms', 'bigint', (column) => column.notNull())
    .addColumn('first_attempt_ms', 'bigint')
    .addColumn('last_attempt_ms', 'bigint')
    .addColumn('unsure', 'integer', (column) => column.notNull())
    .addColumn('outcome', 'text')
    .execute();

export const inboxAndDeliveries: Migration = async ({ schema }) => {
  await inbox(schema);
  await deliveries(schema);
  await schema.createIndex('inbox_by_message').on('inbox').column('message_key').execute();
  await schema.createIndex('inbox_by_settled').on('inbox').column('settled_at_ms').execute();
  await schema.createIndex('deliveries_by_settled').on('deliveries').column('settled_at_ms').execute();
};
