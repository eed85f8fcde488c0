import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { problemCodes } from '../../../src/terms/problem.ts';
import { problemIn, questionsIn } from '../asking.ts';

/** Lines of `code | text | first suggestion`; a lone dash where there is none. */
const rows = readFileSync(new URL('notRead.txt', import.meta.url), 'utf8')
  .split('\n')
  .filter((line) => line !== '' && !line.startsWith('#'))
  .map((line) => line.split(' | ').map((part) => part.trim()));

test.each(rows)('%s: %s', (code, text, suggestion) => {
  expect(Object.keys(problemCodes)).toContain(code);
  const problem = problemIn(text ?? '');
  expect(problem.code).toBe(code);
  expect(problem.suggestion ?? '-').toBe(suggestion);
  if (problem.suggestion !== null) expect(questionsIn(problem.suggestion).length).toBeGreaterThan(0);
});
