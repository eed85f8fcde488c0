import type { DuckDBConnection } from '@duckdb/node-api';
import type { FileReport, FindingExample } from '../../../terms/feedReport.ts';
import { type Problem, problem } from '../../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../../terms/result.ts';
import type { FileState } from '../../priceFiles.ts';
import type { FeedSettings } from '../../settings.ts';
import { acceptFile } from './acceptFile.ts';
import { type Collected, makeCollected, type ReadFiles } from './collected.ts';
import type { Database } from './database.ts';
import type { FileKind } from './fileKind.ts';
import { type FileReading, readLongRows } from './longRows.ts';
import { readerProblem } from './readerProblem.ts';
import { openSource } from './source.ts';
import { readWideRows } from './wideRows.ts';

const readRows = async (
  connection: DuckDBConnection,
  path: string,
  kind: FileKind,
  settings: FeedSettings,
  collected: Collected,
): Promise<FileReading> => {
  try {
    const source = await openSource(connection, path, kind, settings.format.delimiter);
    const read = settings.shape === 'wide' ? readWideRows : readLongRows;
    return await read(connection, path, source, settings, collected);
  } catch (error) {
    return { rowCount: 0, refusal: readerProblem(path, kind, error) };
  }
};

/** The row that a missing line end may have cut: the last that was added is the last of the file. */
const recordUnfinishedLine = (collected: Collected, file: string, row: number): void => {
  const last = collected.last();
  if (last === null) return;
  collected.findings.record('unfinishedLine', {
    file,
    row,
    ticker: collected.names[last.tickerNumber] ?? null,
    day: last.day,
    value: String(last.close),
  });
};

const readFile = async (
  connection: DuckDBConnection,
  { path, bytes }: FileState,
  settings: FeedSettings,
  collected: Collected,
): Promise<Result<FileReport>> => {
  const accepted = await acceptFile(path);
  if (!accepted.ok) return accepted;
  const { kind, hasUnfinishedLine } = accepted.value;
  const { rowCount, refusal } = await readRows(connection, path, kind, settings, collected);
  if (refusal !== null) return refuse(refusal);
  if (hasUnfinishedLine) recordUnfinishedLine(collected, path, 1 + rowCount);
  return succeed({ path, kind, bytes, rowCount });
};

/** Above this share of unreadable cells the file is taken to be written otherwise than the settings say. */
const mostUnreadable = 0.05;

const wrongFormat = (settings: FeedSettings, { findings }: Collected, rowCount: number): Problem | null => {
  const { columns, format, shape } = settings;
  const close = columns.adjustedClose ?? columns.close;
  const number = `a number with a decimal ${format.decimalMark}`;
  const candidates = [
    {
      code: 'unreadableDate',
      column: columns.date,
      expected: `a date written ${format.dateFormat}`,
      setting: 'feed.format.dateFormat',
    },
    { code: 'unreadablePrice', column: close, expected: number, setting: 'feed.format.decimalMark' },
  ] as const;
  for (const { code, column, expected, setting } of candidates) {
    const example: FindingExample | null = findings.first(code);
    if (example === null || findings.count(code) <= mostUnreadable * rowCount) continue;
    const name = shape === 'wide' ? example.ticker : column;
    const count = findings.count(code);
    const like = count === 1 ? 'one such cell' : `${count} such cells`;
    const shown = (example.value ?? '').slice(0, 60);
    const message = `${example.file}, column “${name}”, row ${example.row}: “${shown}” is not ${expected} (${like}). Correct the file, or set ${setting}.`;
    return problem('valueUnreadable', message);
  }
  return null;
};

/** All rows of all price files by the reader that knows every form, or why one of them refuses the whole. */
export const readQueriedFiles = (
  files: readonly FileState[],
  settings: FeedSettings,
  database: Database,
): Promise<Result<ReadFiles>> =>
  database(async (connection) => {
    const collected = makeCollected();
    const reports: FileReport[] = [];
    for (const file of files) {
      const report = await readFile(connection, file, settings, collected);
      if (!report.ok) return report;
      reports.push(report.value);
    }
    const rowCount = reports.reduce((sum, report) => sum + report.rowCount, 0);
    const wrong = wrongFormat(
      settings,
      collected,
      rowCount * (settings.shape === 'wide' ? collected.names.length : 1),
    );
    return wrong === null ? succeed({ files: reports, collected }) : refuse(wrong);
  });
