/** The whole bot in the workspace: real prices, real answers, real Bolt and its real client, against the stand-in. */
import { beforeAll, describe, expect, it } from 'vitest';
import type { Conversation } from '../../../src/workspaces/slack/ports.ts';
import { demoConversation } from '../demoDesk.ts';
import { startBot } from './bot.ts';

let conversation: Conversation;
beforeAll(async () => {
  conversation = await demoConversation();
});

const blockTypes = (blocks: unknown): readonly unknown[] =>
  (blocks as readonly { readonly type: string }[]).map(({ type }) => type);

describe.each(['socket', 'http'] as const)('over %s', (mode) => {
  it('a mention is answered in its thread with sentence, table, context and one button', async () => {
    const { platform } = await startBot({ conversation, mode });
    const question = platform.mention({
      channel: 'C0DESK',
      text: 'what’s the interval for KELP, 60d please',
    });
    const post = await platform.posts.next();
    expect(post.threadTs).toBe(question.ts);
    expect(post.text).toMatch(/^KELP’s mean daily return over 60 days is /);
    expect(blockTypes(post.blocks)).toEqual(['section', 'table', 'context', 'context', 'actions']);
  });

  it('the button shows the working in the same thread', async () => {
    const { platform } = await startBot({ conversation, mode });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    const answer = await platform.posts.next();
    platform.press(answer, 'working');
    const working = await platform.posts.next();
    expect(working.threadTs).toBe(question.ts);
    expect(working.text).toMatch(/^The working of R-/);
  });

  it('a refusal is private and says what would be right', async () => {
    const { platform } = await startBot({ conversation, mode });
    platform.mention({ channel: 'C0DESK', text: 'interval KEPL 60d', user: 'U0BEN' });
    const refusal = await platform.ephemerals.next();
    expect(refusal).toMatchObject({ user: 'U0BEN', shown: true });
    expect(refusal.text).toContain('Try: interval KELP 60d');
  });

  it('a direct message and the slash command are answered where they were asked', async () => {
    const { platform } = await startBot({ conversation, mode });
    platform.direct({ text: 'interval vol TARN 3m' });
    expect((await platform.posts.next()).text).toMatch(/^TARN’s daily volatility/);
    platform.command({ channel: 'C0DESK', text: 'feed KELP' });
    expect((await platform.responses.next()).text).toMatch(/^KELP has \d+ prices/);
  });
});

describe('every verb', () => {
  it.each([
    'claim KELP 20bp',
    'need KELP 5bp',
    'compare KELP TARN',
    'compare KELP TARN WRACK',
    'tail KELP on 2m USD',
    'tail KELP beyond 4%',
    'tail KELP 60d',
    'shape KELP',
    'backtest KELP',
    'interval KELP as json',
    'feed',
    'help',
    'help tail',
  ])('%s makes a message that the platform takes', async (text) => {
    const { platform, log } = await startBot({ conversation });
    platform.direct({ text });
    const post = await platform.posts.next();
    expect(blockTypes(post.blocks).length).toBeGreaterThan(0);
    expect(log.filter(({ level }) => level === 'error')).toEqual([]);
  });
});
