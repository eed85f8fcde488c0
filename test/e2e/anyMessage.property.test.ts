/** Whatever is typed, the reply never throws, and never carries the words back as markup, a link, a mention or a broadcast. */
import fc from 'fast-check';
import { beforeAll, expect, test } from 'vitest';
import { toBlocks } from '../../src/present/blocks.ts';
import { toText } from '../../src/present/text.ts';
import type { Converse } from '../../src/workspaces/converse.ts';
import { demoConverse } from './demoDesk.ts';

let converse: Converse;
beforeAll(async () => {
  converse = await demoConverse();
});

const fragments = fc.constantFrom(
  'interval',
  'claim',
  'need',
  'feed',
  'help',
  'digest',
  'digest list',
  'watch',
  'loss beyond tail',
  '08:30',
  'D-1',
  'stop',
  'KELP',
  'TARN',
  'kelp.one',
  '60d',
  '3m',
  'at 95%',
  'at',
  '95',
  '20bp',
  'a year',
  'above',
  'log',
  '<!channel>',
  '<@U123>',
  '<http://evil.example|KELP>',
  '@here',
  '`KELP`',
  '*bold*',
  '_x_',
  '&lt;',
  'since',
  '2026-05-04',
  '04/05/2026',
  'https://evil.example',
  '\n',
  '\u202e',
  '“quoted”',
  'on 2m USD',
  'over 10d',
);
const typedWords = fc
  .array(fc.oneof(fragments, fc.string({ unit: 'binary', maxLength: 12 })), { maxLength: 9 })
  .map((all) => all.join(' '));
const anyMessage = fc.oneof(typedWords, fc.string({ unit: 'binary', maxLength: 300 }));

test('a message of any bytes', async () => {
  await fc.assert(
    fc.asyncProperty(anyMessage, async (text) => {
      for (const { reply } of await converse.ask({ text, place: 'channel' })) {
        const message = toBlocks(reply);
        expect(message.text).not.toMatch(/<|>|:\/\/|@(?!\u200d)|#(?!\u200d)/);
        expect(JSON.stringify(message.blocks)).not.toContain('mrkdwn');
        expect(JSON.stringify(message.blocks)).not.toContain('evil.example|');
        expect(toText(reply, { width: 80 }).length).toBeGreaterThan(0);
      }
    }),
    { seed: 7, numRuns: 400 },
  );
});
