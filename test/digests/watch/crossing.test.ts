import { expect, test } from 'vitest';
import { isBeyond, nextStand, type Stand } from '../../../src/digests/watch/crossing.ts';

/** What is heard on each session: `^` beyond the line, `.` not. */
const heard = (sessions: string, from: Stand = { crossed: false, calmSessions: 0 }): string => {
  let stand = from;
  return [...sessions]
    .map((session) => {
      const step = nextStand(stand, session === '^');
      stand = step.stand;
      return step.event === null ? '-' : step.event.charAt(0);
    })
    .join('');
};

test.each([
  ['.....', '-----'],
  ['..^..', '--f-c'],
  ['^', 'f'],
  ['^^^^', 'f---'],
  ['^.^.^.', 'f-----'],
  ['^.^..^', 'f---cf'],
  ['^..^..', 'f-cf-c'],
  ['^...^', 'f-c-f'],
])('%s is heard as %s', (sessions, expected) => {
  expect(heard(sessions)).toBe(expected);
});

test('what is beyond its line from the start fires at the next crossing', () => {
  expect(heard('^^..^', { crossed: true, calmSessions: 0 })).toBe('---cf');
  expect(heard('..^', { crossed: true, calmSessions: 1 })).toBe('c-f');
});

test.each([
  [0.041, 'above', true],
  [0.04, 'above', false],
  [0.039, 'above', false],
  [0.039, 'below', true],
  [0.04, 'below', false],
] as const)('%d is %s a line at 0.04: %s', (value, side, expected) => {
  expect(isBeyond(value, 0.04, side)).toBe(expected);
});
