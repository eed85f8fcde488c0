import { expect, test } from 'vitest';
import { closestWords } from '../../src/questions/closestWords.ts';

const feed = ['TARN', 'KELP', 'KELP.ONE', 'WREN', 'kale'];

// the edits are counted by hand
test.each([
  ['KELP', 2, ['KELP', 'KELP.ONE']],
  ['kelq', 3, ['KELP', 'kale']],
  ['KLEP', 1, ['KELP']],
  ['ELP', 1, ['KELP']],
  ['TAR', 5, ['TARN']],
  ['TARNX', 5, ['TARN']],
  ['KE', 5, ['KELP', 'KELP.ONE']],
  ['ZZZZ', 5, []],
  ['K', 5, []],
  ['', 2, ['TARN', 'KELP']],
  ['KELP', 0, []],
])('closest to %j, %i at most: %j', (word, count, closest) => {
  expect(closestWords(word, feed, count)).toEqual(closest);
});

test('equally close words come in alphabetical order', () => {
  expect(closestWords('KEL', ['KELZ', 'KELA', 'KELM'], 2)).toEqual(['KELA', 'KELM']);
});

test('a long word is compared by its beginning', () => {
  expect(closestWords(`KELP${'x'.repeat(10_000)}`, feed, 1)).toEqual(['KELP']);
});
