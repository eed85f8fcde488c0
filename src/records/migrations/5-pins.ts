import type { Migration } from './migration.ts';

/** Cards at the head of discussions, and the ids that channels were given. */
export const pinsAndMoves: Migration = async ({ schema }) => {
  const texts = ['question', 'as_of', 'sentence', 'state'] as const;
  const numbers = ['times', 'told_moved', 'told_restated'] as const;
  const keyed = schema
    .createTable('pins')
    .addColumn('team', 'text', (column) => column.notNull())
    .addColumn('channel', 'text', (column) => column.notNull())
    .addColumn('thread', 'text', (column) => column.notNull())
    .addColumn('answer_id', 'text', (column) => column.notNull())
    .addColumn('person', 'text')
    .addColumn('card_ts', 'text')
    .addColumn('pinned_at_ms', 'bigint', (column) => column.notNull());
  const withTexts = texts.reduce(
    (made, name) => made.addColumn(name, 'text', (column) => column.notNull()),
    keyed,
  );
  await numbers
    .reduce((made, name) => made.addColumn(name, 'integer', (column) => column.notNull()), withTexts)
    .addPrimaryKeyConstraint('pins_key', ['team', 'channel', 'thread', 'answer_id'])
    .execute();
  await schema.createIndex('pins_by_card').on('pins').columns(['team', 'channel', 'card_ts']).execute();
  await schema.createIndex('pins_by_state').on('pins').column('state').execute();
  await schema
    .createTable('channel_moves')
    .addColumn('team', 'text', (column) => column.notNull())
    .addColumn('from_id', 'text', (column) => column.notNull())
    .addColumn('to_id', 'text', (column) => column.notNull())
    .addColumn('noted_order', 'bigint', (column) => column.notNull())
    .addPrimaryKeyConstraint('channel_moves_key', ['team', 'from_id'])
    .execute();
};
