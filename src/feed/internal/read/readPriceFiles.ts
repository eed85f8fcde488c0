import type { FileReport } from '../../../terms/feedReport.ts';
import { type Result, succeed } from '../../../terms/result.ts';
import type { FileState } from '../../priceFiles.ts';
import type { FeedSettings } from '../../settings.ts';
import { makeCollected, type ReadFiles } from './collected.ts';
import type { Database } from './database.ts';
import { mayBePlain, readPlainFile } from './plainFile.ts';

/** All rows of all files where every file is plain; null where one is not. */
const readPlainFiles = async (
  files: readonly FileState[],
  settings: FeedSettings,
): Promise<ReadFiles | null> => {
  if (!mayBePlain(settings)) return null;
  const collected = makeCollected();
  const reports: FileReport[] = [];
  for (const file of files) {
    const report = await readPlainFile(file, settings, collected);
    if (report === null) return null;
    reports.push(report);
  }
  return { files: reports, collected };
};

/** All rows of all price files, or why one of them refuses the whole. */
export const readPriceFiles = async (
  files: readonly FileState[],
  settings: FeedSettings,
  database: Database,
): Promise<Result<ReadFiles>> => {
  const plain = await readPlainFiles(files, settings);
  if (plain !== null) return succeed(plain);
  // the rows of a file that turned out not to be plain are given back before it is read again
  globalThis.gc?.();
  // the other reader takes a quarter of a second to load, which plain files need not wait for
  const { readQueriedFiles } = await import('./queriedFiles.ts');
  return readQueriedFiles(files, settings, database);
};
