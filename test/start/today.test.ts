import { expect, test } from 'vitest';
import { dayAt, dayStartMs } from '../../src/start/today.ts';
import { dayFromIso } from '../../src/terms/day.ts';

// Offsets of the IANA time zone database: Kathmandu +05:45; Kiritimati +14; Pago Pago −11; London +1 in summer; Beirut
// skipped midnight on 2021-03-28, so that day began at 01:00 local, 22:00 UTC the day before. From memory.
test.each([
  ['2026-05-04', 'UTC', '2026-05-04T00:00:00Z'],
  ['2026-05-04', 'Europe/London', '2026-05-03T23:00:00Z'],
  ['2026-05-04', 'Asia/Kathmandu', '2026-05-03T18:15:00Z'],
  ['2026-05-04', 'Pacific/Kiritimati', '2026-05-03T10:00:00Z'],
  ['2026-05-04', 'Pacific/Pago_Pago', '2026-05-04T11:00:00Z'],
  ['2021-03-28', 'Asia/Beirut', '2021-03-27T22:00:00Z'],
])('%s in %s begins at %s', (iso, zone, instant) => {
  const day = dayFromIso(iso) ?? Number.NaN;
  const startMs = dayStartMs(day, zone);
  expect(new Date(startMs).toISOString()).toBe(new Date(instant).toISOString());
  expect([dayAt(startMs - 1, zone), dayAt(startMs, zone)]).toEqual([day - 1, day]);
});
