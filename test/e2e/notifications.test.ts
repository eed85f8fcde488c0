/** What a notification shows and a screen reader reads: the text of a message, for every kind of reply. */
import { beforeAll, describe, expect, test } from 'vitest';
import { escapeFallback, toBlocks } from '../../src/present/blocks.ts';
import { platformLimits } from '../../src/present/limits/platformLimits.ts';
import { type Converse, createConverse, type Spoken } from '../../src/workspaces/converse.ts';
import { demoDesk } from './demoDesk.ts';

const from = { team: 'T1', channel: 'C1', person: 'U1', message: '1.5', thread: null };

let converse: Converse;
beforeAll(async () => {
  converse = createConverse(await demoDesk());
});

const ask = (text: string): Promise<readonly Spoken[]> => converse.ask({ text, place: 'channel', from });

/** Signs that a screen reader skips or reads by a name, and with which nothing may be said alone. */
const emoji = /\p{Extended_Pictographic}|:[a-z_]+:/u;

const judge = ({ reply }: Spoken): string => {
  const { text, blocks } = toBlocks(reply);
  expect(text.startsWith(escapeFallback(reply.sentence))).toBe(true);
  expect(text.length).toBeLessThanOrEqual(platformLimits.message.textAdvised);
  expect(text).not.toMatch(emoji);
  expect(JSON.stringify(blocks)).not.toMatch(emoji);
  expect(JSON.stringify(blocks)).not.toContain('"style"');
  return text;
};

describe.each([
  'interval KELP 60d',
  'interval vol KELP 3m',
  'interval ratio KELP 1y',
  'claim KELP 20bp',
  'need KELP 5bp',
  'compare KELP TARN',
  'compare KELP TARN WRACK',
  'compare KELP before 2026-05-04',
  'tail KELP by historical on 2m USD',
  'tail KELP beyond 4% by normal',
  'backtest KELP by normal',
  'interval KELP as json',
])('%s', (text) => {
  test('says the verdict, the figures in words, cautions, data date and id', async () => {
    const [spoken] = await ask(text);
    if (spoken?.outcome?.ok !== true) throw new Error(`${text} was not answered`);
    const [{ id, asOf }] = spoken.outcome.value;
    const read = judge(spoken);
    expect(read).toContain(`Data to ${asOf}`);
    expect(read).toContain(id);
    expect(read).toContain(escapeFallback(spoken.reply.figuresInWords));
    expect(spoken.reply.figuresInWords).not.toBe('');
    for (const warning of spoken.reply.warnings.slice(0, 2))
      expect(read).toContain(escapeFallback(`Caution: ${warning}`));
  });

  test('and so do its working and its further figures, each by its id', async () => {
    const [spoken] = await ask(text);
    for (const button of spoken?.reply.buttons ?? []) {
      if (button.action !== 'working' && button.action !== 'more') continue;
      for (const shown of await converse.press({ ...button, place: 'channel', from }))
        expect(judge(shown)).toMatch(/^(The working|More figures) of R-\w+/);
    }
  });
});

describe('what is no answer', () => {
  test.each([
    'interval KEPL',
    'what',
    'help',
    'help tail',
    'feed',
    'feed KELP',
    'records',
    'records verify',
    'digest list',
  ])('%s says all of it in words', async (text) => {
    const [spoken] = await ask(text);
    if (spoken === undefined) throw new Error('nothing was said');
    const read = judge(spoken);
    for (const { lines } of spoken.reply.passages)
      for (const line of lines) expect(read).toContain(escapeFallback(line));
  });
});
