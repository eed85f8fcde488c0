import { describe, expect, it } from 'vitest';
import { answeringLater, settled, spoken, startBot } from './bot.ts';

describe('a direct message', () => {
  it('is answered beside it, not in a thread', async () => {
    const { platform, asked } = await startBot();
    const question = platform.direct({ text: 'interval KELP 60d', user: 'U0BEN' });
    expect(await platform.posts.next()).toMatchObject({
      channel: question.channel,
      threadTs: null,
      text: 'Heard: interval KELP 60d',
    });
    expect(asked).toMatchObject([{ place: 'direct' }]);
  });

  it('in a thread is answered in that thread', async () => {
    const { platform } = await startBot();
    const opening = platform.direct({ text: 'interval KELP 60d' });
    await platform.posts.next();
    platform.direct({ text: 'shape KELP', thread: opening.ts });
    expect((await platform.posts.next()).threadTs).toBe(opening.ts);
  });

  it('that cannot be answered gets its refusal as an ordinary message, which stays', async () => {
    const stage = await startBot();
    const question = stage.platform.direct({ text: 'refuse this' });
    expect((await stage.platform.posts.next()).text).toBe('Refused: refuse this');
    await settled(stage, question);
    expect(stage.platform.ephemerals.all).toEqual([]);
  });
});

describe('a slash command', () => {
  it('is answered privately through its response address', async () => {
    const stage = await startBot();
    const command = stage.platform.command({ channel: 'C0DESK', user: 'U0BEN', text: ' shape KELP ' });
    expect(await stage.platform.responses.next()).toMatchObject({
      user: 'U0BEN',
      responseType: 'ephemeral',
      text: 'Heard: shape KELP',
      replaceOriginal: false,
    });
    await settled(stage, { sent: [command] });
    expect(stage.platform.posts.all).toEqual([]);
    expect(stage.asked).toMatchObject([{ text: 'shape KELP', place: 'command' }]);
  });

  it('works in a channel the bot is not in', async () => {
    const { platform } = await startBot();
    platform.command({ channel: 'C0ELSEWHERE', text: 'shape KELP' });
    expect((await platform.responses.next()).channel).toBe('C0ELSEWHERE');
  });

  it('is acknowledged before the answer is known', async () => {
    const { questions, conversation } = answeringLater();
    const { platform } = await startBot({ conversation });
    await platform.command({ channel: 'C0DESK', text: 'shape KELP' }).acknowledged;
    (await questions.next()).answer(spoken('at last'));
    expect((await platform.responses.next()).text).toBe('at last');
  });

  it('without a word gets examples', async () => {
    const { platform } = await startBot();
    platform.command({ channel: 'C0DESK', text: '' });
    expect((await platform.responses.next()).text).toBe('Try: interval KELP 60d');
  });

  it('gets its reply on a second try where the first met a fault', async () => {
    const { platform } = await startBot();
    platform.faults.next('response_url', { kind: 'status', status: 503, accepted: false });
    platform.command({ channel: 'C0DESK', text: 'shape KELP' });
    await platform.time.timerSet(1_000);
    platform.time.advance(1_000);
    expect((await platform.responses.next()).text).toBe('Heard: shape KELP');
  });

  it('loses only the looks of a reply whose blocks are refused', async () => {
    const table = { type: 'table', rows: [[{ type: 'raw_text', text: '' }]] };
    const { platform, log } = await startBot({
      breaksLimits: true,
      conversation: { converse: () => Promise.resolve([spoken('plain words', { blocks: [table] })]) },
    });
    platform.command({ channel: 'C0DESK', text: 'shape KELP' });
    expect(await platform.responses.next()).toMatchObject({ text: 'plain words', blocks: [] });
    expect(log).toMatchObject([{ level: 'error' }]);
  });
});
