import type { Migration } from './migration.ts';

/** Follow-ups look for the last answer of a thread, and a home page for what its person asked. */
export const askingsByPlace: Migration = async ({ schema }) => {
  await schema.createIndex('askings_by_channel').on('askings').columns(['channel', 'asked_at_ms']).execute();
  await schema.createIndex('askings_by_person').on('askings').columns(['person', 'asked_at_ms']).execute();
};
