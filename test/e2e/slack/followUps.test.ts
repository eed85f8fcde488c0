/** Follow-ups in threads, with a mention and, where the desk has it so, without. */
import { describe, expect, it } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { accepted } from '../../laws/outcomes.ts';
import { demoConversation } from '../demoDesk.ts';
import { settled, startBot } from './bot.ts';

const everything = ['app_mention', 'message.channels', 'message.im'];

const whole = async (listensInThreads: boolean, mode: 'socket' | 'http' = 'socket') => {
  const conversation = await demoConversation(listensInThreads);
  const stage = await startBot({ conversation, mode, subscriptions: everything });
  const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
  await stage.platform.posts.next();
  return { stage, platform: stage.platform, thread: question.ts };
};

describe.each(['socket', 'http'] as const)('over %s a follow-up', (mode) => {
  it('that mentions the bot carries over from the thread, and says what', async () => {
    const { platform, thread } = await whole(false, mode);
    platform.mention({ channel: 'C0DESK', text: 'same at 99%', thread });
    const post = await platform.posts.next();
    expect(post.threadTs).toBe(thread);
    expect(post.text).toContain('at 99% the true mean lies');
    expect(post.text).toContain('Assumed: interval KELP 60d (carried over)');
    platform.mention({ channel: 'C0DESK', text: 'TARN', thread });
    expect((await platform.posts.next()).text).toMatch(/^TARN’s mean daily return over 60 days/);
  });

  it('that does not gets silence unless the desk has it otherwise', async () => {
    const { stage, thread } = await whole(false, mode);
    const remark = stage.platform.say({ channel: 'C0DESK', text: 'at 99%', thread });
    await settled(stage, remark);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('that does not is answered where the desk has it so and every word is read', async () => {
    const { stage, platform, thread } = await whole(true, mode);
    platform.say({ channel: 'C0DESK', text: 'at 99%', thread });
    expect(await platform.posts.next()).toMatchObject({
      threadTs: thread,
      text: expect.stringContaining('at 99% the true mean lies'),
    });
    const remarks = ['what do you make of it?', 'TARN I think', 'thanks', 'help'].map((text) =>
      platform.say({ channel: 'C0DESK', text, thread }),
    );
    const outside = platform.say({ channel: 'C0DESK', text: 'interval TARN 60d' });
    await settled(stage, ...remarks, outside);
    expect(platform.posts.all).toHaveLength(2);
    expect(platform.ephemerals.all).toEqual([]);
    expect(stage.log).toEqual([]);
  });
});

it('what is overheard reaches neither the inbox nor the log, where a mention would', async () => {
  const store = accepted(await openSqlite(null));
  const conversation = await demoConversation(true);
  const stage = await startBot({ conversation, store, subscriptions: everything });
  const { platform } = stage;
  const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
  const remark = platform.say({ channel: 'C0DESK', text: 'our client wants out', thread: question.ts });
  const followUp = platform.say({ channel: 'C0DESK', text: 'at 99%', thread: question.ts });
  await settled(stage, question, remark, followUp);
  const keptOf = async ({ ts }: { readonly ts: string }) =>
    accepted(await store.inbox.ofMessage(JSON.stringify(['T0DESK', 'C0DESK', ts]))).length;
  expect([await keptOf(question), await keptOf(remark), await keptOf(followUp)]).toEqual([1, 0, 0]);
  expect(stage.log).toEqual([]);
});
