import { describe, expect, test } from 'vitest';
import { awaitedUntil, bothSkipped, decideDue } from '../../src/digests/due.ts';
import { at, calendar, schedule, shown } from './days.ts';

const hours = 3_600_000;
const decided = (settled: string, now: string) => {
  const decision = decideDue(schedule('sessions'), at(settled), at(now), calendar, 3 * hours);
  if (decision.kind === 'nothing') return 'nothing';
  const { skipped } = decision;
  const left =
    skipped === null ? '' : ` without ${skipped.count} ${shown(skipped.firstMs)} ${shown(skipped.lastMs)}`;
  return decision.kind === 'post' ? `post ${shown(decision.dueMs)}${left}` : `skip${left}`;
};

// A digest of every session at 08:30 in London; at most three hours late. 2026-12-04 is a Friday.
describe('what is to be done', () => {
  test.each([
    ['before its time', '2026-12-03T08:30Z', '2026-12-04T08:29Z', 'nothing'],
    ['at its time', '2026-12-03T08:30Z', '2026-12-04T08:30Z', 'post 2026-12-04T08:30Z'],
    ['three hours late', '2026-12-03T08:30Z', '2026-12-04T11:30Z', 'post 2026-12-04T08:30Z'],
    [
      'a minute later',
      '2026-12-03T08:30Z',
      '2026-12-04T11:31Z',
      'skip without 1 2026-12-04T08:30Z 2026-12-04T08:30Z',
    ],
    ['settled already', '2026-12-04T08:30Z', '2026-12-04T09:00Z', 'nothing'],
    ['the clock was set back after it was posted', '2026-12-04T08:30Z', '2026-12-04T07:45Z', 'nothing'],
    ['and shows the hour again', '2026-12-04T08:30Z', '2026-12-04T08:30Z', 'nothing'],
    [
      'asleep from Thursday night to Monday morning',
      '2026-12-03T08:30Z',
      '2026-12-07T09:10Z',
      'post 2026-12-07T08:30Z without 1 2026-12-04T08:30Z 2026-12-04T08:30Z',
    ],
    [
      'asleep to Monday noon',
      '2026-12-03T08:30Z',
      '2026-12-07T12:00Z',
      'skip without 2 2026-12-04T08:30Z 2026-12-07T08:30Z',
    ],
    ['asleep over holidays alone', '2026-12-24T08:30Z', '2026-12-28T20:00Z', 'nothing'],
    [
      'a fortnight away',
      '2026-12-18T08:30Z',
      '2026-12-31T08:40Z',
      'post 2026-12-31T08:30Z without 6 2026-12-21T08:30Z 2026-12-30T08:30Z',
    ],
  ])('%s', (_, settled, now, expected) => {
    expect(decided(settled, now)).toBe(expected);
  });
});

test('what was left out adds up', () => {
  const first = { count: 2, firstMs: 1, lastMs: 5 };
  const second = { count: 1, firstMs: 9, lastMs: 9 };
  expect(bothSkipped(first, second)).toEqual({ count: 3, firstMs: 1, lastMs: 9 });
  expect(bothSkipped(null, second)).toEqual(second);
  expect(bothSkipped(first, null)).toEqual(first);
  expect(bothSkipped(null, null)).toBe(null);
});

test('missing prices are waited for until noon where it was due', () => {
  expect(shown(awaitedUntil(at('2027-06-01T07:30Z'), 'Europe/London'))).toBe('2027-06-01T11:00Z');
  expect(awaitedUntil(at('2027-06-01T11:00Z'), 'Europe/London')).toBe(null);
  expect(awaitedUntil(at('2027-06-01T16:00Z'), 'Europe/London')).toBe(null);
});
