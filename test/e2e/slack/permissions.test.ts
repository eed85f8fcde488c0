import { describe, expect, it } from 'vitest';
import type { PermissionSettings } from '../../../src/workspaces/access/configured.ts';
import { createPermissions } from '../../../src/workspaces/access/createPermissions.ts';
import { makePlaces } from '../../../src/workspaces/slack/places/places.ts';
import { featureEvents } from '../../../src/workspaces/slack/scopes.ts';
import { everyScope } from '../../doubles/platform/start.ts';
import { manualTime } from '../../doubles/time.ts';
import { nothingNamed } from '../../workspaces/access/knownPlaces.ts';
import { demoConversation } from '../demoDesk.ts';
import { type BotOptions, settled, startBot } from './bot.ts';

const subscriptions = Object.values(featureEvents).flat();
const question = 'interval KELP 60d';
const quietLog = { info: () => {}, warn: () => {}, error: () => {} };

/** The whole bot under these settings. In C0CLEAN there are members only, in C0DESK a guest too. */
const setUp = async (settings: Partial<PermissionSettings> = {}, options: BotOptions = {}) => {
  const time = manualTime();
  const places = makePlaces(time, quietLog);
  const permissions = createPermissions({ ...nothingNamed, ...settings }, places, time);
  const conversation = await demoConversation(false, { permissions });
  const stage = await startBot({ time, places, conversation, subscriptions, ...options });
  const members = new Set(['U0ADA', 'U0BEN', 'U0LEADSMAN']);
  stage.platform.workspace.addChannel({ id: 'C0CLEAN', members });
  const ask = async (channel: string, user = 'U0ADA', text = question) => {
    const mention = stage.platform.mention({ channel, user, text });
    await settled(stage, mention);
    return mention;
  };
  const { posts, ephemerals, calls } = stage.platform;
  const privateLines = () => ephemerals.all.map(({ user, text }) => `${user} ${text}`);
  const callsOf = (method: string) => calls.all.filter((call) => call.method === method).length;
  return { ...stage, time, ask, posts, ephemerals, privateLines, callsOf };
};

describe('a channel', () => {
  it('of members is answered, and looked at once', async () => {
    const { ask, posts, callsOf } = await setUp();
    await ask('C0CLEAN');
    await ask('C0CLEAN', 'U0BEN');
    expect(posts.all).toHaveLength(2);
    expect(callsOf('conversations.info')).toBe(1);
    expect(callsOf('conversations.members')).toBe(1);
  });

  it('with a guest is not answered: members are told so alone, the guest is told nothing', async () => {
    const { ask, posts, privateLines } = await setUp();
    await ask('C0DESK');
    await ask('C0DESK', 'U0GUS');
    await ask('C0DESK', 'U0BEN', '');
    expect(posts.all).toEqual([]);
    expect(privateLines()).toEqual([
      expect.stringMatching(/^U0ADA People from outside can read this channel/),
      expect.stringMatching(/^U0BEN People from outside can read this channel/),
    ]);
  });

  it('with a guest that the settings name is answered', async () => {
    const { ask, posts } = await setUp({ sharedChannels: ['C0DESK'] });
    await ask('C0DESK', 'U0GUS');
    expect(posts.all).toHaveLength(1);
  });

  it('that is shared from now on is answered no more, and anew once it is not', async () => {
    const { ask, posts, platform, bot } = await setUp();
    await ask('C0CLEAN');
    const shared = platform.share('C0CLEAN', 'external');
    await settled({ bot } as Parameters<typeof settled>[0], { sent: shared });
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(1);
    await Promise.all(platform.share('C0CLEAN', 'no').map(({ acknowledged }) => acknowledged));
    await bot.idle();
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(2);
  });

  it('that a guest joins is answered no more', async () => {
    const { ask, posts, platform, bot } = await setUp();
    await ask('C0CLEAN');
    await Promise.all(platform.join('C0CLEAN', 'U0GUS').map(({ acknowledged }) => acknowledged));
    await bot.idle();
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(1);
  });

  it('that another company was invited to, of which the platform tells nothing, is found out within ten minutes', async () => {
    const { ask, posts, platform, time, privateLines } = await setUp();
    await ask('C0CLEAN');
    platform.share('C0CLEAN', 'pending');
    time.advance(10 * 60_000 + 1);
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(1);
    expect(privateLines()[0]).toContain('People from outside');
  });

  it('of which nothing can be found out is not answered, and not even a placeholder shows', async () => {
    const { ask, posts, platform, privateLines } = await setUp();
    platform.faults.next('conversations.info', { kind: 'dropped', accepted: false });
    await ask('C0CLEAN');
    expect(posts.all).toEqual([]);
    expect(privateLines()).toEqual([expect.stringContaining('I cannot see yet who is listening here')]);
  });

  it('that the token may not look at is answered only where the settings name it', async () => {
    const scopes = everyScope.filter((scope) => scope !== 'channels:read');
    const { ask, posts } = await setUp({ sharedChannels: ['C0DESK'] }, { scopes });
    await ask('C0CLEAN');
    await ask('C0DESK');
    expect(posts.all.map(({ channel }) => channel)).toEqual(['C0DESK']);
  });

  it('that has a new id keeps what the settings say of it', async () => {
    const { ask, posts, platform, bot } = await setUp({ channels: ['C0CLEAN'] });
    await Promise.all(platform.changeId('C0CLEAN', 'C0NEW').map(({ acknowledged }) => acknowledged));
    await bot.idle();
    await ask('C0NEW');
    expect(posts.all).toHaveLength(1);
  });
});

describe('a person', () => {
  it('who is a guest is answered nowhere: not directly, not by command, not by a button', async () => {
    const stage = await setUp({ sharedChannels: [] });
    const { platform, posts } = stage;
    await settled(stage, platform.direct({ user: 'U0GUS', text: question }));
    expect(posts.all.map(({ text }) => text)).toEqual([
      expect.stringContaining('I answer members of this workspace, not its guests.'),
    ]);
    platform.command({ channel: 'C0DESK', user: 'U0GUS', text: question });
    expect((await platform.responses.next()).text).toContain('not its guests');
    await stage.ask('C0CLEAN');
    const answer = posts.all.at(-1);
    if (answer === undefined) throw new Error('no answer');
    await settled(stage, { sent: [platform.press(answer, 'working', 'U0GUS')] });
    expect(posts.all).toHaveLength(2);
  });

  it('who asks too much is told when to ask again, alone', async () => {
    const { ask, posts, privateLines, time } = await setUp({ questionsPerMinute: 2 });
    await ask('C0CLEAN');
    await ask('C0CLEAN');
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(2);
    expect(privateLines()).toEqual([
      'U0ADA That is more than 2 questions within a minute, the most that one person is answered. Ask again in 60 seconds.',
    ]);
    time.advance(60_000);
    await ask('C0CLEAN');
    expect(posts.all).toHaveLength(3);
  });
});

describe('a verb that is confined', () => {
  it('is refused elsewhere in private, in words that reveal nothing', async () => {
    const { ask, posts, privateLines } = await setUp({ verbs: { tail: ['C0OTHER'] } });
    await ask('C0CLEAN', 'U0ADA', 'tail KELP at 99%');
    expect(posts.all).toEqual([]);
    expect(privateLines()).toEqual(['U0ADA That cannot be asked here. Write help for what can be asked.']);
  });
});
