import { describe, expect, test } from 'vitest';
import { dayFromIso } from '../../src/terms/day.ts';
import { clockText, instantOf, localTimeAt, namedTimeZone } from '../../src/terms/zonedTime.ts';

const local = (iso: string, clock: string) => {
  const day = dayFromIso(iso);
  const [hours = 0, minutes = 0] = clock.split(':').map(Number);
  if (day === null) throw new RangeError(iso);
  return { day, minutes: hours * 60 + minutes };
};

// Rules of the zones from the IANA time zone database, release 2024a: the European Union changes at 01:00 UTC on the last
// Sundays of March and October, the United States at 02:00 local time on the second Sunday of March and the first of
// November, New South Wales at 02:00 standard time on the first Sundays of October and April; Tokyo never.
describe('the instant at which clocks show a time', () => {
  test.each([
    ['a plain winter morning', '2026-01-15', '08:30', 'Europe/London', '2026-01-15T08:30:00Z'],
    ['a plain summer morning', '2026-07-15', '08:30', 'Europe/London', '2026-07-15T07:30:00Z'],
    ['the day the clocks go forward, after', '2026-03-29', '08:30', 'Europe/London', '2026-03-29T07:30:00Z'],
    ['the day before', '2026-03-28', '08:30', 'Europe/London', '2026-03-28T08:30:00Z'],
    ['a time that is skipped', '2026-03-29', '01:30', 'Europe/London', '2026-03-29T01:00:00Z'],
    ['the first time skipped', '2026-03-29', '01:00', 'Europe/London', '2026-03-29T01:00:00Z'],
    ['the first time after', '2026-03-29', '02:00', 'Europe/London', '2026-03-29T01:00:00Z'],
    ['the last time before', '2026-03-29', '00:59', 'Europe/London', '2026-03-29T00:59:00Z'],
    ['a time that comes twice', '2026-10-25', '01:30', 'Europe/London', '2026-10-25T00:30:00Z'],
    ['the time after both', '2026-10-25', '02:00', 'Europe/London', '2026-10-25T02:00:00Z'],
    ['skipped in New York', '2026-03-08', '02:30', 'America/New_York', '2026-03-08T07:00:00Z'],
    ['twice in New York', '2026-11-01', '01:30', 'America/New_York', '2026-11-01T05:30:00Z'],
    ['skipped in Sydney', '2026-10-04', '02:30', 'Australia/Sydney', '2026-10-03T16:00:00Z'],
    ['twice in Sydney', '2026-04-05', '02:30', 'Australia/Sydney', '2026-04-04T15:30:00Z'],
    ['never in Tokyo', '2026-03-29', '02:30', 'Asia/Tokyo', '2026-03-28T17:30:00Z'],
    [
      'a change of half an hour, skipped',
      '2026-10-04',
      '02:15',
      'Australia/Lord_Howe',
      '2026-10-03T15:30:00Z',
    ],
    ['a leap day', '2028-02-29', '08:30', 'Europe/London', '2028-02-29T08:30:00Z'],
    ['midnight', '2026-07-01', '00:00', 'Asia/Kolkata', '2026-06-30T18:30:00Z'],
    ['a whole day that was skipped', '2011-12-30', '08:30', 'Pacific/Apia', '2011-12-30T10:00:00Z'],
  ])('%s', (_, iso, clock, zone, expected) => {
    expect(new Date(instantOf(local(iso, clock), zone)).toISOString()).toBe(expected.replace('Z', '.000Z'));
  });

  test('every quarter of an hour of a year is shown at its own instant or was skipped', () => {
    const wrong: string[] = [];
    for (const zone of ['Europe/London', 'America/New_York', 'Australia/Sydney']) {
      const first = local('2026-01-01', '00:00').day;
      for (let step = 0; step < 365 * 8; step += 1) {
        const asked = { day: first + Math.floor(step / 8), minutes: (step % 8) * 15 + 60 };
        const shown = localTimeAt(instantOf(asked, zone), zone);
        const late = (shown.day - asked.day) * 1440 + shown.minutes - asked.minutes;
        if (late < 0 || late > 60) wrong.push(`${zone} ${asked.day} ${asked.minutes}: ${late}`);
      }
    }
    expect(wrong).toEqual([]);
  });
});

test('a zone is known in any case, and others are not', () => {
  expect(namedTimeZone('europe/london')).toBe('Europe/London');
  expect(namedTimeZone('utc')).toBe('UTC');
  expect(namedTimeZone('Mars/Olympus')).toBe(null);
  expect(namedTimeZone('')).toBe(null);
});

test('clocks show two digits', () => {
  expect([0, 510, 1439].map(clockText)).toEqual(['00:00', '08:30', '23:59']);
});
