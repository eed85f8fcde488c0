import type { InstantMs } from '../terms/clock.ts';
import type { FeedReport, TickerReport } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { breathe } from './internal/breathe.ts';
import { checkTickers, type HolidayCalendars } from './internal/check/checkTickers.ts';
import { checkDays } from './internal/check/days.ts';
import { checkCurrency, extrasByTicker } from './internal/check/names.ts';
import { compact } from './internal/compact.ts';
import { fingerprintOf } from './internal/fingerprint.ts';
import { quarantinedReports } from './internal/quarantine.ts';
import type { ReadFiles } from './internal/read/collected.ts';
import { type Database, passingDatabase } from './internal/read/database.ts';
import { readPriceFiles } from './internal/read/readPriceFiles.ts';
import { sortRows } from './internal/sortRows.ts';
import { type FileState, listPriceFiles, signatureOf } from './priceFiles.ts';
import { type FeedSettings, meaningOf } from './settings.ts';
import { type SnapshotColumns, snapshotFromColumns } from './snapshot.ts';
import { readHolidays } from './tables/holidays.ts';

/** A snapshot with what the reading found, and its columns so that it can be handed to another thread. */
export type OpenSnapshot = PriceSnapshot & {
  readonly columns: SnapshotColumns;
  readonly report: FeedReport;
  readonly holidays: HolidayCalendars;
};

const noFile = (path: string) =>
  refuse(
    problem('fileUnreadable', `There is no price file at ${path}. Check feed.path and who may read it.`),
  );

const changedMeanwhile = (path: string) =>
  refuse(
    problem('fileChanging', `${path} was written while it was read. It is read again once it is whole.`),
  );

/** Sorts what was read and leaves out, by name, what contradicts itself. */
const sortAndSift = async (read: ReadFiles, settings: FeedSettings, nowMs: InstantMs | null) => {
  const { collected } = read;
  const { findings } = collected;
  const extras = extrasByTicker(collected);
  const sorted = await sortRows(collected.names, collected.rows(), (ticker) =>
    findings.record('daysOutOfOrder', { ticker }),
  );
  for (const [place, ticker] of sorted.tickers.entries()) {
    if (sorted.starts[place] === sorted.ends[place]) findings.record('noPrice', { ticker });
    checkDays(sorted, place, nowMs, findings);
    const ownExtras = extras.get(ticker);
    if (ownExtras !== undefined) checkCurrency(ownExtras, settings, findings);
    if (place % 64 === 63) await breathe();
  }
  const heldBack = quarantinedReports(sorted, settings, findings);
  const columns = compact(sorted, findings.quarantinedTickers(), findings.tickersOf('sameDayEqual'));
  return { extras, findings, heldBack, columns };
};

const extentOf = (served: readonly TickerReport[]) => ({
  priceCount: served.reduce((sum, { priceCount }) => sum + priceCount, 0),
  firstDay: served.reduce(
    (least, { firstDay }) => Math.min(least, firstDay ?? least),
    Number.POSITIVE_INFINITY,
  ),
  lastDay: served.reduce((most, { lastDay }) => Math.max(most, lastDay ?? most), Number.NEGATIVE_INFINITY),
});

const assemble = async (
  read: ReadFiles,
  settings: FeedSettings,
  holidays: HolidayCalendars,
  nowMs: InstantMs | null,
): Promise<Result<OpenSnapshot>> => {
  const { extras, findings, heldBack, columns } = await sortAndSift(read, settings, nowMs);
  if (columns.tickers.length === 0) {
    const why = heldBack[0]?.quarantine;
    return why == null
      ? refuse(
          problem(
            'fileEmpty',
            `${settings.path} holds no price. Write one row per date and ticker below the first row.`,
          ),
        )
      : refuse(problem('valueUnreadable', `No ticker of ${settings.path} can be served. ${why}`));
  }
  const meanings = columns.tickers.map((ticker) =>
    meaningOf(settings, ticker, extras.get(ticker)?.currency ?? null),
  );
  const served = await checkTickers({ columns, meanings, extras, holidays, findings });
  const fingerprint = await fingerprintOf(columns);
  const extent = extentOf(served);
  const snapshot = snapshotFromColumns({
    ...columns,
    fingerprint,
    meanings,
    flags: served.map(({ flags }) => flags),
    quarantined: new Map(heldBack.map(({ ticker, quarantine }) => [ticker, quarantine ?? ''])),
    lastDay: extent.lastDay,
  });
  const report: FeedReport = {
    files: read.files,
    fingerprint,
    ...extent,
    findings: findings.list(),
    tickers: [...served, ...heldBack].sort((first, second) => (first.ticker < second.ticker ? -1 : 1)),
  };
  return succeed({ ...snapshot, report, holidays });
};

/** Reads, checks and opens price files that were listed just before. A file that changes meanwhile is refused. */
export const openFiles = async (
  files: readonly FileState[],
  settings: FeedSettings,
  nowMs: InstantMs | null,
  database: Database = passingDatabase,
): Promise<Result<OpenSnapshot>> => {
  if (files.length === 0) return noFile(settings.path);
  const holidays = await readHolidays(settings);
  if (!holidays.ok) return holidays;
  const read = await readPriceFiles(files, settings, database);
  if (signatureOf(await listPriceFiles(settings.path)) !== signatureOf(files))
    return changedMeanwhile(settings.path);
  return read.ok ? assemble(read.value, settings, holidays.value, nowMs) : read;
};

/**
 * Reads, checks and opens the price files. `nowMs` is the present instant, against which dates in the future are
 * found; null leaves that check out.
 */
export const openFeed = async (
  settings: FeedSettings,
  nowMs: InstantMs | null = null,
): Promise<Result<OpenSnapshot>> => openFiles(await listPriceFiles(settings.path), settings, nowMs);
