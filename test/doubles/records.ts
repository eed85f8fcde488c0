import { openSqlite } from '../../src/records/openSqlite.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse } from '../../src/terms/result.ts';
import type { DeskRecords, RecordStore } from '../../src/workspaces/records/ports.ts';
import { accepted } from '../laws/outcomes.ts';

export const testVersions = { bot: '0.1.0', node: process.versions.node, settingsHash: 'ab'.repeat(32) };

/** Records of their own in memory, thrown away with the process. */
export const recordsInMemory = async (more: Partial<DeskRecords> = {}): Promise<DeskRecords> => ({
  store: accepted(await openSqlite(null)),
  keeps: true,
  versions: testVersions,
  tell: (message) => {
    throw new Error(message);
  },
  ...more,
});

const broken = async () => refuse(problem('storeUnavailable', 'The store of records cannot be used.'));

/** A store that can do nothing. */
export const brokenStore: RecordStore = {
  contentOf: broken,
  keep: broken,
  find: broken,
  list: broken,
  verify: broken,
  conversations: { lastIn: broken, askedBy: broken },
  pins: { find: broken, findCard: broken, put: broken, standingIn: broken, list: broken },
};
