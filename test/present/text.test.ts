import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { toText, wrap } from '../../src/present/text.ts';
import { fullReply } from './madeReply.ts';

describe('a reply in the terminal', () => {
  test('stands in its parts, aligned, no empty cell filled', () => {
    expect(toText(fullReply, { width: 60 })).toBe(
      [
        'KELP & <TARN> of @here: see http://example.org #desk.',
        '',
        '  % a day             estimate   from',
        '  Mean                   +0.06  −0.21',
        '  Standard deviation      1.05',
        '',
        'Notes',
        '  First *note*.',
        '  Second note.',
        '',
        '  Caution: one thing is off',
        '  Caution: another is too',
        '  and 1 more caution with the working',
        '',
        '  Data to 2026-11-27, 60 simple returns, R-7Q2M9K4TXD',
        '  Desk policy decides.',
        '  [1] Show the working',
      ].join('\n'),
    );
  });

  test('a table too wide for the terminal becomes a sentence a row', () => {
    const lines = toText(fullReply, { width: 32 }).split('\n');
    expect(lines).toContain('  Mean: estimate +0.06; from');
    expect(lines.every((line) => [...line].length <= 32)).toBe(true);
  });

  test('buttons go on counting where the last reply stopped', () => {
    expect(toText(fullReply, { width: 60, firstButton: 4 })).toContain('[4] Show the working');
  });
});

test('no wrapped line is longer than the width, and no letter is lost', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme' }), fc.integer({ min: 3, max: 60 }), (text, width) => {
      const lines = wrap(text, width, '  ');
      expect(lines.every((line) => [...line].length <= width)).toBe(true);
      expect(lines.join('').replaceAll(' ', '')).toBe(text.replaceAll(' ', ''));
    }),
    { seed: 1, numRuns: 500 },
  );
});
