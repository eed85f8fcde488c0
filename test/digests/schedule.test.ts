import { describe, expect, test } from 'vitest';
import { calendarOf } from '../../src/digests/calendar.ts';
import { duesBetween, nextDue } from '../../src/digests/schedule.ts';
import type { Schedule } from '../../src/terms/subscriptions.ts';
import { at, calendar, day, everyWeekday, schedule, shown } from './days.ts';

const onDays = (...weekdays: number[]): Schedule['days'] => ({ kind: 'on', weekdays });

// Days of the week and the changes of the clocks from printed calendars of 2026 and 2027: 2026-12-01 is a Tuesday.
describe('what is due next', () => {
  test.each([
    ['later today', schedule('sessions'), '2026-12-01T08:00Z', '2026-12-01T08:30Z'],
    ['not the very instant again', schedule('sessions'), '2026-12-01T08:30Z', '2026-12-02T08:30Z'],
    ['over a weekend', schedule('sessions'), '2026-12-04T09:00Z', '2026-12-07T08:30Z'],
    ['over holidays', schedule('sessions'), '2026-12-24T09:00Z', '2026-12-29T08:30Z'],
    ['weekdays pass over no holiday', schedule('weekdays'), '2026-12-24T09:00Z', '2026-12-25T08:30Z'],
    ['daily passes over nothing', schedule('daily'), '2026-12-25T09:00Z', '2026-12-26T08:30Z'],
    ['days of the week', schedule(onDays(1, 4)), '2026-12-01T00:00Z', '2026-12-03T08:30Z'],
    ['days of the week, the other', schedule(onDays(1, 4)), '2026-12-03T08:30Z', '2026-12-07T08:30Z'],
    ['a holiday that is a day of the week', schedule(onDays(5)), '2026-12-22T00:00Z', '2026-12-25T08:30Z'],
    ['the first session of a month', schedule('monthStart'), '2026-12-02T00:00Z', '2027-01-04T08:30Z'],
    ['the first, on its day', schedule('monthStart'), '2026-12-01T08:29Z', '2026-12-01T08:30Z'],
    ['the last session of a month', schedule('monthEnd', 1020), '2026-12-01T00:00Z', '2026-12-31T17:00Z'],
    ['the last before a weekend', schedule('monthEnd', 1020), '2027-01-01T00:00Z', '2027-01-29T17:00Z'],
    ['a zone ahead of UTC', schedule('daily', 510, 'Asia/Tokyo'), '2026-12-01T22:00Z', '2026-12-01T23:30Z'],
    [
      'its session is the day there',
      schedule('sessions', 510, 'Asia/Tokyo'),
      '2026-12-04T00:00Z',
      '2026-12-06T23:30Z',
    ],
    ['in summer an hour earlier', schedule('sessions'), '2027-06-01T00:00Z', '2027-06-01T07:30Z'],
    ['the day after the clocks go forward', schedule('daily'), '2027-03-27T09:00Z', '2027-03-28T07:30Z'],
    ['a time that is skipped', schedule('daily', 90), '2027-03-27T01:30Z', '2027-03-28T01:00Z'],
    ['after a time that was skipped', schedule('daily', 90), '2027-03-28T01:00Z', '2027-03-29T00:30Z'],
    ['a time that comes twice, the first', schedule('daily', 90), '2027-10-30T23:00Z', '2027-10-31T00:30Z'],
    ['and not the second', schedule('daily', 90), '2027-10-31T00:30Z', '2027-11-01T01:30Z'],
    ['between the two', schedule('daily', 90), '2027-10-31T01:10Z', '2027-11-01T01:30Z'],
    ['a leap day', schedule('daily'), '2028-02-28T09:00Z', '2028-02-29T08:30Z'],
    ['the last session of a leap February', schedule('monthEnd'), '2028-02-28T09:00Z', '2028-02-29T08:30Z'],
    ['midnight', schedule('daily', 0), '2026-12-01T12:00Z', '2026-12-02T00:00Z'],
  ])('%s', (_, asked, after, expected) => {
    expect(shown(nextDue(asked, at(after), calendar))).toBe(expected);
  });

  test('without a list of holidays every weekday is a session', () => {
    expect(shown(nextDue(schedule('sessions'), at('2026-12-24T09:00Z'), everyWeekday))).toBe(
      '2026-12-25T08:30Z',
    );
  });

  test('where no session is left nothing is due', () => {
    const none = { isSession: () => false, knows: () => true };
    expect(nextDue(schedule('sessions'), at('2026-12-01T00:00Z'), none)).toBe(null);
    expect(nextDue(schedule('monthEnd'), at('2026-12-01T00:00Z'), none)).toBe(null);
  });
});

test('what was due between two instants, the first left out and the last not', () => {
  const dues = duesBetween(schedule('sessions'), at('2026-12-23T08:30Z'), at('2026-12-30T08:30Z'), calendar);
  expect(dues.map(shown)).toEqual(['2026-12-24T08:30Z', '2026-12-29T08:30Z', '2026-12-30T08:30Z']);
});

test('a calendar knows the years that its holidays name', () => {
  expect([2025, 2026, 2027].map(calendar.knows)).toEqual([false, true, true]);
  expect(everyWeekday.knows(2026)).toBe(false);
  expect(calendarOf(new Set([day('2026-12-25')])).isSession(day('2026-12-25'))).toBe(false);
});
