import { isoFromDay } from '../terms/day.ts';
import type { PriceSeries } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import { counted } from '../wording/words.ts';
import { firstIndexFrom, type ReturnSample, type SampleAsked, sampleReturns } from './sample.ts';

/** Two tickers on the dates that both have: common dates first, then returns between consecutive ones. */
export type PairedSample = {
  readonly first: ReturnSample;
  readonly second: ReturnSample;
  /** Dates of either ticker within the window on which the other has no price. */
  readonly droppedDates: number;
  /** Returns that span more than `longSpanDays` calendar days. */
  readonly longSpans: number;
};

export const longSpanDays = 5;

type Common = { readonly days: Int32Array; readonly first: Float64Array; readonly second: Float64Array };

const onCommonDays = (one: PriceSeries, other: PriceSeries): Common => {
  const most = Math.min(one.days.length, other.days.length);
  const [days, first, second] = [new Int32Array(most), new Float64Array(most), new Float64Array(most)];
  let [i, j, count] = [0, 0, 0];
  while (i < one.days.length && j < other.days.length) {
    const apart = (one.days[i] as number) - (other.days[j] as number);
    if (apart === 0) {
      days[count] = one.days[i] as number;
      first[count] = one.closes[i] as number;
      second[count] = other.closes[j] as number;
      count += 1;
    }
    if (apart <= 0) i += 1;
    if (apart >= 0) j += 1;
  }
  return {
    days: days.subarray(0, count),
    first: first.subarray(0, count),
    second: second.subarray(0, count),
  };
};

const daysWithin = ({ days }: PriceSeries, { days: used }: ReturnSample): number =>
  firstIndexFrom(days, (used[used.length - 1] as number) + 1) - firstIndexFrom(days, used[0] as number);

const countLongSpans = ({ days }: ReturnSample): number => {
  let count = 0;
  for (let index = 1; index < days.length; index += 1)
    if ((days[index] as number) - (days[index - 1] as number) > longSpanDays) count += 1;
  return count;
};

const tooFewCommon = (one: PriceSeries, other: PriceSeries, count: number) =>
  refuse(
    problem(
      'noCommonDates',
      `${one.ticker} and ${other.ticker} share ${counted(count, 'date')}, and a comparison takes three at least. ` +
        `${one.ticker} runs ${isoFromDay(one.days[0] ?? 0)} to ${isoFromDay(one.days.at(-1) ?? 0)}. Compare tickers whose histories overlap.`,
      { needs: 3 },
    ),
  );

/** The returns of two tickers between consecutive common dates, within the window asked. */
export const samplePair = (
  one: PriceSeries,
  other: PriceSeries,
  asked: SampleAsked,
): Result<PairedSample> => {
  const common = onCommonDays(one, other);
  if (common.days.length < 3) return tooFewCommon(one, other, common.days.length);
  const pairName = `${one.ticker} with ${other.ticker}`;
  const first = sampleReturns({ ...one, ticker: pairName, days: common.days, closes: common.first }, asked);
  if (!first.ok) return first;
  const second = sampleReturns(
    { ...other, ticker: pairName, days: common.days, closes: common.second },
    asked,
  );
  if (!second.ok) return second;
  const used = first.value.days.length;
  return succeed({
    first: { ...first.value, ticker: one.ticker },
    second: { ...second.value, ticker: other.ticker },
    droppedDates: daysWithin(one, first.value) - used + (daysWithin(other, second.value) - used),
    longSpans: countLongSpans(first.value),
  });
};
