/** What becomes of digests and pins when channels and people move: the whole bot, real news, real look-ups. */
import { describe, expect, it } from 'vitest';
import { createRunner } from '../../../src/digests/run/createRunner.ts';
import { lookAgain } from '../../../src/digests/run/lookAgain.ts';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { computeInline } from '../../../src/start/compute/inline.ts';
import { createDesk } from '../../../src/start/desk.ts';
import { feedOnce } from '../../../src/start/feed.ts';
import { slackConversation } from '../../../src/start/slackConversation.ts';
import { createSubscriptions } from '../../../src/start/subscriptions/deskSubscriptions.ts';
import { deliverInSlack } from '../../../src/start/subscriptions/running.ts';
import { tendWorkspace } from '../../../src/start/tending.ts';
import { laterWall, wallIn } from '../../../src/start/wall.ts';
import { createPermissions } from '../../../src/workspaces/access/createPermissions.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import type { News } from '../../../src/workspaces/news.ts';
import { makePlaces } from '../../../src/workspaces/slack/places/places.ts';
import { featureEvents } from '../../../src/workspaces/slack/scopes.ts';
import { createSurfaces } from '../../../src/workspaces/surfaces/surfaces.ts';
import { layingOut } from '../../doubles/drawing.ts';
import type { Sent } from '../../doubles/platform/deliveries.ts';
import { testVersions } from '../../doubles/records.ts';
import { manualTime } from '../../doubles/time.ts';
import { accepted } from '../../laws/outcomes.ts';
import { nothingNamed } from '../../workspaces/access/knownPlaces.ts';
import { exampleSettings } from '../demoDesk.ts';
import { settled, startBot } from './bot.ts';

const minuteMs = 60_000;
const channel = 'C0CLEAN';
const log = { info: () => {}, warn: () => {}, error: () => {} };

/** A channel of members with a digest that is due at 15:30 and a pinned result; the clock begins at 15:00. */
const startDesk = async () => {
  const time = manualTime();
  const store = accepted(await openSqlite(null));
  const settings = exampleSettings();
  const told: string[] = [];
  const tell = (message: string) => void told.push(message);
  const records = { store, keeps: true, versions: testVersions, tell };
  const clock = { nowMs: time.nowMs };
  const parts = { settings, clock, ...(await feedOnce(settings, clock)), compute: computeInline(), records };
  const subscriptions = createSubscriptions({ ...parts, store: store.subscriptions });
  const places = makePlaces(time, log);
  const permissions = createPermissions(nothingNamed, places, clock);
  const { wall, stand } = laterWall();
  const desk = createDesk({
    ...parts,
    drawing: layingOut,
    subscriptions: subscriptions.ofDesk,
    permissions,
    wall,
  });
  const surfaces = createSurfaces(desk, false);
  const conversation = slackConversation(createConverse(desk), () => ['KELP'], surfaces, permissions);
  let hear = async (_: News): Promise<void> => {};
  const stage = await startBot({
    time,
    store,
    places,
    conversation,
    subscriptions: Object.values(featureEvents).flat(),
    onNews: (news) => hear(news),
  });
  const { platform, bot } = stage;
  const where = {
    team: bot.team,
    deliver: deliverInSlack(bot.deliveries),
    placeState: permissions.placeVerdict,
    tell,
  };
  stand(wallIn(bot.deliveries, bot.pinBoard));
  const looking = { ...where, store: store.subscriptions };
  const tending = tendWorkspace({
    desk,
    store,
    places,
    lookAgain: (touched) => lookAgain(looking, touched),
    time,
    tell,
  });
  ({ hear } = tending);
  const runner = createRunner({ ...subscriptions.ofRun, ...where, holder: 'only' });
  platform.workspace.addChannel({ id: channel, members: new Set(['U0ADA', 'U0BEN', 'U0LEADSMAN']) });
  const question = platform.mention({ channel, text: 'interval KELP 60d' });
  await settled(stage, question);
  await settled(stage, platform.mention({ channel, text: 'pin', thread: question.ts }));
  await settled(stage, platform.mention({ channel, text: 'digest weekdays 15:30 KELP' }));
  const before = platform.posts.all.length;
  const happened = async (sent: readonly Sent[]) => settled(stage, { sent });
  const postsSince = () => platform.posts.all.slice(before).map((post) => `${post.channel} ${post.text}`);
  const due = async () => {
    time.advance(30 * minuteMs);
    await runner.tick();
    await runner.idle();
  };
  const state = async () => {
    const found = accepted(await store.subscriptions.find(bot.team, 'D-1'));
    return `${found?.channel} ${found?.state} ${found?.pausedWhy}`;
  };
  return { ...stage, store, time, thread: question.ts, happened, postsSince, due, state, told };
};

describe('a channel with a digest and a pin', () => {
  it('that is archived has its digest paused and its owner told at once, and goes on when it is opened again', async () => {
    const { platform, happened, postsSince, due, state, told } = await startDesk();
    await happened(platform.archive(channel));
    expect(await state()).toBe(`${channel} paused place`);
    expect(postsSince()).toEqual([expect.stringMatching(/^D0ADA D-1 is paused: its channel is archived\./)]);
    await happened(platform.unarchive(channel));
    expect(await state()).toBe(`${channel} active null`);
    await due();
    expect(postsSince()[1]).toContain(`${channel} `);
    expect(told).toEqual([]);
  });

  it('that the bot was taken out of is silent until it is back', async () => {
    const { platform, happened, postsSince, due, state } = await startDesk();
    await happened(platform.leave(channel, 'U0LEADSMAN'));
    expect(await state()).toBe(`${channel} paused place`);
    await due();
    expect(postsSince()).toEqual([expect.stringContaining('I am not a member of its channel')]);
    await happened(platform.join(channel, 'U0LEADSMAN'));
    expect(await state()).toBe(`${channel} active null`);
  });

  it.each([
    [
      'shared with another company',
      (platform: Awaited<ReturnType<typeof startDesk>>['platform']) => platform.share(channel, 'external'),
    ],
    [
      'joined by a guest',
      (platform: Awaited<ReturnType<typeof startDesk>>['platform']) => platform.join(channel, 'U0GUS'),
    ],
  ])('that is %s has its digest stopped, and nothing more is posted there', async (_, change) => {
    const { platform, happened, postsSince, due, state } = await startDesk();
    await happened(change(platform));
    expect(await state()).toBe(`${channel} stopped null`);
    await due();
    expect(postsSince()).toEqual([expect.stringMatching(/^D0ADA D-1 is stopped: /)]);
  });

  it('that has a new id is followed by both, and by what was said in its threads', async () => {
    const stage = await startDesk();
    const { platform, happened, postsSince, due, state, thread } = stage;
    await happened(platform.changeId(channel, 'C0NEW'));
    expect(await state()).toBe('C0NEW active null');
    await settled(stage, platform.mention({ channel: 'C0NEW', text: 'at 99%', thread }));
    expect(postsSince()[0]).toMatch(/^C0NEW KELP’s mean daily return over 60 days .* at 99%/);
    await settled(stage, platform.mention({ channel: 'C0NEW', text: 'unpin', thread }));
    expect(postsSince()[1]).toMatch(/^C0NEW R-\w+ is no longer pinned here\./);
    expect(platform.workspace.channels.get('C0NEW')?.pins).toEqual([]);
    await due();
    expect(postsSince()[2]).toContain('C0NEW ');
  });
});

describe('a person', () => {
  it('who leaves has their digest paused, which nobody can be told of but the operator, and finds it running when back', async () => {
    const { platform, happened, postsSince, due, state, told } = await startDesk();
    await happened(platform.deactivate('U0ADA'));
    expect(await state()).toBe(`${channel} paused place`);
    await due();
    expect(postsSince()).toEqual([]);
    expect(told).toEqual([expect.stringContaining('D-1 was paused (ownerLeft)')]);
    await happened(platform.reactivate('U0ADA'));
    expect(await state()).toBe(`${channel} active null`);
  });
});
