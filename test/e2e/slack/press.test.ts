import { describe, expect, it } from 'vitest';
import { settled, spoken, startBot } from './bot.ts';

const button = (value: string) => ({
  type: 'actions',
  elements: [
    { type: 'button', action_id: 'working', text: { type: 'plain_text', text: 'Show the working' }, value },
  ],
});

describe('a press', () => {
  it('on an answer in a channel is answered in the thread of that answer', async () => {
    const { platform, pressed } = await startBot();
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    platform.press(await platform.posts.next(), 'working', 'U0BEN');
    expect(await platform.posts.next()).toMatchObject({
      channel: 'C0DESK',
      threadTs: question.ts,
      text: 'Working of: interval KELP',
    });
    expect(pressed).toMatchObject([
      {
        actionId: 'working',
        value: 'interval KELP',
        place: 'channel',
        from: { team: 'T0DESK', channel: 'C0DESK', person: 'U0BEN' },
      },
    ]);
  });

  it('on an answer in a direct message begins a thread below it', async () => {
    const { platform } = await startBot();
    platform.direct({ text: 'interval KELP' });
    const answer = await platform.posts.next();
    platform.press(answer, 'working');
    expect((await platform.posts.next()).threadTs).toBe(answer.ts);
  });

  it('on a private message is answered privately', async () => {
    const refusal = spoken('no', { private: true, blocks: [button('why')] });
    const stage = await startBot({ conversation: { converse: () => Promise.resolve([refusal]) } });
    stage.platform.mention({ channel: 'C0DESK', text: 'interval' });
    const press = stage.platform.press(await stage.platform.ephemerals.next(), 'working');
    expect(await stage.platform.responses.next()).toMatchObject({
      responseType: 'ephemeral',
      text: 'Working of: why',
      replaceOriginal: false,
    });
    await settled(stage, { sent: [press] });
    expect(stage.platform.posts.all).toEqual([]);
  });

  it('that brings nothing up says nothing', async () => {
    const stage = await startBot({ conversation: { press: () => Promise.resolve([]) } });
    stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const press = stage.platform.press(await stage.platform.posts.next(), 'working');
    await settled(stage, { sent: [press] });
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('that runs into a fault says so to the one who pressed', async () => {
    const { platform, log } = await startBot({
      conversation: { press: () => Promise.reject(new Error('out of order')) },
    });
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    platform.press(await platform.posts.next(), 'working', 'U0BEN');
    expect(await platform.ephemerals.next()).toMatchObject({ user: 'U0BEN', shown: true });
    expect(log).toEqual([{ level: 'error', message: 'A question ran into a fault: Error: out of order' }]);
  });
});
