import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { parentPort, workerData } from 'node:worker_threads';
import { openFiles } from '../openFeed.ts';
import type { ReadingJob, ReadingOutcome } from './openInThread.ts';

/** Lets this thread collect what it leaves behind, which the engine by itself does too seldom. */
const layCollectorOpen = (): void => {
  setFlagsFromString('--expose-gc');
  globalThis.gc = runInNewContext('gc');
};

/** The one task of a reading thread: to read, check and sort, and to hand the columns over as shared memory. */
layCollectorOpen();
const { files, settings, nowMs }: ReadingJob = workerData;
const outcome = await openFiles(files, settings, nowMs);
const message: ReadingOutcome = outcome.ok
  ? {
      ok: true,
      columns: outcome.value.columns,
      report: outcome.value.report,
      holidays: outcome.value.holidays,
    }
  : outcome;
parentPort?.postMessage(message);
