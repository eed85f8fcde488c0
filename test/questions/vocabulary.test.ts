import { expect, test } from 'vitest';
import { createVocabulary } from '../../src/questions/vocabulary.ts';

const vocabulary = createVocabulary(
  ['KELP', 'Tarn', 'twin', 'TWIN'],
  new Map([['New York', 'America/New_York']]),
);

test.each([
  ['KELP', 'KELP'],
  ['kelp', 'KELP'],
  ['TARN', 'Tarn'],
  ['kel', null],
  ['', null],
  // two tickers that differ in case alone answer to their exact spelling only
  ['twin', 'twin'],
  ['TWIN', 'TWIN'],
  ['Twin', null],
])('%j is the ticker %j', (word, ticker) => {
  expect(vocabulary.canonicalTicker(word)).toBe(ticker);
});

test('cities are found in small letters', () => {
  expect(vocabulary.cities?.get('new york')).toBe('America/New_York');
});

test('the closest tickers come first', () => {
  expect(vocabulary.nearest('KELQ', 3)).toEqual(['KELP']);
  expect(createVocabulary([]).nearest('KELQ', 3)).toEqual([]);
});
