import { describe, expect, test } from 'vitest';
import type { Button } from '../../../src/present/reply.ts';
import { inWords } from '../../../src/present/words.ts';
import { succeed } from '../../../src/terms/result.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import { everythingAllowed, type Permissions } from '../../../src/workspaces/permissions.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { recordsInMemory } from '../../doubles/records.ts';
import { deskOn, snapshotOf } from '../madeDesk.ts';

const closes = wobbling(700).map((close, at) => close * (1 + ((at * 7919) % 101) / 4000));
const live = succeed(snapshotOf([seriesOf('KELP', closes), seriesOf('TARN', [...closes].reverse())]));
const from = { team: 'T1', channel: 'C1', person: 'U1', message: '2.5', thread: '1.5' };

const ask = async (text: string, permissions: Permissions = everythingAllowed) => {
  const converse = createConverse(deskOn(await recordsInMemory(), () => live, { permissions }));
  const [spoken] = await converse.ask({ text, place: 'channel', from });
  const buttons = spoken?.reply.buttons ?? [];
  const press = (label: string, by: Partial<typeof from> = {}) => {
    const button = buttons.find((each) => each.label === label);
    if (button === undefined)
      throw new Error(`no button ${label} among ${buttons.map((each) => each.label)}`);
    return converse.press({ ...button, place: 'channel', from: { ...from, ...by } });
  };
  return { buttons, press, converse };
};

const labelsOf = (buttons: readonly Button[], action: string) =>
  buttons.filter((button) => button.action === action).map(({ label }) => label);

describe('another level', () => {
  test.each([
    ['interval KELP', ['At 99%', 'At 90%'], 'At 99%', 'interval KELP 60d at 99%'],
    ['interval KELP at 99.9%', ['At 99%'], 'At 99%', 'interval KELP 60d at 99%'],
    ['claim KELP 20bp at 92%', ['At 95%', 'At 90%'], 'At 95%', 'claim KELP 20bp 60d at 95%'],
    ['compare KELP TARN', ['At 99%', 'At 90%'], 'At 90%', 'compare KELP TARN 60d at 90%'],
    [
      'tail KELP by historical',
      ['At 97.5%'],
      'At 97.5%',
      'tail KELP 500d at 97.5% confidence 95% over 1d by historical',
    ],
    [
      'tail KELP beyond 1% by normal',
      ['Confidence 99%', 'Confidence 90%'],
      'Confidence 99%',
      'tail KELP beyond 1% 500d confidence 99% by normal',
    ],
    [
      'backtest KELP by normal',
      ['At 97.5%'],
      'At 97.5%',
      'backtest KELP 500d at 97.5% on window 250d by normal',
    ],
  ])('under %s is offered as %j, and asks the same at it', async (text, labels, label, question) => {
    const { buttons, press } = await ask(text);
    expect(labelsOf(buttons, 'level')).toEqual(labels);
    const [spoken] = await press(label);
    expect(spoken?.outcome).toMatchObject({ ok: true, value: [{ question }] });
    expect(spoken?.reply.quietLine).toContain('(carried over)');
  });

  test('is an answer on record like any other, asked where it was pressed', async () => {
    const { press, converse } = await ask('interval KELP');
    await press('At 99%', { person: 'U2' });
    const [next] = await converse.ask({ text: 'TARN', place: 'channel', from: { ...from, message: '3.5' } });
    expect(next?.outcome).toMatchObject({ ok: true, value: [{ question: 'interval TARN 60d at 99%' }] });
  });

  test('takes a default window that is longer than the history as it was taken before', async () => {
    const { press } = await ask('tail KELP 600d by normal');
    expect((await press('At 97.5%'))[0]?.outcome?.ok).toBe(true);
    const { press: pressDefault } = await ask('shape KELP');
    expect((await pressDefault('Confidence 99%'))[0]?.outcome?.ok).toBe(true);
  });
});

describe('more figures', () => {
  test('of a mean are its ladder, one further day, the bell curve, the prices, cautions and sources', async () => {
    const { press } = await ask('interval KELP');
    const [spoken] = await press('More figures');
    expect(spoken?.reply.table?.rows.map(([level]) => level)).toEqual(['90%', '95%', '99%', '99.9%']);
    expect(spoken?.reply.passages.map(({ head }) => head)).toEqual(
      expect.arrayContaining([
        'Half the width of the interval, were the days more of the same',
        'One further day',
        'Against the bell curve',
        'Prices used',
        'Sources',
      ]),
    );
  });

  test.each([
    'interval vol KELP',
    'claim KELP 20bp',
    'tail KELP by normal',
    'compare KELP TARN',
    'backtest KELP by normal',
  ])('of %s are the prices used, every caution and the sources', async (text) => {
    const { press, converse } = await ask(text);
    const [spoken] = await press('More figures');
    const words = spoken === undefined ? '' : inWords(spoken.reply);
    expect(words).toMatch(/^More figures of R-\w+: .*\.\n/);
    expect(words).toContain('closes adjusted for splits');
    expect(words).toContain('Sources\n');
    const [answer] = await converse.ask({ text, place: 'channel' });
    for (const warning of answer?.reply.warnings ?? []) expect(words).toContain(warning);
  });
});

describe('a button', () => {
  test.each(['Show the working', 'More figures', 'At 99%'])(
    '“%s” is refused to who may not read the answer, in the words of an id that never was',
    async (label) => {
      const { press } = await ask('interval KELP', {
        ...everythingAllowed,
        mayRead: (asker) => asker.from.person === 'U1',
      });
      const [refusal, another] = await press(label, { person: 'U2' });
      expect(another).toBe(undefined);
      expect(refusal?.outcome).toMatchObject({ ok: false, problem: { code: 'unknownRecord' } });
      expect((await press(label))[0]?.outcome).not.toMatchObject({ ok: false });
    },
  );

  test('to share is answered with the answer as everybody may see it', async () => {
    const { buttons, converse } = await ask('interval KELP');
    const [button] = buttons;
    if (button === undefined) throw new Error('no button');
    const [shared] = await converse.press({ ...button, action: 'share', place: 'command', from });
    expect(shared?.reply).toMatchObject({ kind: 'answer', sentence: expect.stringContaining('KELP’s mean') });
  });

  test('to share is refused where the question may not be asked in the channel', async () => {
    const barred = { ok: false, silent: false, message: 'Not here.' } as const;
    let isBarred = false;
    const mayAsk: Permissions['mayAsk'] = ({ place }) =>
      isBarred && place === 'channel' ? barred : { ok: true };
    const { buttons, converse } = await ask('interval KELP', { ...everythingAllowed, mayAsk });
    const [button] = buttons;
    if (button === undefined) throw new Error('no button');
    isBarred = true;
    const [refusal] = await converse.press({ ...button, action: 'share', place: 'command', from });
    expect(refusal?.outcome).toMatchObject({ ok: false, problem: { code: 'notPermitted' } });
  });
});
