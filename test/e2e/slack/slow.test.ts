import { describe, expect, it } from 'vitest';
import { answeringLater, settled, spoken, startBot } from './bot.ts';

/** A bot with one question under way whose answer is still awaited. */
const askSlowly = async (breaksLimits = false) => {
  const { questions, conversation } = answeringLater();
  const stage = await startBot({ conversation, breaksLimits });
  const question = stage.platform.mention({ channel: 'C0DESK', text: 'backtest KELP' });
  const asked = await questions.next();
  return { ...stage, stage, question, asked };
};

describe('an answer that takes long', () => {
  it('shows no placeholder within a second and a half', async () => {
    const { platform, asked, stage, question } = await askSlowly();
    platform.time.advance(1_499);
    asked.answer(spoken('quick'));
    expect((await platform.posts.next()).text).toBe('quick');
    platform.time.advance(60_000);
    await settled(stage, question);
    expect(platform.posts.all).toHaveLength(1);
  });

  it('under ten seconds takes the place of the placeholder', async () => {
    const { platform, asked, stage, question } = await askSlowly();
    platform.time.advance(1_500);
    const placeholder = await platform.posts.next();
    expect(placeholder).toMatchObject({ threadTs: question.ts, text: 'Working on it.' });
    platform.time.advance(8_499);
    asked.answer(spoken('at 9.999 s'), spoken('and more'));
    expect(await platform.updates.next()).toMatchObject({ ts: placeholder.ts, text: 'at 9.999 s' });
    expect((await platform.posts.next()).text).toBe('and more');
    await settled(stage, question);
    expect(platform.deletions.all).toEqual([]);
  });

  it('from ten seconds on is a new reply, and the placeholder goes', async () => {
    const { platform, asked, stage, question } = await askSlowly();
    platform.time.advance(1_500);
    const placeholder = await platform.posts.next();
    platform.time.advance(8_500);
    asked.answer(spoken('at 10 s'));
    expect(await platform.posts.next()).toMatchObject({ threadTs: question.ts, text: 'at 10 s' });
    expect(await platform.deletions.next()).toMatchObject({ ts: placeholder.ts });
    await settled(stage, question);
    expect(platform.updates.all).toEqual([]);
  });

  it('that is a refusal after all is said privately, and the placeholder goes', async () => {
    const { platform, asked } = await askSlowly();
    platform.time.advance(1_500);
    const placeholder = await platform.posts.next();
    asked.answer(spoken('cannot be told', { private: true }));
    expect((await platform.ephemerals.next()).text).toBe('cannot be told');
    expect((await platform.deletions.next()).ts).toBe(placeholder.ts);
  });

  it.each([
    ['cannot be edited', { kind: 'refused', error: 'edit_window_closed' }],
    ['may or may not have been edited', { kind: 'dropped', accepted: true }],
  ] as const)('whose placeholder %s becomes a new reply', async (_, fault) => {
    const { platform, asked } = await askSlowly();
    platform.time.advance(1_500);
    await platform.posts.next();
    platform.faults.next('chat.update', fault);
    asked.answer(spoken('new then'));
    expect((await platform.posts.next()).text).toBe('new then');
    await platform.deletions.next();
  });

  it('does not wait for leave to edit the placeholder', async () => {
    const { platform, asked } = await askSlowly();
    platform.time.advance(1_500);
    await platform.posts.next();
    platform.faults.next('chat.update', { kind: 'limited', retryAfterSeconds: 30 });
    asked.answer(spoken('new then'));
    expect((await platform.posts.next()).text).toBe('new then');
    await platform.time.timerSet(30_000);
    platform.time.advance(30_000);
    await platform.deletions.next();
  });

  it('whose blocks are refused takes the place of the placeholder as text alone', async () => {
    const { platform, asked, log } = await askSlowly(true);
    platform.time.advance(1_500);
    const placeholder = await platform.posts.next();
    asked.answer(spoken('plain words', { blocks: [{ type: 'banner' }] }));
    expect(await platform.updates.next()).toMatchObject({
      ts: placeholder.ts,
      text: 'plain words',
      blocks: [],
    });
    expect(log).toMatchObject([{ level: 'error' }]);
  });

  it('says how far it has come at most every five seconds', async () => {
    const { platform, asked, stage, question } = await askSlowly();
    platform.time.advance(1_500);
    await platform.posts.next();
    asked.progress?.('100 of 500 days');
    asked.progress?.('150 of 500 days');
    await platform.time.timerSet(5_000);
    platform.time.advance(4_999);
    asked.progress?.('200 of 500 days');
    platform.time.advance(1);
    expect((await platform.updates.next()).text).toBe('Working on it. 200 of 500 days');
    asked.progress?.('300 of 500 days');
    await platform.time.timerSet(5_000);
    platform.time.advance(4_999);
    asked.answer(spoken('done'));
    expect((await platform.posts.next()).text).toBe('done');
    await settled(stage, question);
    expect(platform.updates.all).toHaveLength(1);
  });
});
