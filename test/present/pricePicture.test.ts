import { expect, test } from 'vitest';
import { pricePicture } from '../../src/present/compose/pricePicture.ts';
import { seriesOf } from '../answers/madeSeries.ts';

test('rising closes rise through all eight heights, and the words say between what', () => {
  const { lines } = pricePicture(
    seriesOf(
      'KELP',
      Array.from({ length: 480 }, (_, day) => 100 + day),
    ),
  );
  expect(lines).toHaveLength(2);
  expect([...(lines[0] ?? '')]).toHaveLength(48);
  expect([...new Set(lines[0])].join('')).toBe('▁▂▃▄▅▆▇█');
  expect(lines[1]).toMatch(
    /^2025-\d\d-\d\d to 2026-11-27, between 109.0 and 579.0; no two prices are more than 5/,
  );
});

test('a stretch without prices is marked beneath its bar', () => {
  const whole = seriesOf('KELP', [1, 2, 3, 4, 5, 6]);
  const days = whole.days.map((day, row) => (row < 3 ? day - 20 : day));
  const { lines } = pricePicture({ ...whole, days });
  expect(lines[1]).toBe('···!··');
  expect(lines[2]).toContain('1 bar marked ! has more than 5 calendar days');
});

test('closes that stand still are one low line', () => {
  expect(pricePicture(seriesOf('KELP', [5, 5, 5])).lines[0]).toBe('▁▁▁');
});
