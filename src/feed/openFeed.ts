import { access, constants } from 'node:fs/promises';
import { isoFromDay } from '../terms/day.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { withDatabase } from './internal/database.ts';
import { fingerprintOf } from './internal/fingerprint.ts';
import { readRows } from './internal/readRows.ts';
import { type SortedColumns, sortRows } from './internal/sortRows.ts';
import { type FeedSettings, meaningOf } from './settings.ts';
import { type OpenSnapshot, snapshotFromColumns } from './snapshot.ts';

const repeatedDay = ({ tickers, starts, days }: SortedColumns): string | null => {
  for (let place = 0; place < tickers.length; place += 1) {
    for (let row = (starts[place] as number) + 1; row < (starts[place + 1] as number); row += 1) {
      if (days[row] === days[row - 1]) return `${tickers[place]} on ${isoFromDay(days[row] as number)}`;
    }
  }
  return null;
};

const isReadable = (path: string): Promise<boolean> =>
  access(path, constants.R_OK).then(
    () => true,
    () => false,
  );

/** Reads, checks and opens the price file. */
export const openFeed = async (settings: FeedSettings): Promise<Result<OpenSnapshot>> => {
  const { path } = settings;
  if (!(await isReadable(path))) {
    return refuse(
      problem(
        'fileUnreadable',
        `The price file ${path} cannot be opened. Check feed.path and who may read it.`,
      ),
    );
  }
  const rows = await withDatabase((connection) => readRows(connection, settings)).catch((error: unknown) => {
    const reason = error instanceof Error ? (error.message.split('\n')[0] ?? '') : 'unknown reason';
    return refuse(
      problem(
        'fileUnreadable',
        `${path} is not a readable CSV file: ${reason}. Correct the file and save it again.`,
      ),
    );
  });
  if (!rows.ok) return rows;
  const sorted = sortRows(rows.value.names, rows.value.blocks);
  if (sorted.days.length === 0) {
    return refuse(
      problem('fileEmpty', `${path} holds no price. Write one row per date and ticker below the first row.`),
    );
  }
  const twice = repeatedDay(sorted);
  if (twice !== null) {
    return refuse(problem('valueUnreadable', `${path} has two prices for ${twice}. Keep one of the two.`));
  }
  const lastDay = sorted.days.reduce((latest, day) => Math.max(latest, day));
  const snapshot = snapshotFromColumns({
    ...sorted,
    fingerprint: await fingerprintOf(sorted),
    meanings: sorted.tickers.map((ticker) => meaningOf(settings, ticker)),
    flags: sorted.tickers.map(() => []),
    quarantined: new Map(),
    lastDay,
  });
  return succeed(snapshot);
};
