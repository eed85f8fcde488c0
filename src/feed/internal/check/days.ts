import type { InstantMs } from '../../../terms/clock.ts';
import { type Day, dayFromDate } from '../../../terms/day.ts';
import type { Findings } from '../findings.ts';
import { rowsOf, type SortedColumns } from '../sortedColumns.ts';

const firstSaneDay = dayFromDate(1900, 1, 1) ?? 0;
const lastSaneDay = dayFromDate(2199, 12, 31) ?? 0;

const millisecondsPerDay = 86_400_000;
const furthestZoneMs = 14 * 3_600_000;

/** The calendar day of the places on earth where it is latest: no close can carry a later date. */
export const latestDayOnEarth = (nowMs: InstantMs): Day =>
  Math.floor((nowMs + furthestZoneMs) / millisecondsPerDay);

/** Records dates that cannot be, and days that a ticker has twice. `now` is null where the present day is not to be looked at. */
export const checkDays = (
  columns: SortedColumns,
  place: number,
  nowMs: InstantMs | null,
  findings: Findings,
): void => {
  const ticker = columns.tickers[place] ?? '';
  const { days, closes } = rowsOf(columns, place);
  const latest = nowMs === null ? lastSaneDay : latestDayOnEarth(nowMs);
  for (let row = 0; row < days.length; row += 1) {
    const day = days[row] as number;
    if (day < firstSaneDay || day > lastSaneDay) findings.record('dateOutside', { ticker, day });
    else if (day > latest) findings.record('futureDate', { ticker, day });
    if (row === 0 || day !== days[row - 1]) continue;
    const value = String(closes[row]);
    if (closes[row] === closes[row - 1]) findings.record('sameDayEqual', { ticker, day, value });
    else findings.record('sameDayDifferent', { ticker, day, value: `${closes[row - 1]} and ${value}` });
  }
};
