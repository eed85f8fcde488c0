import { describe, expect, it } from 'vitest';
import { laterWall, wallIn } from '../../../src/start/wall.ts';
import type { News } from '../../../src/workspaces/news.ts';
import { featureEvents } from '../../../src/workspaces/slack/scopes.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { demoConversation } from '../demoDesk.ts';
import { settled, startBot } from './bot.ts';

const subscriptions = Object.values(featureEvents).flat();
const channel = 'C0DESK';

/** An answer stands in its thread, and whatever is said to the bot there is dealt with. */
const setUp = async () => {
  const { wall, stand } = laterWall();
  const conversation = await demoConversation(false, { wall });
  const news = makeTray<News>('news');
  const stage = await startBot({ conversation, subscriptions, onNews: async (heard) => news.add(heard) });
  const { platform, bot } = stage;
  stand(wallIn(bot.deliveries, bot.pinBoard));
  const question = platform.mention({ channel, text: 'interval KELP 60d' });
  await settled(stage, question);
  const [answer] = platform.posts.all;
  if (answer === undefined) throw new Error('no answer');
  const say = async (text: string) =>
    settled(stage, platform.mention({ channel, text, thread: question.ts }));
  const pinsOf = () => platform.workspace.channels.get(channel)?.pins ?? [];
  const privateLines = () => platform.ephemerals.all.map(({ text }) => text);
  return { ...stage, thread: question.ts, answer, say, news, pinsOf, privateLines };
};

describe('pin', () => {
  it('in a thread posts a card there and pins it, once', async () => {
    const { platform, thread, say, pinsOf, privateLines } = await setUp();
    await say('pin');
    const [, card] = platform.posts.all;
    expect(card).toMatchObject({ channel, threadTs: thread });
    expect(card?.text).toMatch(/^KELP’s mean daily return over 60 days is .*R-.*licensed advisers/s);
    expect(pinsOf()).toEqual([card?.ts]);
    await say('pin');
    expect(platform.posts.all).toHaveLength(2);
    expect(privateLines()).toEqual([expect.stringContaining('is pinned here already')]);
  });

  it('by its button does the same', async () => {
    const stage = await setUp();
    const press = stage.platform.press(stage.answer, 'pin', 'U0BEN');
    await settled(stage, { sent: [press] });
    const [, card] = stage.platform.posts.all;
    expect(card?.threadTs).toBe(stage.thread);
    expect(stage.pinsOf()).toEqual([card?.ts]);
  });

  it('that the platform has done before its answer is lost is done once', async () => {
    const { platform, say, pinsOf } = await setUp();
    platform.faults.next('pins.add', { kind: 'dropped', accepted: true });
    const said = say('pin');
    await platform.time.timerSet(5_000);
    platform.time.advance(5_000);
    await said;
    expect(platform.posts.all.filter(({ text }) => text.includes('licensed advisers'))).toHaveLength(1);
    expect(pinsOf()).toHaveLength(1);
    expect(platform.ephemerals.all).toEqual([]);
  });

  it.each(['not_pinnable', 'permission_denied', 'too_many_pins'])(
    'that the platform refuses with %s leaves the card, and says so to who wanted it',
    async (error) => {
      const { platform, say, pinsOf, privateLines } = await setUp();
      platform.faults.next('pins.add', { kind: 'refused', error });
      await say('pin');
      expect(platform.posts.all).toHaveLength(2);
      expect(pinsOf()).toEqual([]);
      expect(privateLines()).toEqual([expect.stringContaining('The card stands in the thread')]);
    },
  );

  it('in a direct message is pinned there', async () => {
    const stage = await setUp();
    await settled(stage, stage.platform.direct({ text: 'interval TARN 60d' }));
    await settled(stage, stage.platform.direct({ text: 'pin' }));
    const card = stage.platform.posts.all.at(-1);
    expect(card).toMatchObject({ channel: 'D0ADA', threadTs: null });
    expect(stage.platform.workspace.channels.get('D0ADA')?.pins).toEqual([card?.ts]);
  });
});

describe('unpin', () => {
  it('takes the pin off, and leaves the card', async () => {
    const { platform, say, pinsOf } = await setUp();
    await say('pin');
    await say('unpin');
    expect(pinsOf()).toEqual([]);
    expect(platform.posts.all.map(({ text }) => text)[2]).toMatch(/^R-\w+ is no longer pinned here\.$/);
    expect(platform.deletions.all).toEqual([]);
  });

  it('of what a person has taken off already is no trouble', async () => {
    const { platform, say, news } = await setUp();
    await say('pin');
    const [, card] = platform.posts.all;
    if (card === undefined) throw new Error('no card');
    platform.takePinOff(card);
    expect(await news.next()).toEqual({ kind: 'pinRemoved', team: 'T0DESK', channel, ts: card.ts });
    await say('unpin');
    expect(platform.posts.all).toHaveLength(3);
  });
});
