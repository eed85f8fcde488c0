import { describe, expect, it } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { mortalStore } from '../../doubles/mortalStore.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { accepted } from '../../laws/outcomes.ts';
import { answeringLater, type BotOptions, settled, spoken, startBot, startBotOn } from './bot.ts';

/** How long what a dead process held is held for it, and a round of the next to look for it. */
const leaseAndRoundMs = 40_000;

/** A bot whose store can be made to die under it. */
const startMortal = async (options: BotOptions = {}) => {
  const whole = accepted(await openSqlite(null));
  const { store, kill } = mortalStore(whole);
  const stage = await startBot({ ...options, store, dies: true });
  return { stage, whole, kill };
};

const textsOf = (posts: readonly { readonly text: string }[]) => posts.map(({ text }) => text);

/** The next bot, after the lease of the one before has run out. */
const takeOver = async (
  { stage, whole, kill }: Awaited<ReturnType<typeof startMortal>>,
  waitMs = leaseAndRoundMs,
  options: BotOptions = {},
) => {
  kill();
  stage.platform.time.advance(waitMs);
  return startBotOn(stage.platform, { ...options, store: whole });
};

describe('a question that was not answered before the process ended', () => {
  it('is answered by the next, once', async () => {
    const { conversation, questions } = answeringLater();
    const first = await startMortal({ conversation });
    first.stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await questions.next();
    const next = await takeOver(first);
    expect((await next.platform.posts.next()).text).toBe('Heard: interval KELP');
    await next.bot.idle();
    next.platform.time.advance(leaseAndRoundMs);
    await next.bot.idle();
    expect(next.asked).toHaveLength(1);
    expect(next.platform.posts.all).toHaveLength(1);
  });

  it('gets one line where it is older than ten minutes', async () => {
    const { conversation, questions } = answeringLater();
    const first = await startMortal({ conversation });
    const question = first.stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await questions.next();
    const next = await takeOver(first, 601_000);
    expect(await next.platform.posts.next()).toMatchObject({
      threadTs: question.ts,
      text: expect.stringContaining('asked while I was away'),
    });
    await next.bot.idle();
    expect(next.asked).toEqual([]);
  });

  it('is not taken from a bot that is alive', async () => {
    const { conversation, questions } = answeringLater();
    const whole = accepted(await openSqlite(null));
    const first = await startBot({ conversation, store: whole });
    const question = first.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const asked = await questions.next();
    const second = await startBotOn(first.platform, { store: whole });
    for (let round = 0; round < 20; round += 1) {
      first.platform.time.advance(7_000);
      await second.platform.time.timerSet(7_000, 4);
    }
    asked.answer(spoken('at last'));
    await settled(first, question);
    expect(second.asked).toEqual([]);
    expect(textsOf(first.platform.posts.all)).toEqual(['Working on it.', 'at last']);
  });

  it('is left to the operator after it has brought several down', async () => {
    const { conversation, questions } = answeringLater();
    let last = await startMortal({ conversation });
    last.stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const { whole, stage } = last;
    for (let died = 1; died <= 4; died += 1) {
      await questions.next();
      last.kill();
      stage.platform.time.advance(leaseAndRoundMs);
      const { store, kill } = mortalStore(whole);
      last = { stage: await startBotOn(stage.platform, { conversation, store, dies: true }), whole, kill };
    }
    const texts = [(await stage.platform.posts.next()).text];
    while (!texts.at(-1)?.includes('failed at this')) texts.push((await stage.platform.posts.next()).text);
    await last.stage.bot.idle();
    expect(texts.filter((text) => text.startsWith('Heard'))).toEqual([]);
  });
});

describe('what else was asked before the process ended', () => {
  it('a slash command is answered through its response address, and gets one line when it is old', async () => {
    for (const [waitMs, text] of [
      [leaseAndRoundMs, 'Heard: interval KELP'],
      [601_000, expect.stringContaining('asked while I was away')],
    ] as const) {
      const { conversation, questions } = answeringLater();
      const first = await startMortal({ conversation });
      first.stage.platform.command({ channel: 'C0DESK', text: 'interval KELP' });
      await questions.next();
      const next = await takeOver(first, waitMs);
      expect(await next.platform.responses.next()).toMatchObject({ text, responseType: 'ephemeral' });
      await next.bot.idle();
      expect(next.platform.responses.all).toHaveLength(1);
    }
  });

  it('a press on an answer is answered in its thread', async () => {
    const pressed = makeTray<null>('presses');
    const press = () => {
      pressed.add(null);
      return new Promise<never>(() => {});
    };
    const first = await startMortal({ conversation: { press } });
    const { platform } = first.stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    platform.press(await platform.posts.next(), 'working');
    await pressed.next();
    const next = await takeOver(first);
    expect(await platform.posts.next()).toMatchObject({
      text: 'Working of: interval KELP',
      threadTs: question.ts,
    });
    await next.bot.idle();
    expect(platform.posts.all).toHaveLength(2);
  });
});

describe('an answer that was posted by a process that ended before it could note it', () => {
  it.each(['is found', 'is posted again where it never arrived'])('%s', async (what) => {
    const first = await startMortal();
    const { platform } = first.stage;
    const accepts = what === 'is found';
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: accepts });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.time.timerSet(20_000);
    const next = await takeOver(first);
    if (!accepts) {
      // the dead one looks too, and gets no further
      await platform.time.timerSet(15_000, 2);
      platform.time.advance(15_000);
    }
    await settled(next, question);
    expect(textsOf(platform.posts.all)).toEqual(['Heard: interval KELP']);
  });

  it('gets no line in its place, however much later it is found', async () => {
    const first = await startMortal();
    const { platform } = first.stage;
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.posts.next();
    const next = await takeOver(first, 601_000);
    await platform.time.timerSet(7_000, 2);
    await next.bot.idle();
    platform.time.advance(leaseAndRoundMs);
    await next.bot.idle();
    expect(textsOf(platform.posts.all)).toEqual(['Heard: interval KELP']);
    expect(accepted(await first.whole.inbox.takeOver({ holder: 'x', untilMs: 0 }, 9e15, [], 9))).toEqual([]);
  });

  it('takes the placeholder away that the first has left', async () => {
    const { conversation, questions } = answeringLater();
    const first = await startMortal({ conversation });
    const { platform } = first.stage;
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await questions.next();
    platform.time.advance(1_500);
    const placeholder = await platform.posts.next();
    // the platform's word of it has to be noted before the process ends
    await platform.time.timerGone(1_500);
    await first.stage.platform.calls.next();
    const next = await takeOver(first);
    expect((await platform.posts.next()).text).toBe('Heard: interval KELP');
    expect((await platform.deletions.next()).ts).toBe(placeholder.ts);
    await next.bot.idle();
    expect(platform.posts.all).toHaveLength(2);
  });

  it('is not said a second time where the placeholder had become it', async () => {
    const { conversation, questions } = answeringLater();
    const first = await startMortal({ conversation });
    const { platform } = first.stage;
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const asked = await questions.next();
    platform.time.advance(1_500);
    await platform.posts.next();
    platform.faults.next('chat.update', { kind: 'silent', accepted: true });
    asked.answer(spoken('Heard: interval KELP'));
    await platform.updates.next();
    const next = await takeOver(first);
    await next.bot.idle();
    await platform.updates.next();
    await next.bot.idle();
    expect(textsOf(platform.posts.all)).toEqual(['Working on it.']);
    expect(textsOf(platform.updates.all)).toEqual(['Heard: interval KELP', 'Heard: interval KELP']);
    expect(platform.deletions.all).toEqual([]);
  });
});

describe('two bots on one store', () => {
  const together = async () => {
    const store = accepted(await openSqlite(null));
    const first = await startBot({ store });
    const second = await startBotOn(first.platform, { store });
    await first.platform.sockets.connected(4);
    return { first, second, platform: first.platform };
  };

  it('answer an event that reaches both once', async () => {
    const { first, second, platform } = await together();
    platform.sockets.loseAcknowledgements(true);
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.posts.next();
    platform.sockets.loseAcknowledgements(false);
    platform.time.advance(3_000);
    await settled(second, question);
    await settled(first, question);
    expect(question.sent[0]?.attempts()).toBe(2);
    expect([...first.asked, ...second.asked]).toHaveLength(1);
    expect(platform.posts.all).toHaveLength(1);
  });

  it('know each other’s answers when a question is edited', async () => {
    const { first, second, platform } = await together();
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    const answer = await platform.posts.next();
    await settled(first, question);
    await settled(second, question);
    const same = platform.edit(question, '<@U0LEADSMAN> interval  KELP');
    await settled(first, same);
    await settled(second, same);
    expect(platform.posts.all).toHaveLength(1);
    const other = platform.edit(question, '<@U0LEADSMAN> interval TARN');
    expect((await platform.posts.next()).text).toContain('Heard: interval TARN');
    await settled(first, other);
    await settled(second, other);
    expect(platform.updates.all).toMatchObject([
      { ts: answer.ts, text: expect.stringContaining('Superseded') },
    ]);
    expect([...first.asked, ...second.asked]).toHaveLength(2);
  });

  it('deliver what is said under one key by both once, as it was first said', async () => {
    const { first, second, platform } = await together();
    const saying = {
      key: 'digest:T0DESK:D-1:5',
      team: 'T0DESK',
      channel: 'C0DESK',
      threadTs: null,
      content: { text: 'the morning', blocks: [] },
      urgent: false,
      expiresAtMs: null,
    };
    const said = first.bot.deliveries.say(saying);
    const again = second.bot.deliveries.say({ ...saying, content: { text: 'another', blocks: [] } });
    const outcome = await said;
    const { ts } = await platform.posts.next();
    await platform.time.timerSet(1_000);
    platform.time.advance(1_000);
    expect([outcome, await again]).toEqual([
      { kind: 'said', ts },
      { kind: 'said', ts },
    ]);
    expect(textsOf(platform.posts.all)).toEqual(['the morning']);
    expect(await second.bot.deliveries.say(saying)).toEqual(outcome);
  });
});
