import fc from 'fast-check';
import { expect, test } from 'vitest';
import { makeDateReader, notPlain, readNumber } from '../../../src/feed/internal/read/plainText.ts';
import { dayFromIso } from '../../../src/terms/day.ts';

const seed = 20_261_201;
const bytesOf = (text: string): Uint8Array => new Uint8Array(Buffer.from(`;${text};`, 'latin1'));
const number = (text: string): number => readNumber(bytesOf(text), 1, 1 + text.length);
const readDate = makeDateReader();
const date = (text: string): number => readDate(bytesOf(text), 1, 1 + text.length);

/** `whole` digits, the first of them no zero, and `decimals` digits behind a point. */
const decimalText = fc
  .tuple(fc.bigInt(1n, 999_999_999_999_999n), fc.nat(14))
  .map(([value, decimals]) => {
    const all = String(value).padStart(decimals + 1, '0');
    return decimals === 0 ? all : `${all.slice(0, -decimals)}.${all.slice(-decimals)}`;
  })
  .filter((text) => text.replace('.', '').length <= 15);

test('a number of up to fifteen digits is the double that the language reads from the same text', () => {
  // both are the nearest double, so they are equal to the last bit
  fc.assert(
    fc.property(decimalText, (text) => number(text) === Number(text)),
    { seed, numRuns: 20_000 },
  );
});

test.each([
  '',
  '.',
  '.5',
  '5.',
  '05',
  '00.5',
  '-1',
  '+1',
  '1e3',
  '1_0',
  '1,5',
  '1.2.3',
  ' 1',
  '1 ',
  'NaN',
  'inf',
  '0x1',
  '1234567890123456',
  '0.123456789012345',
])('“%s” is not a plainly written number', (text) => {
  expect(number(text)).toBe(notPlain);
});

test.each(['0', '0.0', '7', '0.5', '100.25', '999999999999999', '0.12345678901234'])(
  '“%s” is one',
  (text) => {
    expect(number(text)).toBe(Number(text));
  },
);

test('every text of ten characters like a date is read as the calendar has it, or not at all', () => {
  const digitsOf = (length: number) => (value: number) => String(value).padStart(length, '0');
  const parts = fc.tuple(
    fc.nat(9999).map(digitsOf(4)),
    fc.nat(13).map(digitsOf(2)),
    fc.nat(32).map(digitsOf(2)),
  );
  fc.assert(
    fc.property(parts, (texts) => date(texts.join('-')) === (dayFromIso(texts.join('-')) ?? notPlain)),
    { seed, numRuns: 20_000 },
  );
});

test.each([
  '2026-02-29',
  '1900-02-29',
  '2026-13-01',
  '2026-00-10',
  '0000-01-01',
  '2026-01-00',
  '2026/01/05',
  '2026-1-05',
  '2026-01-5',
  '+026-01-05',
  '2026-01-05 ',
  '20260105',
  '',
])('“%s” is not a plainly written date', (text) => {
  expect(date(text)).toBe(notPlain);
});
