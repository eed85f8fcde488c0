import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { escapeFallback, toBlocks } from '../../src/present/blocks.ts';
import { reply } from '../../src/present/reply.ts';
import { fullReply } from './madeReply.ts';

describe('a reply in the workspace', () => {
  const { text, blocks } = toBlocks(fullReply);

  test('has its parts in their order', () => {
    expect(blocks.map(({ type }) => type)).toEqual([
      'section',
      'table',
      'section',
      'context',
      'context',
      'context',
      'actions',
    ]);
  });

  test('every row of the table is as long as its head, and an empty cell is a dash', () => {
    const table = blocks.find((block) => block.type === 'table');
    expect(table?.rows.map((row) => row.map((cell) => cell.text))).toEqual([
      ['% a day', 'estimate', 'from'],
      ['Mean', '+0.06', '−0.21'],
      ['Standard deviation', '1.05', '–'],
    ]);
  });

  test('words stand in plain text alone, with no emoji made of them', () => {
    const plain = JSON.stringify(blocks);
    expect(plain).not.toContain('mrkdwn');
    expect(plain).not.toContain('"emoji":true');
  });

  test('the button carries the answer and its question', () => {
    const actions = blocks.find((block) => block.type === 'actions');
    const [button] = actions?.elements ?? [];
    expect(button?.action_id).toBe('working');
    expect(JSON.parse(button?.value ?? '')).toEqual({
      id: 'R-7Q2M9K4TXD',
      question: 'interval KELP 60d at 95%',
    });
  });

  test('the text for notifications holds sentence, figures, warnings and data date, and no markup', () => {
    expect(text).toBe(
      [
        'KELP &amp; &lt;TARN&gt; of @\u200dhere: see http:\u200d//example.org #\u200ddesk.',
        'A year of such days: +15%.',
        'Notes',
        'First *note*.',
        'Second note.',
        'Caution: one thing is off.',
        'Caution: another is too.',
        'And 1 more caution with the working.',
        'Data to 2026-11-27, 60 simple returns, R-7Q2M9K4TXD.',
        'Desk policy decides.',
      ].join('\n'),
    );
  });
});

test('whatever the words, the fallback has no tag, no mention, no link and keeps within the platform’s room', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 9000 }), (words) => {
      const { text, blocks } = toBlocks(reply('answer', words, { warnings: [words] }));
      expect(text).not.toMatch(/<|>|:\/\/|@(?!\u200d)|#(?!\u200d)/);
      expect(text.length).toBeLessThanOrEqual(4000);
      for (const block of blocks)
        if (block.type === 'section') expect(block.text.text.length).toBeLessThanOrEqual(3000);
    }),
    { seed: 2, numRuns: 300 },
  );
});

test('escaping is done once: what is already escaped is shown as it was typed', () => {
  expect(escapeFallback('&lt;')).toBe('&amp;lt;');
});
