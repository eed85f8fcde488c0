import fc from 'fast-check';
import { expect, test } from 'vitest';
import { isSession, sessionsBetween, sessionsOf } from '../../src/feed/sessions.ts';
import { dateParts, isWeekday } from '../../src/terms/day.ts';

const daysOfTicker = fc
  .uniqueArray(fc.integer({ min: 20_400, max: 20_460 }), { minLength: 1, maxLength: 40 })
  .map((days) => Int32Array.from(days).sort());

const options = { seed: 1, numRuns: 300 };

test('a day is a session exactly when at least half of the tickers that are live on it have a price', () => {
  fc.assert(
    fc.property(fc.array(daysOfTicker, { minLength: 1, maxLength: 6 }), (tickers) => {
      const calendar = sessionsOf(tickers, null);
      for (let day = 20_395; day <= 20_465; day += 1) {
        const live = tickers.filter((days) => (days[0] ?? 0) <= day && day <= (days.at(-1) ?? 0));
        const priced = live.filter((days) => days.includes(day));
        expect(isSession(calendar, day)).toBe(live.length > 0 && 2 * priced.length >= live.length);
      }
    }),
    options,
  );
});

test('with holidays every other weekday of their years is a session too', () => {
  const holidays = fc.uniqueArray(fc.integer({ min: 20_400, max: 20_460 }), { minLength: 1, maxLength: 9 });
  fc.assert(
    fc.property(fc.array(daysOfTicker, { minLength: 1, maxLength: 4 }), holidays, (tickers, list) => {
      const shown = sessionsOf(tickers, null);
      const calendar = sessionsOf(tickers, new Set(list));
      const years = new Set(list.map((day) => dateParts(day).year));
      const last = calendar.firstDay + calendar.upTo.length - 1;
      for (let day = calendar.firstDay; day <= last; day += 1) {
        const due = isWeekday(day) && years.has(dateParts(day).year) && !list.includes(day);
        expect(isSession(calendar, day)).toBe(isSession(shown, day) || due);
      }
    }),
    options,
  );
});

test('sessions between two days are those that lie strictly between them', () => {
  fc.assert(
    fc.property(
      fc.array(daysOfTicker, { minLength: 1, maxLength: 4 }),
      fc.integer({ min: 20_390, max: 20_470 }),
      fc.integer({ min: 1, max: 40 }),
      (tickers, from, length) => {
        const calendar = sessionsOf(tickers, null);
        let count = 0;
        for (let day = from + 1; day < from + length; day += 1) if (isSession(calendar, day)) count += 1;
        expect(sessionsBetween(calendar, from, from + length)).toBe(count);
      },
    ),
    options,
  );
});
