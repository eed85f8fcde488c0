import { expect, test } from 'vitest';
import { mostFrequentValue } from '../../../src/stats/returns/mostFrequentValue.ts';

test.each([
  ['one value', [0.5], { value: 0.5, count: 1 }],
  ['the one that comes twice', [3, 1, 2, 1], { value: 1, count: 2 }],
  ['the longer of two runs, though it stands later', [1, 1, 2, 2, 2, 3], { value: 2, count: 3 }],
  ['the longer of two runs, though it stands earlier', [1, 1, 1, 2, 2], { value: 1, count: 3 }],
  ['of equally many the least', [2, 1, 2, 1], { value: 1, count: 2 }],
  ['only equal ones count as a run', [1, 2, 3, 4, 4], { value: 4, count: 2 }],
])('%s', (_, values, expected) => {
  const given = Float64Array.from(values);
  expect(mostFrequentValue(given)).toEqual(expected);
  expect([...given]).toEqual(values);
});
