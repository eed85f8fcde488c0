/** Pictures in the workspace: uploaded by the real client to the stand-in and shown in the thread. */
import { beforeAll, describe, expect, it } from 'vitest';
import type { Conversation } from '../../../src/workspaces/slack/ports.ts';
import { emptyPng } from '../../doubles/drawing.ts';
import { everyScope } from '../../doubles/platform/start.ts';
import { demoConversation } from '../demoDesk.ts';
import { settled, startBot } from './bot.ts';

let conversation: Conversation;
beforeAll(async () => {
  conversation = await demoConversation();
});

const pauseMs = 1_000;

describe.each(['socket', 'http'] as const)('over %s', (mode) => {
  it('a picture follows the answer in its thread, uploaded without a channel, with alt text and a delivery id', async () => {
    const stage = await startBot({ conversation, mode });
    const { platform } = stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d as picture' });
    const answer = await platform.posts.next();
    const shown = await platform.posts.next();
    await settled(stage, question);
    const [file, ...others] = [...platform.files.values()];
    expect(others).toEqual([]);
    expect(file?.bytes).toEqual(Buffer.from(emptyPng));
    expect(file?.altText).toMatch(/^Interval ladder\. KELP’s mean daily return over 60 days is /);
    expect([answer.threadTs, shown.threadTs]).toEqual([question.ts, question.ts]);
    expect(shown.blocks).toMatchObject([
      { type: 'image', slack_file: { id: file?.id }, alt_text: expect.stringMatching(/^Interval ladder\./) },
    ]);
    expect(shown.text).toMatch(/^Interval ladder\./);
    expect(shown.metadata?.event_payload).not.toEqual(answer.metadata?.event_payload);
    expect(stage.log).toEqual([]);
    expect(platform.limitFaults).toEqual([]);
  });

  it('the button under an answer draws it', async () => {
    const { platform } = await startBot({ conversation, mode });
    const question = platform.mention({ channel: 'C0DESK', text: 'tail KELP by historical' });
    const answer = await platform.posts.next();
    platform.press(answer, 'picture');
    expect((await platform.posts.next()).text).toMatch(/^The picture of R-/);
    const shown = await platform.posts.next();
    expect(shown.threadTs).toBe(question.ts);
    expect(shown.text).toContain('99% VaR of a day');
  });
});

describe('an uploaded picture', () => {
  it('that the platform still looks at is shown a little later', async () => {
    const stage = await startBot({ conversation });
    const { platform } = stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'feed as picture' });
    await platform.posts.next();
    await platform.uploads.next();
    for (const file of platform.files.values()) file.refusalsLeft = 2;
    await platform.time.timerSet(pauseMs);
    platform.time.advance(pauseMs);
    await platform.time.timerSet(pauseMs);
    platform.time.advance(pauseMs);
    const shown = await platform.posts.next();
    await settled(stage, question);
    expect(shown.blocks).toMatchObject([{ type: 'image' }]);
    expect(stage.log).toEqual([]);
  });

  it('that never becomes ready is said in words after five seconds', async () => {
    const stage = await startBot({ conversation });
    const { platform } = stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'feed KELP as picture' });
    await platform.posts.next();
    await platform.uploads.next();
    for (const file of platform.files.values()) file.refusalsLeft = 100;
    for (let seconds = 0; seconds < 5; seconds += 1) {
      await platform.time.timerSet(pauseMs);
      platform.time.advance(pauseMs);
    }
    const shown = await platform.posts.next();
    await settled(stage, question);
    expect(shown.blocks).toEqual([]);
    expect(shown.text).toMatch(/^Closes of KELP, /);
    expect(stage.log.map(({ level }) => level)).toEqual(['error']);
  });

  it('whose upload breaks is uploaded anew', async () => {
    const stage = await startBot({ conversation });
    const { platform } = stage;
    platform.faults.next('files.completeUploadExternal', { kind: 'status', status: 500, accepted: false });
    const question = platform.mention({ channel: 'C0DESK', text: 'shape KELP as picture' });
    await platform.time.timerSet(pauseMs);
    platform.time.advance(pauseMs);
    await platform.posts.next();
    expect((await platform.posts.next()).blocks).toMatchObject([{ type: 'image' }]);
    await settled(stage, question);
    expect([...platform.files.values()].map(({ completed }) => completed)).toEqual([false, true]);
  });
});

describe('where pictures cannot be shown', () => {
  it('the app without the scope says so, with what the picture would show', async () => {
    const scopes = everyScope.filter((scope) => scope !== 'files:write');
    const { platform } = await startBot({ conversation, scopes });
    platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d as picture' });
    await platform.posts.next();
    const instead = await platform.posts.next();
    expect(instead.text).toContain('lacks the permission files:write');
    expect(instead.text).toContain('Interval ladder');
    expect([...platform.files.values()]).toEqual([]);
  });

  it('a ticker’s closes stand as bars of text', async () => {
    const scopes = everyScope.filter((scope) => scope !== 'files:write');
    const { platform } = await startBot({ conversation, scopes });
    platform.mention({ channel: 'C0DESK', text: 'feed KELP as picture' });
    await platform.posts.next();
    expect((await platform.posts.next()).text).toMatch(/[▁▂▃▄▅▆▇█]{40}/);
  });

  it('a refused upload is said, and the operator is told', async () => {
    const stage = await startBot({ conversation });
    const { platform } = stage;
    platform.faults.next('files.getUploadURLExternal', { kind: 'refused', error: 'file_uploads_disabled' });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d as picture' });
    await platform.posts.next();
    expect((await platform.posts.next()).text).toContain('could not be uploaded');
    await settled(stage, question);
    expect(stage.log).toMatchObject([
      { level: 'error', message: expect.stringContaining('file_uploads_disabled') },
    ]);
  });
});

it('a slash command gets its picture privately', async () => {
  const { platform } = await startBot({ conversation });
  platform.command({ channel: 'C0DESK', text: 'interval KELP 60d as picture' });
  await platform.responses.next();
  const shown = await platform.responses.next();
  expect(shown).toMatchObject({ responseType: 'ephemeral', blocks: [{ type: 'image' }] });
});
