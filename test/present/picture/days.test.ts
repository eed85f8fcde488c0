import { expect, test } from 'vitest';
import { dayTicks } from '../../../src/present/picture/panels/days.ts';
import { isoFromDay } from '../../../src/terms/day.ts';
import { dayOf } from '../../questions/asking.ts';

const ticks = (first: string, last: string) => {
  const { days, format } = dayTicks(dayOf(first), dayOf(last));
  return [format, ...days.map(isoFromDay)];
};

test('two months are labelled by fortnights', () => {
  expect(ticks('2026-09-21', '2026-11-27')).toEqual([
    '%-d %b',
    '2026-09-21',
    '2026-10-05',
    '2026-10-19',
    '2026-11-02',
    '2026-11-16',
  ]);
});

test('two years are labelled by half years from January', () => {
  expect(ticks('2024-12-10', '2026-11-27')).toEqual([
    '%b %Y',
    '2025-01-01',
    '2025-07-01',
    '2026-01-01',
    '2026-07-01',
  ]);
});

test('decades are labelled by whole years that the step divides', () => {
  expect(ticks('1990-03-01', '2026-11-27')).toEqual(['%Y', '2000-01-01', '2010-01-01', '2020-01-01']);
});
