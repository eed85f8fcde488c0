import { isoFromDay } from '../../terms/day.ts';
import type { TickerReport } from '../../terms/feedReport.ts';
import { feedChecks } from '../checks.ts';
import { type FeedSettings, meaningOf } from '../settings.ts';
import type { Findings } from './findings.ts';
import { rowsOf, type SortedColumns } from './sortedColumns.ts';

/** Why a ticker is not served, as one sentence with the place where it was first seen; null where it is served. */
export const quarantineReason = (ticker: string, findings: Findings): string | null => {
  const code = findings.quarantineOf(ticker);
  if (code === null) return null;
  const example = findings.first(code, ticker);
  const parts = [
    example?.day == null ? null : isoFromDay(example.day),
    example?.value == null ? null : `“${example.value.slice(0, 60)}”`,
    example?.row == null ? null : `row ${example.row} of ${example.file ?? 'the file'}`,
  ].filter((part) => part !== null);
  const where = parts.length === 0 ? '' : `: ${parts.join(', ')}`;
  return `${ticker} is held back because the feed has ${feedChecks[code].text}${where}. Correct the file; the ticker is served again with the next reading.`;
};

/** Reports on the tickers that are not served, from the columns before they were left out. */
export const quarantinedReports = (
  columns: SortedColumns,
  settings: FeedSettings,
  findings: Findings,
): readonly TickerReport[] =>
  columns.tickers.flatMap((ticker, place) => {
    const quarantine = quarantineReason(ticker, findings);
    if (quarantine === null) return [];
    const { days } = rowsOf(columns, place);
    return [
      {
        ticker,
        state: 'quarantined' as const,
        quarantine,
        priceCount: days.length,
        firstDay: days[0] ?? null,
        lastDay: days.at(-1) ?? null,
        missingSessions: 0,
        longestGapDays: 0,
        flags: [],
        meaning: meaningOf(settings, ticker, null),
      },
    ];
  });
