import { describe, expect, test } from 'vitest';
import { canonicalsOf, dayOf, problemIn, questionIn, questionsIn } from '../asking.ts';

describe('again', () => {
  test.each([
    ['again R-7Q2M9K4TXD', ['R-7Q2M9K4TXD']],
    ['please again r-7q2m9k4txd', ['R-7Q2M9K4TXD']],
    ['r-7q2m9k4txd again', ['R-7Q2M9K4TXD']],
    ['again R-7Q2M9K4TXD R-OOIILLOOil', ['R-7Q2M9K4TXD', 'R-0011110011']],
    ['again R-7Q2M9K4TXD and R-3FHW8N0ZQC', ['R-7Q2M9K4TXD', 'R-3FHW8N0ZQC']],
  ])('%s', (text, ids) => {
    expect(questionIn(text).question).toEqual({ verb: 'again', ids });
  });

  test.each([
    ['again', 'missingPart'],
    ['again R-7Q2M9K4TXD R-7Q2M9K4TXD', 'repeated'],
    ['again R-7Q2M9K4TXD R-3FHW8N0ZQC R-0011110011', 'notForVerb'],
    ['again R-7Q2M9K4TXD KELP', 'notForVerb'],
    ['again R-7Q2M9K4TXD 60d', 'notForVerb'],
    ['again D-12', 'notForVerb'],
    ['again R-7Q2M9', 'unreadableWords'],
  ])('%s is refused', (text, code) => {
    expect(problemIn(text).code).toBe(code);
  });

  test('too many ids and the same one twice are mended', () => {
    expect(problemIn('again R-7Q2M9K4TXD R-3FHW8N0ZQC R-0011110011').suggestion).toBe(
      'again R-7Q2M9K4TXD R-3FHW8N0ZQC',
    );
    expect(problemIn('again R-7Q2M9K4TXD R-7Q2M9K4TXD').suggestion).toBe('again R-7Q2M9K4TXD');
  });
});

describe('records', () => {
  const listed = { verb: 'records', ticker: null, since: null, verify: false };

  test.each([
    ['records', listed],
    ['records kelp', { ...listed, ticker: 'KELP' }],
    ['records KELP since 2026-05-04', { ...listed, ticker: 'KELP', since: dayOf('2026-05-04') }],
    ['since 4 May records', { ...listed, since: dayOf('2026-05-04') }],
    ['records verify', { ...listed, verify: true }],
  ])('%s', (text, question) => {
    expect(questionIn(text).question).toEqual(question);
  });

  test('several tickers are several questions', () => {
    expect(questionsIn('records KELP TARN since 2026-05-04').map(({ canonical }) => canonical)).toEqual([
      'records KELP since 2026-05-04',
      'records TARN since 2026-05-04',
    ]);
  });

  test.each([
    ['records 60d', 'notForVerb', 'records'],
    ['records KELP 2026-01-02/2026-03-31', 'notForVerb', 'records KELP'],
    ['records verify KELP', 'notForVerb', 'records verify'],
    ['records verify since 2026-05-04', 'notForVerb', 'records verify'],
    ['records at 95%', 'notForVerb', 'records'],
    ['records verify verify', 'repeated', 'records verify'],
  ])('%s is refused, and %s', (text, code, suggestion) => {
    const problem = problemIn(text);
    expect([problem.code, problem.suggestion]).toEqual([code, suggestion]);
  });
});

test.each([
  ['r-ooiilloo11 again', 'again R-0011110011'],
  ['records since 4 may kelp', 'records KELP since 2026-05-04'],
  ['verify records', 'records verify'],
  ['records', 'records'],
])('%s is written %s', (text, canonical) => {
  expect(canonicalsOf(text)).toEqual([canonical]);
  expect(canonicalsOf(canonical)).toEqual([canonical]);
});
