import { readSettings } from '../../src/config/read.ts';
import type { Settings } from '../../src/config/schema.ts';
import { openSqlite } from '../../src/records/openSqlite.ts';
import { computeInline } from '../../src/start/compute/inline.ts';
import { createDesk, type DeskParts } from '../../src/start/desk.ts';
import { feedOnce } from '../../src/start/feed.ts';
import { slackConversation } from '../../src/start/slackConversation.ts';
import { createSubscriptions } from '../../src/start/subscriptions/deskSubscriptions.ts';
import { type Converse, createConverse } from '../../src/workspaces/converse.ts';
import type { Desk } from '../../src/workspaces/desk.ts';
import type { Conversation } from '../../src/workspaces/slack/ports.ts';
import { createSurfaces } from '../../src/workspaces/surfaces/surfaces.ts';
import { layingOut } from '../doubles/drawing.ts';
import { recordsInMemory } from '../doubles/records.ts';
import { accepted } from '../laws/outcomes.ts';

const example = new URL('../../config/example-settings.yaml', import.meta.url).pathname;

export const exampleSettings = (): Settings => {
  const reading = readSettings(example);
  if (!reading.ok) throw new Error(reading.problems.map(({ message }) => message).join('\n'));
  return reading.settings;
};

const clock = { nowMs: () => Date.parse('2026-11-28T08:00:00Z') };

/** The prices are read once for all the desks of a test file: nothing writes to them. */
let feedRead: ReturnType<typeof feedOnce> | null = null;
const demoFeed = (): ReturnType<typeof feedOnce> => {
  feedRead ??= feedOnce(exampleSettings(), clock);
  return feedRead;
};

/** The desk of the demonstration prices, on the morning after they end. */
export const demoDesk = async (
  keeps = true,
  more: Pick<DeskParts, 'permissions' | 'wall'> = {},
): Promise<Desk> => {
  const settings = exampleSettings();
  const feed = await demoFeed();
  const records = await recordsInMemory({ keeps });
  const store = accepted(await openSqlite(null)).subscriptions;
  const parts = { settings, clock, ...feed, compute: computeInline(), records, ...more };
  const subscriptions = createSubscriptions({ ...parts, store }).ofDesk;
  return createDesk({ ...parts, drawing: layingOut, subscriptions });
};

/** The whole bot on the demonstration prices, without a workspace around it. */
export const demoConverse = async (keeps = true): Promise<Converse> => createConverse(await demoDesk(keeps));

/** The same as the workspace has it, with its form and its home. */
export const demoConversation = async (
  listensInThreads = false,
  more: Pick<DeskParts, 'permissions' | 'wall'> = {},
): Promise<Conversation> => {
  const desk = await demoDesk(true, more);
  const surfaces = createSurfaces(desk, listensInThreads);
  return slackConversation(createConverse(desk), () => ['KELP', 'TARN'], surfaces, desk.permissions);
};
