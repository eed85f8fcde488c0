import { describe, expect, it } from 'vitest';
import { deliveryIdOf } from '../../../src/workspaces/slack/durable/outbox.ts';
import { replyKey } from '../../../src/workspaces/slack/keys.ts';
import { settled, spoken, startBot } from './bot.ts';

const identifiersOf = (posts: readonly { readonly metadata: { readonly event_payload: object } | null }[]) =>
  posts.map(({ metadata }) => metadata?.event_payload);

/** The delivery id of the only reply to a question in a place. */
const idOfReply = (channel: string, ts: string) =>
  deliveryIdOf(replyKey(JSON.stringify(['T0DESK', channel, ts, null]), 0));

const callsOf = (calls: readonly { readonly method: string; readonly outcome: string }[], method: string) =>
  calls.filter((call) => call.method === method).map(({ outcome }) => outcome);

describe('a post', () => {
  it('waits as long as the platform says and is then made', async () => {
    const stage = await startBot();
    const { platform } = stage;
    platform.faults.next('chat.postMessage', { kind: 'limited', retryAfterSeconds: 30 });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.time.timerSet(30_000);
    platform.time.advance(29_999);
    platform.mention({ channel: 'C0RATES', text: 'elsewhere meanwhile' });
    expect((await platform.posts.next()).channel).toBe('C0RATES');
    platform.time.advance(1);
    expect((await platform.posts.next()).channel).toBe('C0DESK');
    await settled(stage, question);
  });

  it.each([
    ['status 500', { kind: 'status', status: 500, accepted: true }],
    ['a broken connection', { kind: 'dropped', accepted: true }],
    ['an error that leaves it open', { kind: 'refused', error: 'internal_error' }],
  ] as const)('answered by %s is looked for after twenty seconds before it is repeated', async (_, fault) => {
    const stage = await startBot();
    const { platform } = stage;
    platform.faults.next('chat.postMessage', fault);
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.time.timerSet(20_000);
    expect(callsOf(platform.calls.all, 'conversations.replies')).toEqual([]);
    platform.time.advance(20_000);
    if (fault.kind === 'refused') {
      await platform.time.timerSet(15_000);
      platform.time.advance(15_000);
    }
    await settled(stage, question);
    expect(platform.posts.all).toHaveLength(1);
    expect(platform.posts.all[0]).toMatchObject({ threadTs: question.ts });
    expect(stage.log).toEqual([]);
  });

  it('that was never made is repeated under its delivery id, after two looks fifteen seconds apart', async () => {
    const stage = await startBot();
    const { platform } = stage;
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: false });
    const question = platform.direct({ text: 'interval KELP' });
    await platform.time.timerSet(20_000);
    platform.time.advance(20_000);
    await platform.time.timerSet(15_000);
    expect(callsOf(platform.calls.all, 'conversations.history')).toEqual(['ok']);
    expect(platform.posts.all).toEqual([]);
    platform.time.advance(15_000);
    await settled(stage, question);
    expect(callsOf(platform.calls.all, 'conversations.history')).toEqual(['ok', 'ok']);
    expect(identifiersOf(platform.posts.all)).toEqual([{ id: idOfReply(question.channel, question.ts) }]);
  });

  it('is not taken for found where another app has posted under the same id', async () => {
    const stage = await startBot();
    const { platform } = stage;
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: false });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const id = idOfReply(question.channel, question.ts);
    const metadata = { event_type: 'leadsman_delivery', event_payload: { id } };
    const desk = platform.workspace.channels.get('C0DESK');
    if (desk === undefined) throw new Error('no desk');
    platform.workspace.say(desk, { user: 'U0OTHER', botId: 'B0OTHER', threadTs: question.ts, metadata });
    await platform.time.timerSet(20_000);
    platform.time.advance(20_000);
    await platform.time.timerSet(15_000);
    platform.time.advance(15_000);
    await settled(stage, question);
    expect(platform.posts.all).toHaveLength(1);
  });

  it('is found on whichever page it stands, among the posts of others', async () => {
    const stage = await startBot();
    const { platform } = stage;
    const opening = platform.say({ channel: 'C0DESK', text: 'a long thread' });
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: true });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP', thread: opening.ts });
    await platform.posts.next();
    await platform.time.timerSet(20_000);
    for (let count = 0; count < 450; count += 1)
      platform.say({ channel: 'C0DESK', text: 'more', thread: opening.ts, user: 'U0BEN' });
    const moved = platform.workspace.channels.get('C0DESK')?.messages ?? [];
    moved.push(...moved.splice(2, 1));
    platform.time.advance(20_000);
    await settled(stage, question);
    expect(callsOf(platform.calls.all, 'conversations.replies')).toEqual(['ok', 'ok', 'ok']);
    expect(platform.posts.all).toHaveLength(1);
  });

  it('whose answer is lost is not repeated without the scopes to look for it, and the operator is told', async () => {
    const scopes = ['app_mentions:read', 'chat:write', 'channels:history'];
    const stage = await startBot({ scopes });
    const { platform, log } = stage;
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: false });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.time.timerSet(20_000);
    platform.time.advance(20_000);
    await settled(stage, question);
    expect(platform.posts.all).toEqual([]);
    expect(log.filter(({ level }) => level === 'error')).toHaveLength(1);
  });

  it('whose blocks are refused goes out as text alone, and the operator is told', async () => {
    const table = { type: 'table', rows: [[{ type: 'raw_text', text: '' }]] };
    const stage = await startBot({
      breaksLimits: true,
      conversation: { converse: () => Promise.resolve([spoken('plain words', { blocks: [table] })]) },
    });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    expect(await stage.platform.posts.next()).toMatchObject({ text: 'plain words', blocks: [] });
    await settled(stage, question);
    expect(callsOf(stage.platform.calls.all, 'chat.postMessage')).toEqual(['invalid_blocks', 'ok']);
    expect(stage.log).toMatchObject([{ level: 'error' }]);
  });

  it('whose delivery id the platform drops is made once, and the operator is told', async () => {
    const stage = await startBot();
    stage.platform.faults.next('chat.postMessage', { kind: 'warned', warning: 'invalid_metadata_schema' });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await settled(stage, question);
    expect(stage.platform.posts.all).toHaveLength(1);
    expect(stage.log).toMatchObject([{ level: 'error' }]);
  });

  it.each(['not_in_channel', 'is_archived', 'restricted_action'])(
    'refused with %s is given up, and the operator is told',
    async (error) => {
      const stage = await startBot();
      stage.platform.faults.next('chat.postMessage', { kind: 'refused', error });
      await settled(stage, stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' }));
      expect(callsOf(stage.platform.calls.all, 'chat.postMessage')).toEqual([error]);
      expect(stage.log).toEqual([
        { level: 'error', message: `A message to C0DESK was not delivered: ${error}.` },
      ]);
    },
  );

  it('keeps to one message a second in a channel after a short burst', async () => {
    const { platform } = await startBot({
      conversation: {
        converse: () => Promise.resolve(['1', '2', '3', '4', '5'].map((text) => spoken(text))),
      },
    });
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    for (const text of ['1', '2', '3']) expect((await platform.posts.next()).text).toBe(text);
    await platform.time.timerSet(1_000);
    platform.time.advance(999);
    expect(platform.posts.all).toHaveLength(3);
    platform.time.advance(1);
    expect((await platform.posts.next()).text).toBe('4');
    await platform.time.timerSet(1_000);
    platform.time.advance(1_000);
    expect((await platform.posts.next()).text).toBe('5');
  });
});

describe('a private refusal', () => {
  it('is not repeated where its answer was lost', async () => {
    const stage = await startBot();
    stage.platform.faults.next('chat.postEphemeral', { kind: 'dropped', accepted: true });
    await settled(stage, stage.platform.mention({ channel: 'C0DESK', text: 'refuse this' }));
    expect(stage.platform.ephemerals.all).toHaveLength(1);
    expect(stage.log).toMatchObject([{ level: 'warn' }]);
  });
});

describe('a fault of our own', () => {
  it('is told privately to the one who asked, and logged', async () => {
    const { platform, log } = await startBot({
      conversation: { converse: () => Promise.reject(new Error('out of order')) },
    });
    platform.mention({ channel: 'C0DESK', text: 'interval KELP', user: 'U0BEN' });
    expect((await platform.ephemerals.next()).user).toBe('U0BEN');
    expect(log).toEqual([{ level: 'error', message: 'A question ran into a fault: Error: out of order' }]);
  });
});
