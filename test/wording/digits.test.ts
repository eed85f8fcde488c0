import { describe, expect, test } from 'vitest';
import { decimalsFromHalfWidth, digits, roundTo, threeDigits } from '../../src/wording/digits.ts';
import { percentBounds, percentDecimals } from '../../src/wording/percent.ts';
import { counted, listed, moneyInWords, possessive, probabilityValue } from '../../src/wording/words.ts';

describe('a half-width sets the decimals with its two leading digits', () => {
  test.each([
    [0.275, 2],
    [0.0996, 2],
    [0.0994, 3],
    [1.04, 1],
    [9.96, 0],
    [12.4, 0],
    [340, 0],
    [0.00123, 4],
  ])('%d → %d decimals', (halfWidth, decimals) => {
    expect(decimalsFromHalfWidth(halfWidth)).toBe(decimals);
  });
});

describe('digits', () => {
  test.each([
    [-0.21, 2, '−0.21'],
    [1234567.891, 1, '1,234,567.9'],
    [-0.001, 2, '0.00'],
    [0, 2, '0.00'],
  ])('%d with %d decimals is %s', (value, decimals, text) => {
    expect(digits(value, decimals)).toBe(text);
  });

  test('a plus stands before what is above zero only', () => {
    expect(digits(0.06, 2, { plus: true })).toBe('+0.06');
    expect(digits(0.001, 2, { plus: true })).toBe('0.00');
  });

  test('outward rounding leaves a whole step alone although the double is a hair off', () => {
    expect(roundTo(0.57, 2, 'up')).toBe(0.57);
    expect(roundTo(0.57, 2, 'down')).toBe(0.57);
    expect(roundTo(0.5701, 2, 'up')).toBe(0.58);
    expect(roundTo(-0.5701, 2, 'down')).toBe(-0.58);
  });

  test.each([
    [0.04123, '0.0412'],
    [3.2149, '3.21'],
    [41236, '41,200'],
    [999.6, '1,000'],
    [0, '0'],
  ])('%d in three digits is %s', (value, text) => {
    expect(threeDigits(value)).toBe(text);
  });
});

describe('bounds', () => {
  test('estimate to nearest, bounds outward, all with the same decimals', () => {
    const written = percentBounds({ estimate: 0.000641, lower: -0.00209, upper: 0.003371 });
    expect(written).toEqual({ estimate: '+0.06', lower: '−0.21', upper: '+0.34', decimals: 2 });
  });

  test('a zero just outside gets as many digits as show it outside', () => {
    const justAbove = { estimate: 0.0021, lower: 0.0000004, upper: 0.0041996 };
    expect(percentDecimals(justAbove)).toBe(5);
    expect(percentBounds(justAbove).lower).toBe('+0.00004');
  });

  test('an open end is left open', () => {
    expect(percentBounds({ estimate: 0.001, lower: -0.0012, upper: null }).upper).toBeNull();
  });
});

test('counts, lists, p-values, money and owners', () => {
  expect([counted(1, 'return'), counted(1200, 'return')]).toEqual(['1 return', '1,200 returns']);
  expect([listed(['a']), listed(['a', 'b']), listed(['a', 'b', 'c'])]).toEqual([
    'a',
    'a and b',
    'a, b and c',
  ]);
  expect([probabilityValue(0.0009), probabilityValue(0.0312)]).toEqual(['<0.001', '0.0312']);
  expect(moneyInWords(-18432, 'USD')).toBe('−18,400 USD');
  expect([possessive('KELP'), possessive('GLASS')]).toEqual(['KELP’s', 'GLASS’']);
});
