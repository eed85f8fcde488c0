import { describe, expect, test } from 'vitest';
import { succeed } from '../../src/terms/result.ts';
import { type Asking, createConverse } from '../../src/workspaces/converse.ts';
import { everythingAllowed } from '../../src/workspaces/permissions.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { brokenStore, recordsInMemory } from '../doubles/records.ts';
import { manualTime } from '../doubles/time.ts';
import { deskOn, snapshotOf } from './madeDesk.ts';

const closes = wobbling(300);
const live = succeed(snapshotOf([seriesOf('KELP', closes), seriesOf('TARN', [...closes].reverse())]));
const minuteMs = 60_000;

/** A channel with people in it: each says something with a stamp of its own, in a thread or not. */
const sitDown = async (more: Parameters<typeof deskOn>[2] = {}) => {
  const time = manualTime();
  const records = await recordsInMemory();
  const converse = createConverse(deskOn(records, () => live, { clock: time, ...more }));
  let count = 0;
  const put = (
    text: string,
    where: Partial<Asking['from']> = {},
    place: Asking['place'] = 'channel',
  ): Asking => {
    count += 1;
    const from = { team: 'T1', channel: 'C1', person: 'U1', message: `${count}.5`, thread: null, ...where };
    return { text, place, from };
  };
  const questionsOf = async (spoken: ReturnType<typeof converse.ask>) =>
    (await spoken).map(({ outcome }) =>
      outcome?.ok === true ? outcome.value[0].question : outcome?.problem.code,
    );
  return {
    time,
    records,
    ask: (...said: Parameters<typeof put>) => questionsOf(converse.ask(put(...said))),
    overhear: (...said: Parameters<typeof put>) => questionsOf(converse.overhear(put(...said))),
    askInFull: (...said: Parameters<typeof put>) => converse.ask(put(...said)),
  };
};

describe('a follow-up', () => {
  test('in the thread that a question began carries over from it, and says what', async () => {
    const { ask, askInFull } = await sitDown();
    expect(await ask('interval KELP 60d')).toEqual(['interval KELP 60d at 95%']);
    const [spoken] = await askInFull('same at 99%', { thread: '1.5' });
    expect(spoken?.outcome).toMatchObject({ ok: true, value: [{ question: 'interval KELP 60d at 99%' }] });
    expect(spoken?.reply.quietLine).toContain('Assumed: interval KELP 60d (carried over)');
  });

  test('carries over from the last answer of the thread, whoever asked it', async () => {
    const { ask, time } = await sitDown();
    await ask('interval KELP');
    time.advance(minuteMs);
    expect(await ask('TARN', { thread: '1.5', person: 'U2' })).toEqual(['interval TARN 60d at 95%']);
    time.advance(7 * 24 * 60 * minuteMs);
    expect(await ask('at 99%', { thread: '1.5' })).toEqual(['interval TARN 60d at 99%']);
  });

  test.each([
    ['at the top of a channel', {}],
    ['in another thread', { thread: '9.9' }],
    ['in the like thread of another channel', { thread: '1.5', channel: 'C2' }],
  ])('%s has nothing to carry over', async (_, where) => {
    const { ask } = await sitDown();
    await ask('interval KELP');
    expect(await ask('at 99%', where)).toEqual(['noVerb']);
  });

  test('to a slash command has nothing to carry over', async () => {
    const { ask } = await sitDown();
    await ask('interval KELP', {}, 'command');
    expect(await ask('at 99%', {}, 'command')).toEqual(['noVerb']);
  });

  test('in a direct conversation carries over for half an hour without a thread', async () => {
    const { ask, time } = await sitDown();
    await ask('interval KELP', { channel: 'D1' }, 'direct');
    time.advance(30 * minuteMs);
    expect(await ask('at 99%', { channel: 'D1' }, 'direct')).toEqual(['interval KELP 60d at 99%']);
    time.advance(30 * minuteMs + 1);
    expect(await ask('at 90%', { channel: 'D1' }, 'direct')).toEqual(['noVerb']);
  });

  test('does not carry over what the asker may not read', async () => {
    const { ask } = await sitDown({
      permissions: { ...everythingAllowed, mayRead: ({ from }) => from.person === 'U1' },
    });
    await ask('interval KELP');
    expect(await ask('at 99%', { thread: '1.5', person: 'U2' })).toEqual(['noVerb']);
  });

  test('that was edited does not carry over from what it said before', async () => {
    const { ask } = await sitDown();
    await ask('interval KELP 60d');
    await ask('TARN 90d', { thread: '1.5', message: '7.5' });
    expect(await ask('at 99%', { thread: '1.5', message: '7.5' })).toEqual(['interval KELP 60d at 99%']);
  });

  test('is refused like any such words where the store is in trouble', async () => {
    const records = { ...(await recordsInMemory({ store: brokenStore })), tell: () => {} };
    const converse = createConverse(deskOn(records, () => live));
    const from = { team: 'T1', channel: 'C1', person: 'U1', message: '2.5', thread: '1.5' };
    const [spoken] = await converse.ask({ text: 'at 99%', place: 'channel', from });
    expect(spoken?.outcome).toMatchObject({ ok: false, problem: { code: 'noVerb' } });
  });
});

describe('words that do not address the bot', () => {
  const inThread = { thread: '1.5' };

  test('are answered where every one is read, soon after an answer in the thread', async () => {
    const { ask, overhear, time } = await sitDown();
    await ask('interval KELP');
    time.advance(30 * minuteMs);
    expect(await overhear('same at 99%', inThread)).toEqual(['interval KELP 60d at 99%']);
    expect(await overhear('tail', inThread)).toEqual(['tail KELP 500d at 99% confidence 95% over 1d']);
  });

  test.each([
    'at 99% I think',
    'thanks',
    'help',
    'feed',
    'interval KELP 9000d',
    'what do you make of it?',
    '',
  ])('"%s" gets silence, and nothing of it is kept', async (text) => {
    const { ask, overhear, records } = await sitDown();
    await ask('interval KELP');
    expect(await overhear(text, inThread)).toEqual([]);
    expect(await records.store.verify()).toMatchObject({ ok: true, value: { askings: 1 } });
  });

  test('get silence once half an hour has passed, and where the bot never answered', async () => {
    const { ask, overhear, time } = await sitDown();
    expect(await overhear('interval KELP', { thread: '0.5' })).toEqual([]);
    await ask('interval KELP');
    time.advance(30 * minuteMs + 1);
    expect(await overhear('at 99%', inThread)).toEqual([]);
  });

  test('get silence from who may not ask, and count for nothing before they are a question', async () => {
    let admitted = 0;
    const { ask, overhear } = await sitDown({
      permissions: {
        ...everythingAllowed,
        admit: ({ from }) => {
          admitted += 1;
          return from.person === 'U1' ? { ok: true } : { ok: false, silent: false, message: 'Not here.' };
        },
      },
    });
    await ask('interval KELP');
    expect(await overhear('what do you make of it', inThread)).toEqual([]);
    expect(admitted).toBe(1);
    expect(await overhear('at 99%', { ...inThread, person: 'U2' })).toEqual([]);
    expect(admitted).toBe(2);
  });
});
