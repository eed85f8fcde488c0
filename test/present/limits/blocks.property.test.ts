import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { toBlocks } from '../../../src/present/blocks.ts';
import { limitFaults } from '../../../src/present/limits/limitFaults.ts';
import { type Reply, reply } from '../../../src/present/reply.ts';

const words = fc.oneof(
  fc.string({ unit: 'grapheme', maxLength: 60 }),
  fc.integer({ min: 0, max: 6000 }).map((length) => 'some words '.repeat(length / 11)),
  fc.integer({ min: 0, max: 6000 }).map((length) => '<'.repeat(length)),
);
const button = fc.record({
  action: fc.constantFrom('working' as const, 'level' as const, 'more' as const),
  label: words,
  answerId: fc.constant('R-7Q2M9K4TXD'),
  question: words,
});
const anyReply: fc.Arbitrary<Reply> = fc
  .record({
    sentence: words.map((text) => `${text}.`),
    columns: fc.integer({ min: 1, max: 30 }),
    rows: fc.array(fc.array(words, { maxLength: 30 }), { maxLength: 130 }),
    passages: fc.array(fc.record({ head: fc.option(words), lines: fc.array(words, { maxLength: 60 }) }), {
      maxLength: 60,
    }),
    warnings: fc.array(words, { maxLength: 5 }),
    quietLine: fc.option(words),
    caution: fc.option(words),
    buttons: fc.array(button, { maxLength: 30 }),
  })
  .map(({ sentence, columns, rows, ...parts }) =>
    reply('answer', sentence, {
      ...parts,
      table: {
        columns: Array.from({ length: columns }, (_, index) => ({
          head: `c${index}`,
          align: 'right' as const,
        })),
        rows,
      },
      whole: 'the whole is on record as R-7Q2M9K4TXD',
    }),
  );

describe('whatever a reply holds', () => {
  test('the message made of it keeps every limit of the platform', () => {
    fc.assert(
      fc.property(anyReply, (made) => {
        expect(limitFaults(toBlocks(made))).toEqual([]);
      }),
      { seed: 11, numRuns: 60 },
    );
  });
});

const textsOf = (made: Reply): readonly string[] =>
  toBlocks(made).blocks.flatMap((block) => (block.type === 'section' ? block.text.text.split('\n') : []));

describe('what is too long', () => {
  const lines = Array.from({ length: 900 }, (_, index) => `line ${index} of the working`);
  const made = reply('working', 'The working.', {
    passages: [{ head: null, lines }],
    quietLine: 'Data to 2026-11-27, R-7Q2M9K4TXD',
    whole: 'the whole is on record as R-7Q2M9K4TXD',
  });

  test('is cut after a whole line, with how much more there is and where', () => {
    const [, ...texts] = textsOf(made);
    const note = texts.at(-1) ?? '';
    const shown = texts.slice(0, -1);
    expect(shown).toEqual(lines.slice(0, shown.length));
    expect(note).toBe(
      `${lines.length - shown.length} more lines have no room here; the whole is on record as R-7Q2M9K4TXD.`,
    );
  });

  test('leaves the notification its verdict, data date and id', () => {
    const { text } = toBlocks(made);
    expect(text).toMatch(/^The working\.\nline 0 of the working\n/);
    expect(text).toMatch(/\d+ more lines have no room here; .*\nData to 2026-11-27, R-7Q2M9K4TXD\.$/);
  });

  test('is cut after a whole row of the table', () => {
    const rows = Array.from({ length: 300 }, (_, index) => [`row ${index}`, 'x'.repeat(60)]);
    const { blocks } = toBlocks(
      reply('answer', 'So.', {
        table: {
          columns: [
            { head: 'name', align: 'left' },
            { head: 'value', align: 'right' },
          ],
          rows,
        },
      }),
    );
    const table = blocks.find((block) => block.type === 'table');
    expect(table?.rows.length).toBe(100);
    expect(JSON.stringify(blocks[2])).toContain('201 more rows have no room here.');
  });

  test('of one line more says so in the singular', () => {
    const two = reply('working', 'So.', {
      passages: [
        {
          head: null,
          lines: ['a'.repeat(2900), 'b'.repeat(2900), 'c'.repeat(2900), 'd'.repeat(2900), 'e'.repeat(2900)],
        },
      ],
    });
    expect(textsOf(two).at(-1)).toBe('1 more line has no room here.');
  });
});
