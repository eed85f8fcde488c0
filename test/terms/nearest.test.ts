import { expect, test } from 'vitest';
import { editDistance, nearestWord } from '../../src/terms/nearest.ts';

// The distances are counted by hand: one step is one insertion, deletion, replacement or swap of neighbours.
test.each([
  ['', '', 0],
  ['KELP', '', 4],
  ['KELP', 'KELP', 0],
  ['KELP', 'KEL', 1],
  ['KELP', 'KLEP', 1],
  ['KELP', 'WELP', 1],
  ['TARN', 'KELP', 4],
  ['periodsPerYaer', 'periodsPerYear', 1],
])('%s to %s takes %i steps', (first, second, steps) => {
  expect(editDistance(first, second)).toBe(steps);
  expect(editDistance(second, first)).toBe(steps);
});

test('the nearest word is found whatever the case, the first of equals wins, and a far word finds nothing', () => {
  expect(nearestWord('kepl', ['TARN', 'KELP'])).toBe('KELP');
  expect(nearestWord('KELQ', ['KELA', 'KELP'])).toBe('KELA');
  expect(nearestWord('zzzz', ['TARN', 'KELP'])).toBe(null);
  expect(nearestWord('x', [])).toBe(null);
});
