import type { Day } from '../../terms/day.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { HolidayCalendars } from '../internal/check/checkTickers.ts';
import { type ColumnWanted, readSmallTable } from '../internal/read/smallTable.ts';
import type { FeedSettings } from '../settings.ts';

/**
 * The desk's holidays by calendar; none where the settings name no file. Without a calendar column every holiday is
 * one of the tickers that have no calendar.
 */
export const readHolidays = async (
  settings: Pick<FeedSettings, 'holidays' | 'format'>,
): Promise<Result<HolidayCalendars>> => {
  const { path, columns } = settings.holidays;
  if (path === null) return succeed(new Map());
  const wanted: ColumnWanted[] = [
    { name: columns.date, kind: 'day', expected: `a date written ${settings.format.dateFormat}` },
  ];
  if (columns.calendar !== null)
    wanted.push({ name: columns.calendar, kind: 'text', expected: 'the name of a calendar' });
  const rows = await readSmallTable(path, settings.format, wanted, 'feed.holidays.columns');
  if (!rows.ok) return rows;
  const calendars = new Map<string | null, Set<Day>>();
  for (const [day, calendar = null] of rows.value) {
    if (typeof day !== 'number' || typeof calendar === 'number') continue;
    const days = calendars.get(calendar) ?? new Set();
    calendars.set(calendar, days.add(day));
  }
  return succeed(calendars);
};
