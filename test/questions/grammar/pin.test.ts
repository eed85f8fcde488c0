import { describe, expect, test } from 'vitest';
import { canonicalsOf, problemIn, questionIn } from '../asking.ts';

describe.each(['pin', 'unpin'])('%s', (verb) => {
  test.each([
    [verb, null],
    [`please ${verb}`, null],
    [`${verb} R-7Q2M9K4TXD`, 'R-7Q2M9K4TXD'],
    [`r-ooiilloo11 ${verb}`, 'R-0011110011'],
  ])('%s', (text, id) => {
    expect(questionIn(text).question).toEqual({ verb, id });
  });

  test.each([
    [`${verb} R-7Q2M9K4TXD R-3FHW8N0ZQC`, 'notForVerb', `${verb} R-7Q2M9K4TXD`],
    [`${verb} R-7Q2M9K4TXD R-7Q2M9K4TXD`, 'repeated', `${verb} R-7Q2M9K4TXD`],
    [`${verb} KELP`, 'notForVerb', verb],
    [`${verb} 60d`, 'notForVerb', verb],
    [`${verb} D-12`, 'notForVerb', verb],
  ])('%s is refused, and mended', (text, code, suggestion) => {
    const problem = problemIn(text);
    expect([problem.code, problem.suggestion]).toEqual([code, suggestion]);
  });

  test('is written out with its id', () => {
    expect(canonicalsOf(`r-ooiilloo11 ${verb} please`)).toEqual([`${verb} R-0011110011`]);
    expect(canonicalsOf(verb.toUpperCase())).toEqual([verb]);
  });
});
