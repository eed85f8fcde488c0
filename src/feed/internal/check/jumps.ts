import { isoFromDay } from '../../../terms/day.ts';
import type { PriceSeries } from '../../../terms/prices.ts';
import type { FeedCheckCode } from '../../checks.ts';
import type { Flagger } from './flagger.ts';

/** New shares for old ones in splits that occur, each of which can happen the other way round too. */
const splits: readonly (readonly [number, number])[] = [
  [5, 4],
  [4, 3],
  [3, 2],
  [2, 1],
  [5, 2],
  [3, 1],
  [4, 1],
  [5, 1],
  [6, 1],
  [7, 1],
  [8, 1],
  [10, 1],
  [15, 1],
  [20, 1],
  [25, 1],
  [30, 1],
  [40, 1],
  [50, 1],
];

/** How far, in logarithms, a jump may lie from a ratio to be taken for it: an ordinary day's move comes on top. */
const nearness = 0.03;
/** A jump must exceed this many robust standard deviations of the ticker's own returns (our choice, no source). */
const leastDeviations = 8;
/** A slip is put right within this many prices. */
const slipLasts = 5;
/** No smaller jump is looked at; the smallest split, five for four, is −20%. */
const leastJump = Math.log(1.17);
/** Scales the median absolute deviation to the standard deviation of a normal distribution: 1/Φ⁻¹(3/4). */
const medianToDeviation = 1.4826;

/** Robust standard deviation of the ticker's log returns. */
const deviationOf = (closes: Float64Array): number => {
  const moves = new Float64Array(Math.max(closes.length - 1, 1));
  for (let row = 1; row < closes.length; row += 1) {
    moves[row - 1] = Math.abs(Math.log((closes[row] as number) / (closes[row - 1] as number)));
  }
  moves.sort();
  return medianToDeviation * (moves[moves.length >> 1] as number);
};

const isNear = (logRatio: number, ratio: number): boolean =>
  Math.abs(Math.abs(logRatio) - Math.log(ratio)) <= nearness;

/** Whether the price comes back within a few steps to about where it was before the jump into `row`. */
const comesBack = (closes: Float64Array, row: number): boolean => {
  const before = closes[row - 1] as number;
  const jump = Math.abs(Math.log((closes[row] as number) / before));
  const last = Math.min(row + slipLasts, closes.length - 1);
  for (let later = row + 1; later <= last; later += 1) {
    if (Math.abs(Math.log((closes[later] as number) / before)) < jump / 4) return true;
  }
  return false;
};

/** Whether the jump into `row` is the way back from a slip a few prices before. */
const cameFromSlip = (closes: Float64Array, row: number): boolean => {
  for (let earlier = Math.max(row - slipLasts, 1); earlier < row; earlier += 1) {
    const moved = Math.abs(Math.log((closes[earlier] as number) / (closes[earlier - 1] as number)));
    if (moved > Math.LN2 && comesBack(closes, earlier)) return true;
  }
  return false;
};

type Jump = { readonly code: FeedCheckCode; readonly like: string };

const splitOf = (logRatio: number): Jump | null => {
  const split = splits.find(([more, less]) => isNear(logRatio, more / less));
  if (split === undefined) return null;
  const [more, less] = split;
  return { code: 'splitLike', like: logRatio < 0 ? `a ${more}:${less} split` : `a ${less}:${more} split` };
};

const kindOf = (closes: Float64Array, row: number, logRatio: number): Jump | null => {
  const power = [10, 100, 1000].find((ratio) => isNear(logRatio, ratio));
  if (power !== undefined && (power > 10 || comesBack(closes, row) || cameFromSlip(closes, row))) {
    return { code: 'decimalSlip', like: `a decimal mark that slipped (×${power} or ÷${power})` };
  }
  const split = splitOf(logRatio);
  if (split !== null) return split;
  return Math.abs(logRatio) >= Math.LN2 ? { code: 'largeJump', like: 'a wrong price' } : null;
};

/** Flags jumps that look like a split that was not adjusted for, a slipped decimal mark, or a wrong price. */
export const checkJumps = (
  { ticker, days, closes }: Omit<PriceSeries, 'meaning' | 'flags'>,
  flagger: Flagger,
): void => {
  let deviation: number | null = null;
  const low = Math.exp(-leastJump);
  const high = Math.exp(leastJump);
  for (let row = 1; row < closes.length; row += 1) {
    const ratio = (closes[row] as number) / (closes[row - 1] as number);
    if (ratio > low && ratio < high) continue;
    const logRatio = Math.log(ratio);
    deviation ??= deviationOf(closes);
    if (Math.abs(logRatio) < leastDeviations * deviation && Math.abs(logRatio) < Math.LN2) continue;
    const jump = kindOf(closes, row, logRatio);
    if (jump === null) continue;
    const day = days[row] as number;
    const text = `${ticker} went from ${closes[row - 1]} to ${closes[row]} on ${isoFromDay(day)}, which looks like ${jump.like}`;
    flagger.raise(jump.code, day, text, `${closes[row - 1]} to ${closes[row]}`);
  }
};
