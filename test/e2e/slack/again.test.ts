import { describe, expect, it } from 'vitest';
import { settled, startBot } from './bot.ts';

const everything = ['app_mention', 'message.channels', 'message.im'];

describe('a question that arrives twice', () => {
  it('as a mention and as a message is answered once', async () => {
    const stage = await startBot({ subscriptions: everything });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    expect(question.sent).toHaveLength(2);
    await settled(stage, question);
    expect(stage.asked).toHaveLength(1);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('because its acknowledgement was lost is answered once', async () => {
    const stage = await startBot();
    stage.platform.sockets.loseAcknowledgements(true);
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await stage.platform.posts.next();
    stage.platform.sockets.loseAcknowledgements(false);
    stage.platform.time.advance(3_000);
    await settled(stage, question);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([2]);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('for the first time by a redelivery is answered all the same', async () => {
    const stage = await startBot();
    const { platform } = stage;
    platform.sockets.cut();
    await platform.sockets.connected(0);
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await platform.time.timerSet(1_000, 2);
    platform.time.advance(1_000);
    await platform.sockets.connected(2);
    await platform.time.timerGone(30_000);
    platform.time.advance(60_000);
    expect((await platform.posts.next()).threadTs).toBe(question.ts);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([3]);
  });

  it('with the same words asked anew is another question', async () => {
    const { platform } = await startBot();
    platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    const stamps = [(await platform.posts.next()).threadTs, (await platform.posts.next()).threadTs];
    expect(new Set(stamps).size).toBe(2);
  });
});

describe('an edited question', () => {
  it('that reads the same gets nothing', async () => {
    const stage = await startBot();
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await settled(stage, question);
    const edited = stage.platform.edit(question, '<@U0LEADSMAN>  interval  KELP 60d ');
    expect(edited.sent).toHaveLength(1);
    await settled(stage, edited);
    expect(stage.asked).toHaveLength(1);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('that was changed gets a new reply marked as such, and the old one is marked superseded', async () => {
    const stage = await startBot();
    const { platform } = stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    const first = await platform.posts.next();
    platform.time.advance(599_000);
    await settled(stage, question, platform.edit(question, '<@U0LEADSMAN> interval KELP 90d'));
    const second = await platform.posts.next();
    expect(second).toMatchObject({
      threadTs: question.ts,
      text: 'Reply to the edited question. Heard: interval KELP 90d',
      blocks: [{ type: 'context' }, { type: 'section' }, { type: 'actions' }],
    });
    expect(await platform.updates.next()).toMatchObject({
      ts: first.ts,
      text: 'Superseded: the question was edited; the newer reply stands below. Heard: interval KELP 60d',
      blocks: [{ type: 'context' }, { type: 'section' }, { type: 'actions' }],
    });
  });

  it('told twice about one edit replies once, and again about the next', async () => {
    const stage = await startBot({ subscriptions: everything });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await settled(stage, question);
    await settled(stage, stage.platform.edit(question, '<@U0LEADSMAN> interval KELP 90d'));
    await settled(stage, stage.platform.edit(question, '<@U0LEADSMAN> interval KELP 120d'));
    expect(stage.asked.map(({ text }) => text)).toEqual([
      'interval KELP 60d',
      'interval KELP 90d',
      'interval KELP 120d',
    ]);
  });

  it('after ten minutes gets nothing', async () => {
    const stage = await startBot();
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await settled(stage, question);
    stage.platform.time.advance(601_000);
    await settled(stage, stage.platform.edit(question, '<@U0LEADSMAN> interval KELP 90d'));
    expect(stage.asked).toHaveLength(1);
  });

  it('that mentions the bot only since the edit is answered', async () => {
    const stage = await startBot();
    const remark = stage.platform.say({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await settled(stage, stage.platform.edit(remark, '<@U0LEADSMAN> interval KELP 60d'));
    expect(stage.platform.posts.all).toMatchObject([
      { text: 'Reply to the edited question. Heard: interval KELP 60d' },
    ]);
  });
});

describe('a deleted question', () => {
  it('leaves its reply standing', async () => {
    const stage = await startBot({ subscriptions: everything });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    await settled(stage, question);
    const removal = stage.platform.remove(question);
    expect(removal.sent).toHaveLength(1);
    await settled(stage, removal);
    expect(stage.platform.deletions.all).toEqual([]);
    expect(stage.platform.posts.all).toHaveLength(1);
  });
});
