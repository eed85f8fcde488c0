/** Every surface and button, with the real chat library, over sockets and over HTTP. */
import { describe, expect, it } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { everythingAllowed } from '../../../src/workspaces/permissions.ts';
import { accepted } from '../../laws/outcomes.ts';
import { demoConversation } from '../demoDesk.ts';
import { settled, spoken, startBot } from './bot.ts';

const modes = ['socket', 'http'] as const;
const subscriptions = ['app_mention', 'message.im', 'app_home_opened'];

/** What the app answered with: an object over a socket, text over HTTP. */
const answerOf = async (sent: { readonly acknowledged: Promise<unknown> }): Promise<unknown> => {
  const answer = await sent.acknowledged;
  return typeof answer === 'string' && answer !== '' ? JSON.parse(answer) : answer;
};

const textsIn = (view: unknown): string => JSON.stringify(view);

describe.each(modes)('over %s', (mode) => {
  const whole = async (more: Parameters<typeof demoConversation>[1] = {}) =>
    startBot({ conversation: await demoConversation(false, more), mode, subscriptions });

  describe('the slash command', () => {
    it('is answered privately, and its button shares the answer with the channel', async () => {
      const stage = await whole();
      stage.platform.command({ channel: 'C0DESK', user: 'U0BEN', text: 'interval KELP 60d' });
      const answer = await stage.platform.responses.next();
      expect(answer.responseType).toBe('ephemeral');
      const shown = { ...answer, ts: '1.0', threadTs: null, args: {}, shown: true };
      stage.platform.press(shown, 'share', 'U0BEN');
      const shared = await stage.platform.posts.next();
      expect(shared).toMatchObject({ channel: 'C0DESK', threadTs: null });
      expect(shared.text).toMatch(/^Shared from a private answer\. KELP’s mean daily return/);
    });

    it('in a channel the bot is not in shares through the platform, and says that nobody can pin it', async () => {
      const stage = await whole();
      stage.platform.command({ channel: 'C0ELSEWHERE', text: 'interval KELP 60d' });
      const answer = await stage.platform.responses.next();
      const press = stage.platform.press(
        { ...answer, ts: '1.0', threadTs: null, args: {}, shown: true },
        'share',
      );
      const shared = await stage.platform.responses.next();
      expect(shared).toMatchObject({ responseType: 'in_channel', channel: 'C0ELSEWHERE' });
      expect(shared.text).toContain('cannot be pinned');
      await settled(stage, { sent: [press] });
      expect(stage.platform.posts.all).toEqual([]);
    });

    it('has other buttons, which answer privately too', async () => {
      const stage = await whole();
      stage.platform.command({ channel: 'C0DESK', text: 'interval KELP 60d' });
      const answer = await stage.platform.responses.next();
      const shown = { ...answer, ts: '1.0', threadTs: null, args: {}, shown: true };
      stage.platform.press(shown, 'working');
      expect(await stage.platform.responses.next()).toMatchObject({
        responseType: 'ephemeral',
        text: expect.stringMatching(/^The working of R-/),
      });
      stage.platform.press(shown, 'level');
      expect((await stage.platform.responses.next()).text).toContain('at 99% the true mean');
    });

    it('offers no sharing in a direct conversation', async () => {
      const { platform } = await whole();
      platform.direct({ text: 'help' });
      await platform.posts.next();
      platform.command({ channel: 'D0ADA', text: 'interval KELP 60d' });
      expect(textsIn((await platform.responses.next()).blocks)).not.toContain('"share"');
    });
  });

  describe('a button under an answer', () => {
    const answered = async () => {
      const stage = await whole();
      const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
      return { stage, question, answer: await stage.platform.posts.next() };
    };

    it.each([
      ['working', /^The working of R-/],
      ['more', /^More figures of R-/],
      ['level', /at 99% the true mean lies/],
      ['level.2', /at 90% the true mean lies/],
    ])('%s is answered in the thread', async (action, expected) => {
      const { stage, question, answer } = await answered();
      stage.platform.press(answer, action, 'U0BEN');
      const post = await stage.platform.posts.next();
      expect(post).toMatchObject({ threadTs: question.ts, text: expect.stringMatching(expected) });
    });

    it('is answered once, however often and by whomever it is pressed within a minute', async () => {
      const { stage, answer } = await answered();
      const presses = ['U0ADA', 'U0BEN', 'U0ADA'].map((user) => stage.platform.press(answer, 'more', user));
      await stage.platform.posts.next();
      await settled(stage, { sent: presses });
      expect(stage.platform.posts.all).toHaveLength(2);
      stage.platform.time.advance(60_000);
      stage.platform.press(answer, 'more');
      expect((await stage.platform.posts.next()).text).toMatch(/^More figures of R-/);
    });

    it('is refused privately to who may not read the answer', async () => {
      const stage = await whole({
        permissions: { ...everythingAllowed, mayRead: ({ from }) => from.person === 'U0ADA' },
      });
      stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
      stage.platform.press(await stage.platform.posts.next(), 'working', 'U0BEN');
      expect(await stage.platform.ephemerals.next()).toMatchObject({
        user: 'U0BEN',
        text: expect.stringMatching(/^There is no answer R-\w+ on record that can be shown here/),
      });
    });
  });

  describe('the message shortcut', () => {
    it('on a message of somebody else gets a polite refusal', async () => {
      const stage = await whole();
      const remark = stage.platform.say({ channel: 'C0DESK', text: 'KELP looks quiet' });
      const chosen = stage.platform.messageShortcut(remark, 'pin_result');
      expect(await stage.platform.responses.next()).toMatchObject({
        responseType: 'ephemeral',
        text: expect.stringMatching(/^Only an answer of the bot itself can be pinned/),
      });
      await settled(stage, { sent: [chosen] });
      expect(stage.platform.pins.all).toEqual([]);
    });

    it('on a message of the bot that is no answer gets the same', async () => {
      const { platform } = await whole();
      platform.mention({ channel: 'C0DESK', text: 'help' });
      platform.messageShortcut(await platform.posts.next(), 'pin_result');
      expect((await platform.responses.next()).text).toMatch(/^Only an answer of the bot itself/);
    });

    it('on an answer does what its button to pin does', async () => {
      const { platform, pressed } = await startBot({
        mode,
        conversation: {
          converse: (await demoConversation()).converse,
          press: () => Promise.resolve([spoken('pinned')]),
        },
      });
      const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
      platform.messageShortcut(await platform.posts.next(), 'pin_result', 'U0BEN');
      expect(await platform.posts.next()).toMatchObject({ threadTs: question.ts, text: 'pinned' });
      expect(pressed).toMatchObject([
        {
          actionId: 'pin',
          place: 'channel',
          value: expect.stringContaining('"id":"R-'),
          from: { person: 'U0BEN' },
        },
      ]);
    });
  });

  describe('the form of the global shortcut', () => {
    const filled = { verb: 'tail', ticker: 'KELP', window: '250d', level: '97.5%', place: 'C0RATES' };

    const opened = async (more: Parameters<typeof demoConversation>[1] = {}) => {
      const stage = await whole(more);
      stage.platform.shortcut('ask_form');
      expect(await stage.platform.views.next()).toMatchObject({ kind: 'open' });
      return stage;
    };

    it('opens within the three seconds of its trigger', async () => {
      const { platform, log } = await opened();
      expect(platform.calls.all.at(-1)).toMatchObject({ method: 'views.open', outcome: 'ok' });
      expect(log).toEqual([]);
    });

    it('opens while the store stands still', async () => {
      const store = accepted(await openSqlite(null));
      const never = () => new Promise<never>(() => {});
      const { platform } = await startBot({
        conversation: await demoConversation(),
        mode,
        store: { ...store, inbox: { ...store.inbox, keep: never } },
      });
      platform.shortcut('ask_form');
      expect(await platform.views.next()).toMatchObject({ kind: 'open' });
    });

    it('offers tickers of the feed while they are typed, those that begin so first', async () => {
      const stage = await opened();
      const answer = await answerOf(stage.platform.typeAhead('ticker', 'k'));
      const { options } = answer as { readonly options: readonly { readonly value: string }[] };
      expect(options[0]?.value).toBe('KELP');
      expect(options.length).toBeGreaterThan(1);
      expect(options.length).toBeLessThanOrEqual(100);
      expect(await answerOf(stage.platform.typeAhead('ticker', '\\'))).toMatchObject({ options: [] });
    });

    it('shows what it asks while it is filled, or what is wrong', async () => {
      const { platform } = await opened();
      platform.fill('ticker', { verb: 'tail', ticker: 'KELP' });
      expect(textsIn((await platform.views.next()).view)).toContain(
        'Asks: tail KELP 500d at 99% confidence 95% over 1d',
      );
      platform.fill('window', { verb: 'tail', ticker: 'KELP', window: 'sixty' });
      expect(textsIn((await platform.views.next()).view)).toContain('cannot be read here');
    });

    it('lets an older look at it not overwrite a newer one', async () => {
      const stage = await opened();
      const older = stage.platform.formHash();
      stage.platform.fill('ticker', { ticker: 'KELP' });
      await stage.platform.views.next();
      const late = stage.platform.fill('ticker', { ticker: 'TARN' }, 'U0ADA', older);
      await settled(stage, { sent: [late] });
      expect(stage.platform.calls.all.at(-1)).toMatchObject({ outcome: 'hash_conflict' });
      expect(stage.log).toEqual([]);
    });

    it('stays open with what is wrong at its field', async () => {
      const stage = await opened();
      const errorsFor = async (change: object) => answerOf(stage.platform.submit({ ...filled, ...change }));
      expect(await errorsFor({ window: 'sixty' })).toMatchObject({
        response_action: 'errors',
        errors: { window: expect.stringContaining('cannot be read') },
      });
      expect(await errorsFor({ level: '90%' })).not.toMatchObject({ response_action: 'errors' });
    });

    it('is answered where the person chose', async () => {
      const { platform } = await opened();
      platform.submit(filled);
      const post = await platform.posts.next();
      expect(post).toMatchObject({ channel: 'C0RATES', threadTs: null });
      expect(post.text).toMatch(/^Asked with the form\. KELP: by the student model .* 97\.5% VaR/);
    });

    it('is answered through the platform where the bot is no member, and says that nobody can pin it', async () => {
      const { platform } = await opened();
      platform.submit({ ...filled, place: 'C0ELSEWHERE' });
      const shared = await platform.responses.next();
      expect(shared).toMatchObject({ responseType: 'in_channel', channel: 'C0ELSEWHERE' });
      expect(shared.text).toContain('cannot be pinned');
    });

    it('is refused at the place where the question may not be asked', async () => {
      const stage = await opened({
        permissions: {
          ...everythingAllowed,
          mayAsk: ({ from }) =>
            from.channel === 'C0RATES'
              ? { ok: false, silent: false, message: 'Not in that channel.' }
              : { ok: true },
        },
      });
      expect(await answerOf(stage.platform.submit(filled))).toMatchObject({
        response_action: 'errors',
        errors: { place: 'Not in that channel.' },
      });
      await stage.bot.idle();
      expect(stage.platform.posts.all).toEqual([]);
    });

    it('tells the asker alone where the question has no answer', async () => {
      const { platform } = await opened();
      platform.submit({ ...filled, window: '9000d' });
      expect(await platform.responses.next()).toMatchObject({ responseType: 'ephemeral' });
    });
  });

  describe('the home', () => {
    it('shows the prices, what is posted for the person, what they asked and how to ask', async () => {
      const { platform } = await whole();
      platform.direct({ text: 'interval KELP 60d' });
      await platform.posts.next();
      platform.openHome();
      const { kind, view } = await platform.views.next();
      expect(kind).toBe('publish');
      expect(textsIn(view)).toContain('interval KELP 60d at 95%');
      expect(textsIn(view)).toContain('Your digests and watches');
      expect(textsIn(view)).toContain('How to ask');
    });

    it('is not shown to who opens the messages', async () => {
      const stage = await whole();
      await settled(stage, { sent: stage.platform.openHome('U0ADA', 'messages') });
      expect(stage.platform.views.all).toEqual([]);
    });

    it('pauses, resumes and stops a digest from its menu, and turns its pages', async () => {
      const { platform } = await whole();
      platform.direct({ text: 'digest sessions 08:30 KELP' });
      await platform.posts.next();
      platform.openHome();
      expect(textsIn((await platform.views.next()).view)).toContain('D-1, active');
      const choose = async (action: string) => {
        platform.pressHome('subscription', JSON.stringify({ action, id: 'D-1' }));
        return textsIn((await platform.views.next()).view);
      };
      expect(await choose('pauseSubscription')).toContain('D-1, paused');
      expect(await choose('resumeSubscription')).toContain('D-1, active');
      expect(await choose('stopSubscription')).not.toContain('D-1, active');
    });
  });
});
