import type { Day } from '../../terms/day.ts';
import type { Restatement } from '../../terms/feedReport.ts';
import type { PriceSeries, PriceSnapshot } from '../../terms/prices.ts';
import { breathe, rowsPerBreath } from '../internal/breathe.ts';

/** Prices are rounded when they are written, so that one adjustment gives ratios that differ by this much at most. */
const ratioTolerance = 2e-3;

type Differences = {
  readonly from: Day | null;
  readonly dayCount: number;
  /** Whether days were added or taken away, or the differing closes are not the whole past up to some day. */
  readonly isScattered: boolean;
  readonly leastRatio: number;
  readonly mostRatio: number;
};

/** The differing days of the stretch that both series cover. A new file may begin later and end later. */
const differencesOf = (before: PriceSeries, after: PriceSeries): Differences => {
  const firstCommon = after.days[0] ?? Number.POSITIVE_INFINITY;
  let old = before.days.findIndex((day) => day >= firstCommon);
  if (old < 0) old = before.days.length;
  const firstOld = before.days[0] ?? Number.POSITIVE_INFINITY;
  let now = after.days.findIndex((day) => day >= firstOld);
  let from: Day | null = null;
  let dayCount = 0;
  let isScattered = false;
  let hasEqual = false;
  let leastRatio = Number.POSITIVE_INFINITY;
  let mostRatio = 0;
  const differ = (day: Day): void => {
    from ??= day;
    dayCount += 1;
    if (hasEqual) isScattered = true;
  };
  while (old < before.days.length) {
    const oldDay = before.days[old] as number;
    const newDay = after.days[now] ?? Number.POSITIVE_INFINITY;
    if (oldDay !== newDay) {
      differ(Math.min(oldDay, newDay));
      isScattered = true;
    } else if (before.closes[old] !== after.closes[now]) {
      const ratio = (after.closes[now] as number) / (before.closes[old] as number);
      leastRatio = Math.min(leastRatio, ratio);
      mostRatio = Math.max(mostRatio, ratio);
      differ(oldDay);
    } else hasEqual = true;
    if (oldDay <= newDay) old += 1;
    if (newDay <= oldDay) now += 1;
  }
  return { from, dayCount, isScattered, leastRatio, mostRatio };
};

const restatementOf = (before: PriceSeries, after: PriceSeries | null): Restatement | null => {
  const { ticker } = before;
  if (after === null) {
    return { ticker, from: before.days[0] ?? 0, dayCount: before.days.length, kind: 'gone' };
  }
  const { from, dayCount, isScattered, leastRatio, mostRatio } = differencesOf(before, after);
  if (from === null) return null;
  const isRescaled = !isScattered && dayCount > 1 && mostRatio / leastRatio <= 1 + ratioTolerance;
  return { ticker, from, dayCount, kind: isRescaled ? 'rescaled' : 'changed' };
};

/** Where a new snapshot gives the past of a ticker otherwise than the one before, in the order of the tickers. */
export const restatementsBetween = async (
  before: PriceSnapshot,
  after: PriceSnapshot,
): Promise<readonly Restatement[]> => {
  const found: Restatement[] = [];
  let sinceBreath = 0;
  for (const ticker of before.tickers) {
    const series = before.series(ticker);
    if (series === null || after.quarantined.has(ticker)) continue;
    const restatement = restatementOf(series, after.series(ticker));
    if (restatement !== null) found.push(restatement);
    sinceBreath += series.days.length;
    if (sinceBreath < rowsPerBreath) continue;
    sinceBreath = 0;
    await breathe();
  }
  return found;
};
