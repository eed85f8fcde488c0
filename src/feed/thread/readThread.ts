import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { parentPort, workerData } from 'node:worker_threads';
import { openFiles } from '../openFeed.ts';
import type { ReadingJob, ReadingOutcome } from './openInThread.ts';

const collectEveryMs = 20;

/**
 * Each piece of a result holds memory that the engine does not count, behind an object that is too small for it to
 * collect soon. Collecting the young objects every so often halves the peak and costs a hundredth of the time.
 */
const collectOften = (): void => {
  setFlagsFromString('--expose-gc');
  const collect: unknown = runInNewContext('gc');
  if (typeof collect === 'function') setInterval(() => collect({ type: 'minor' }), collectEveryMs).unref();
};

/** The one task of a reading thread: to read, check and sort, and to hand the columns over as shared memory. */
collectOften();
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
