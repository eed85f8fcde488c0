import type { TickerReport } from '../../../terms/feedReport.ts';
import type { PriceFlag, PriceMeaning } from '../../../terms/prices.ts';
import { type Holidays, type SessionCalendar, sessionsOf } from '../../sessions.ts';
import { breathe, rowsPerBreath } from '../breathe.ts';
import type { Findings } from '../findings.ts';
import type { TickerExtras } from '../read/collected.ts';
import { rowsOf, type SortedColumns } from '../sortedColumns.ts';
import { checkExtras } from './extras.ts';
import { type Flagger, makeFlagger } from './flagger.ts';
import { checkSessions, longestGapDays } from './gaps.ts';
import { checkJumps } from './jumps.ts';
import { twinsOf } from './names.ts';
import { checkUnchanged } from './unchanged.ts';

/** Holidays by the name of the calendar; those under null are of tickers without one. */
export type HolidayCalendars = ReadonlyMap<string | null, Holidays>;

type Context = {
  readonly columns: SortedColumns;
  readonly meanings: readonly PriceMeaning[];
  readonly extras: ReadonlyMap<string, TickerExtras>;
  readonly holidays: HolidayCalendars;
  readonly findings: Findings;
};

/** The sessions of every group of tickers that share a calendar. */
export const calendarsOf = (
  columns: SortedColumns,
  meanings: readonly PriceMeaning[],
  holidays: HolidayCalendars,
): ReadonlyMap<string | null, SessionCalendar> => {
  const groups = new Map<string | null, Int32Array[]>();
  meanings.forEach(({ calendar }, place) => {
    const group = groups.get(calendar) ?? [];
    group.push(rowsOf(columns, place).days);
    groups.set(calendar, group);
  });
  return new Map([...groups].map(([name, group]) => [name, sessionsOf(group, holidays.get(name) ?? null)]));
};

const flagsOfReading = (ticker: string, findings: Findings): readonly PriceFlag[] => {
  const cut = findings.first('unfinishedLine', ticker);
  if (cut === null) return [];
  const text = `the file does not end with a line end, so that the last price of ${ticker}, ${cut.value}, may be cut off`;
  return [{ code: 'unfinishedLine', day: cut.day, text }];
};

const checkTwin = (ticker: string, twins: ReadonlyMap<string, string>, flagger: Flagger): void => {
  const twin = twins.get(ticker);
  if (twin !== undefined)
    flagger.raise('twinNames', null, `${ticker} and ${twin} differ only in upper and lower case`, twin);
};

/** Checks every ticker that is served, and reports on each. */
export const checkTickers = async (context: Context): Promise<readonly TickerReport[]> => {
  const { columns, meanings, extras, holidays, findings } = context;
  const calendars = calendarsOf(columns, meanings, holidays);
  const twins = twinsOf(columns.tickers);
  const reports: TickerReport[] = [];
  let sinceBreath = 0;
  for (const [place, ticker] of columns.tickers.entries()) {
    const { days, closes } = rowsOf(columns, place);
    const meaning = meanings[place] as PriceMeaning;
    const flagger = makeFlagger(ticker, findings);
    const series = { ticker, days, closes };
    const calendar = calendars.get(meaning.calendar);
    const missingSessions = calendar === undefined ? 0 : checkSessions(series, calendar, flagger);
    checkUnchanged(series, flagger);
    checkJumps(series, flagger);
    checkTwin(ticker, twins, flagger);
    const ownExtras = extras.get(ticker);
    if (ownExtras !== undefined) checkExtras(series, ownExtras, flagger);
    const flags = [...flagsOfReading(ticker, findings), ...flagger.flags()];
    reports.push({
      ticker,
      state: flags.length > 0 ? 'suspicious' : 'clean',
      quarantine: null,
      priceCount: days.length,
      firstDay: days[0] ?? null,
      lastDay: days.at(-1) ?? null,
      missingSessions,
      longestGapDays: longestGapDays(days),
      flags,
      meaning,
    });
    sinceBreath += days.length;
    if (sinceBreath >= rowsPerBreath) {
      sinceBreath = 0;
      await breathe();
    }
  }
  return reports;
};
