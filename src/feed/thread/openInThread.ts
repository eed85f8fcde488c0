import { Worker } from 'node:worker_threads';
import type { InstantMs } from '../../terms/clock.ts';
import type { FeedReport } from '../../terms/feedReport.ts';
import { type Refusal, type Result, succeed } from '../../terms/result.ts';
import type { HolidayCalendars } from '../internal/check/checkTickers.ts';
import type { OpenSnapshot } from '../openFeed.ts';
import type { FileState } from '../priceFiles.ts';
import type { FeedSettings } from '../settings.ts';
import { type SnapshotColumns, snapshotFromColumns } from '../snapshot.ts';

export type ReadingJob = {
  readonly files: readonly FileState[];
  readonly settings: FeedSettings;
  readonly nowMs: InstantMs | null;
};

export type ReadingOutcome =
  | {
      readonly ok: true;
      readonly columns: SnapshotColumns;
      readonly report: FeedReport;
      readonly holidays: HolidayCalendars;
    }
  | Refusal;

const outcomeOf = (worker: Worker): Promise<ReadingOutcome> =>
  new Promise((resolve, reject) => {
    worker.once('message', resolve);
    worker.once('error', reject);
    worker.once('exit', (code) =>
      reject(new Error(`the reading thread ended with code ${code} before it was done`)),
    );
  });

/**
 * Reads, checks and opens price files in a thread of their own: the calling thread goes on answering, and whatever
 * memory the reading took beside the prices is given back with the thread.
 */
export const openInThread = async (
  files: readonly FileState[],
  settings: FeedSettings,
  nowMs: InstantMs | null,
  threadFile: URL = new URL('./readThread.js', import.meta.url),
): Promise<Result<OpenSnapshot>> => {
  const workerData: ReadingJob = { files, settings, nowMs };
  const worker = new Worker(threadFile, { workerData });
  try {
    const outcome = await outcomeOf(worker);
    if (!outcome.ok) return outcome;
    const { columns, report, holidays } = outcome;
    return succeed({ ...snapshotFromColumns(columns), report, holidays });
  } finally {
    await worker.terminate();
  }
};
