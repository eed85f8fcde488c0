import { isoFromDay } from '../../terms/day.ts';
import type { FeedReport, TickerReport } from '../../terms/feedReport.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { thinned } from './buckets.ts';
import type { CoverageRow, FeedPicture, PricePoint, Stretch, TickerPicture } from './pictureData.ts';

/** More calendar days than this between two prices are a gap that a holiday does not explain. */
export const gapDays = 5;
const mostRows = 24;
/** Of very many gaps the longest are shown; the others are narrower than a line. */
const mostGaps = 200;
const mostPoints = 320;

/** The places after which prices are missing, as pairs of row numbers around the gap. */
const gapPlaces = (days: Int32Array): readonly number[] => {
  const places: number[] = [];
  for (let row = 1; row < days.length; row += 1)
    if ((days[row] as number) - (days[row - 1] as number) > gapDays) places.push(row);
  const width = (row: number): number => (days[row] as number) - (days[row - 1] as number);
  if (places.length <= mostGaps) return places;
  const longest = new Set([...places].sort((one, other) => width(other) - width(one)).slice(0, mostGaps));
  return places.filter((row) => longest.has(row));
};

/** Runs of rows between the gaps: first row and the row after the last. */
const runsOf = (days: Int32Array, places: readonly number[]): readonly (readonly [number, number])[] =>
  [0, ...places].map((start, index) => [start, places[index] ?? days.length] as const);

const gapsOf = (days: Int32Array, places: readonly number[]): readonly Stretch[] =>
  places.map((row) => ({ from: days[row - 1] as number, to: days[row] as number }));

const rowOf = (
  { ticker, state, firstDay, lastDay }: TickerReport,
  series: PriceSeries | null,
): CoverageRow => {
  if (series === null || state === 'quarantined') {
    const covered = firstDay === null || lastDay === null ? [] : [{ from: firstDay, to: lastDay }];
    return { ticker, state: 'heldBack', covered, gaps: [] };
  }
  const { days } = series;
  const places = gapPlaces(days);
  return {
    ticker,
    state: 'served',
    covered: runsOf(days, places).map(([start, end]) => ({
      from: days[start] as number,
      to: days[end - 1] as number,
    })),
    gaps: gapsOf(days, places),
  };
};

/** Those that need looking at first: held back, then the longest gap, then by name. */
const byNeed = (one: TickerReport, other: TickerReport): number => {
  const held = (each: TickerReport): number => (each.state === 'quarantined' ? 0 : 1);
  return held(one) - held(other) || other.longestGapDays - one.longestGapDays;
};

/** Which days each ticker has prices for, and where they lack. */
export const feedPicture = (
  report: FeedReport,
  seriesOf: (ticker: string) => PriceSeries | null,
): FeedPicture => {
  const shown =
    report.tickers.length <= mostRows ? report.tickers : [...report.tickers].sort(byNeed).slice(0, mostRows);
  return {
    kind: 'feed',
    asOf: isoFromDay(report.lastDay),
    fingerprint: report.fingerprint.slice(0, 12),
    rows: shown.map((each) => rowOf(each, seriesOf(each.ticker))),
    more: report.tickers.length - shown.length,
  };
};

/** One ticker’s closes, with the gaps between them; null where it has none. */
export const tickerPicture = ({ ticker, days, closes, meaning }: PriceSeries): TickerPicture | null => {
  const lastDay = days.at(-1);
  if (lastDay === undefined) return null;
  const places = gapPlaces(days);
  const points = (start: number, end: number): readonly PricePoint[] =>
    thinned(
      Array.from({ length: end - start }, (_, row) => start + row),
      Math.max(2, Math.round((mostPoints * (end - start)) / days.length)),
      (rows) => {
        const some = rows.map((row) => closes[row] as number);
        const last = rows[rows.length - 1] as number;
        return {
          day: days[last] as number,
          low: Math.min(...some),
          high: Math.max(...some),
          close: closes[last] as number,
        };
      },
    );
  return {
    kind: 'ticker',
    ticker,
    asOf: isoFromDay(lastDay),
    meaning,
    priceCount: days.length,
    runs: runsOf(days, places).map(([start, end]) => points(start, end)),
    gaps: gapsOf(days, places),
  };
};
