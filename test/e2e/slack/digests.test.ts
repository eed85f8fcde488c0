/** Digests in the workspace: asked for by a mention, posted by the clock, once. */
import { expect, test } from 'vitest';
import { createRunner } from '../../../src/digests/run/createRunner.ts';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { computeInline } from '../../../src/start/compute/inline.ts';
import { createDesk } from '../../../src/start/desk.ts';
import { feedOnce } from '../../../src/start/feed.ts';
import { slackConversation } from '../../../src/start/slackConversation.ts';
import { createSubscriptions } from '../../../src/start/subscriptions/deskSubscriptions.ts';
import { createDigestPictures } from '../../../src/start/subscriptions/digestPictures.ts';
import { deliverInSlack } from '../../../src/start/subscriptions/running.ts';
import type { Clock } from '../../../src/terms/clock.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import { everythingAllowed } from '../../../src/workspaces/permissions.ts';
import { createSurfaces } from '../../../src/workspaces/surfaces/surfaces.ts';
import { layingOut } from '../../doubles/drawing.ts';
import { testVersions } from '../../doubles/records.ts';
import { accepted } from '../../laws/outcomes.ts';
import { exampleSettings } from '../demoDesk.ts';
import { startBot } from './bot.ts';

const minuteMs = 60_000;

/** The whole bot on the demonstration prices; the clock is the platform’s, which begins on a Friday at 15:00 UTC. */
const startDesk = async (pictured = false) => {
  let now: Clock['nowMs'] = () => Date.UTC(2026, 10, 27, 15);
  const clock = { nowMs: () => now() };
  const store = accepted(await openSqlite(null));
  const settings = exampleSettings();
  const records = { store, keeps: true, versions: testVersions, tell: () => {} };
  const parts = { settings, clock, ...(await feedOnce(settings, clock)), compute: computeInline(), records };
  const subscriptions = createSubscriptions({ ...parts, store: store.subscriptions });
  const desk = createDesk({ ...parts, drawing: layingOut, subscriptions: subscriptions.ofDesk });
  const conversation = slackConversation(createConverse(desk), () => ['KELP'], createSurfaces(desk, false));
  const stage = await startBot({ store, conversation });
  now = stage.platform.time.nowMs;
  const told: string[] = [];
  const tell = (message: string) => void told.push(message);
  const draw = createDigestPictures({ drawing: layingOut, snapshot: parts.snapshot, tell });
  const pictures = pictured ? { draw, show: stage.bot.showPicture } : null;
  const runnerOf = (holder: string) =>
    createRunner({
      ...subscriptions.ofRun,
      team: stage.bot.team,
      holder,
      deliver: deliverInSlack(stage.bot.deliveries, pictures),
      placeState: everythingAllowed.placeVerdict,
      tell: (message) => told.push(message),
    });
  return { ...stage, runnerOf, told };
};

test('a digest that was asked for is posted once when it is due, its details in its thread', async () => {
  const { platform, runnerOf, told } = await startDesk();
  platform.mention({ channel: 'C0DESK', text: 'digest weekdays 15:30 KELP TARN' });
  const made = await platform.posts.next();
  expect(made.text).toContain('D-1 is made. Next post: Friday 2026-11-27 15:30 UTC.');

  const runners = [runnerOf('first'), runnerOf('second')];
  const tick = () => Promise.all(runners.map((runner) => runner.tick()));
  await tick();
  platform.time.advance(30 * minuteMs);
  await tick();
  const head = await platform.posts.next();
  expect(head).toMatchObject({ channel: 'C0DESK', threadTs: null });
  expect(head.text).toMatch(/chance alone would bring 0\.020? and 0\.22 among 2 tickers/);
  expect(head.text).toContain('licensed advisers');

  expect(await platform.posts.next()).toMatchObject({ channel: 'C0DESK', threadTs: head.ts });
  await Promise.all(runners.map((runner) => runner.idle()));
  for (let minute = 0; minute < 5; minute += 1) {
    platform.time.advance(minuteMs);
    await tick();
    await Promise.all(runners.map((runner) => runner.idle()));
  }
  expect(platform.posts.all).toHaveLength(3);
  expect(told).toEqual([]);
});

test('a digest that goes with its picture has it in its thread, once', async () => {
  const { platform, runnerOf, told } = await startDesk(true);
  platform.mention({ channel: 'C0DESK', text: 'digest weekdays 15:30 KELP TARN' });
  await platform.posts.next();
  platform.time.advance(30 * minuteMs);
  const runners = [runnerOf('first'), runnerOf('second')];
  await Promise.all(runners.map((runner) => runner.tick()));
  const head = await platform.posts.next();
  const shown = await platform.posts.next();
  expect(shown).toMatchObject({ threadTs: head.ts, blocks: [{ type: 'image' }] });
  expect(shown.text).toMatch(/^One strip for each of 2 tickers: last returns against the 99% VaR of a day\./);
  await platform.posts.next();
  await Promise.all(runners.map((runner) => runner.idle()));
  expect(platform.posts.all).toHaveLength(4);
  expect(told).toEqual([]);
});

test('a digest in an archived channel is paused, and its owner is told in private', async () => {
  const { platform, runnerOf } = await startDesk();
  platform.mention({ channel: 'C0DESK', text: 'digest weekdays 15:30 KELP' });
  await platform.posts.next();
  platform.archive('C0DESK');
  const runner = runnerOf('first');
  // the refusal of the platform comes before anybody has looked the channel up
  platform.time.advance(30 * minuteMs);
  await runner.tick();
  const note = await platform.posts.next();
  expect(note.channel).toMatch(/^D/);
  expect(note.text).toContain('D-1 is paused: its channel is archived.');
  await runner.idle();
  expect(platform.posts.all).toHaveLength(2);
});
