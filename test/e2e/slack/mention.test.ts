import { describe, expect, it } from 'vitest';
import { settled, startBot } from './bot.ts';

describe('a mention', () => {
  it('is answered in a thread that begins at the question', async () => {
    const stage = await startBot();
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    const post = await stage.platform.posts.next();
    expect(post).toMatchObject({
      channel: 'C0DESK',
      threadTs: question.ts,
      text: 'Heard: interval KELP 60d',
      metadata: {
        event_type: 'leadsman_delivery',
        event_payload: { id: expect.stringMatching(/^[0-9a-f]{32}$/) },
      },
    });
    await settled(stage, question);
    expect(stage.platform.posts.all).toHaveLength(1);
    expect(stage.asked).toMatchObject([{ text: 'interval KELP 60d', place: 'channel' }]);
  });

  it('inside a thread is answered in that thread', async () => {
    const { platform } = await startBot();
    const opening = platform.say({ channel: 'C0DESK', text: 'KELP looks quiet' });
    platform.mention({ channel: 'C0DESK', text: 'shape KELP', thread: opening.ts });
    expect((await platform.posts.next()).threadTs).toBe(opening.ts);
  });

  it('is found anywhere in the message and not passed on', async () => {
    const { platform, asked } = await startBot();
    platform.say({ channel: 'C0DESK', text: 'interval <@U0LEADSMAN> KELP' });
    platform.say({ channel: 'C0DESK', text: '<@U0LEADSMAN|leadsman>: interval TARN <@U0BEN>' });
    await platform.posts.next();
    await platform.posts.next();
    expect(asked.map(({ text }) => text)).toEqual(['interval   KELP', 'interval TARN <@U0BEN>']);
  });

  it('without a word gets examples in the thread', async () => {
    const { platform, asked } = await startBot();
    const question = platform.mention({ channel: 'C0DESK', text: '  ' });
    expect(await platform.posts.next()).toMatchObject({
      threadTs: question.ts,
      text: 'Try: interval KELP 60d',
    });
    expect(asked).toEqual([]);
  });

  it('turns nothing in the message into markup, names or opened links', async () => {
    const { platform } = await startBot();
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    expect((await platform.posts.next()).args).toMatchObject({
      parse: 'none',
      link_names: 'false',
      unfurl_links: 'false',
      unfurl_media: 'false',
    });
  });

  it('that cannot be answered gets its refusal privately, outside any thread', async () => {
    const stage = await startBot();
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'refuse this', user: 'U0BEN' });
    const refusal = await stage.platform.ephemerals.next();
    expect(refusal).toMatchObject({
      user: 'U0BEN',
      threadTs: null,
      shown: true,
      text: 'Refused: refuse this',
    });
    await settled(stage, question);
    expect(stage.platform.posts.all).toEqual([]);
  });

  it('that cannot be answered in a thread gets its refusal there', async () => {
    const { platform } = await startBot();
    const opening = platform.say({ channel: 'C0DESK', text: 'KELP looks quiet' });
    platform.mention({ channel: 'C0DESK', text: 'refuse this', thread: opening.ts });
    expect(await platform.ephemerals.next()).toMatchObject({ threadTs: opening.ts, shown: true });
  });

  it('by someone who left meanwhile gets silence for a refusal', async () => {
    const stage = await startBot();
    stage.platform.workspace.channels.get('C0DESK')?.members.delete('U0BEN');
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'refuse this', user: 'U0BEN' });
    await settled(stage, question);
    expect(stage.platform.calls.all.at(-1)).toMatchObject({
      method: 'chat.postEphemeral',
      outcome: 'user_not_in_channel',
    });
    expect(stage.log).toEqual([]);
  });
});

describe('what is not for the bot', () => {
  it('gets nothing: other talk, bots, the platform’s own news', async () => {
    const stage = await startBot({ subscriptions: ['app_mention', 'message.channels', 'message.im'] });
    const { platform } = stage;
    const things = [
      platform.say({ channel: 'C0DESK', text: 'interval KELP 60d' }),
      platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d', botId: 'B0OTHER' }),
      platform.mention({ channel: 'C0DESK', text: 'has joined', subtype: 'channel_join' }),
      platform.direct({ text: 'interval KELP', botId: 'B0OTHER' }),
      platform.direct({ text: 'topic', subtype: 'channel_topic' }),
    ];
    await settled(stage, ...things);
    expect(stage.asked).toEqual([]);
    expect(platform.calls.all.filter(({ method }) => method.startsWith('chat.'))).toEqual([]);
  });

  it('does not take shared files and replies that are also sent to the channel for news', async () => {
    const { platform } = await startBot();
    const opening = platform.say({ channel: 'C0DESK', text: 'KELP looks quiet' });
    platform.mention({ channel: 'C0DESK', text: 'one', subtype: 'file_share' });
    platform.mention({ channel: 'C0DESK', text: 'two', subtype: 'thread_broadcast', thread: opening.ts });
    const texts = [(await platform.posts.next()).text, (await platform.posts.next()).text];
    expect(texts).toEqual(['Heard: one', 'Heard: two']);
  });
});
