import { logReturns, simpleReturns } from '../stats/returns/returns.ts';
import { addMonths, type Day, dateParts, dayFromDate, isoFromDay } from '../terms/day.ts';
import type { PriceSeries } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { ReturnType } from '../terms/returns.ts';
import { type Window, windowText } from '../terms/window.ts';
import { counted } from '../wording/words.ts';

/** A run of one ticker's prices: n + 1 closes carry n returns, each dated by its later close. */
export type ReturnSample = {
  readonly ticker: string;
  /** The prices used, views into the series. */
  readonly days: Int32Array;
  readonly closes: Float64Array;
  readonly returns: Float64Array;
  /** The first and the last day that a return is dated. */
  readonly from: Day;
  readonly to: Day;
  readonly longestGapDays: number;
  /** True where a default window was cut to a shorter history. */
  readonly cutToHistory: boolean;
};

/** What a window is asked of: the days of a history, and how to say whose history it is. */
type History = { readonly name: string; readonly days: Int32Array };

type Range = { readonly firstPrice: number; readonly lastPrice: number; readonly cut: boolean };

/** Index of the first day that is not before `day`; the length where all are. */
export const firstIndexFrom = (days: Int32Array, day: Day): number => {
  let low = 0;
  let high = days.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((days[middle] as number) < day) low = middle + 1;
    else high = middle;
  }
  return low;
};

const dayAt = (days: Int32Array, index: number): Day => days[index] as number;

const historyText = ({ days }: History): string =>
  `${counted(days.length - 1, 'return')}, ${isoFromDay(dayAt(days, 1))} to ${isoFromDay(dayAt(days, days.length - 1))}`;

const tooLong = (history: History, window: Window) =>
  refuse(
    problem(
      'windowTooLong',
      `${history.name} has ${historyText(history)}: ${windowText(window)} reaches back further. Ask for a shorter window, or for all.`,
      { needs: window.kind === 'returns' ? window.count : null },
    ),
  );

const empty = (history: History, window: Window) =>
  refuse(
    problem(
      'windowEmpty',
      `No return of ${history.name} is dated in ${windowText(window)}: there are ${historyText(history)}. Ask for a window inside that.`,
    ),
  );

const firstReturnDay = (window: Window, lastDay: Day): Day | null => {
  switch (window.kind) {
    case 'span':
      return window.unit === 'week'
        ? lastDay - 7 * window.amount + 1
        : addMonths(lastDay, -window.amount * (window.unit === 'year' ? 12 : 1)) + 1;
    case 'yearToDate':
      return dayFromDate(dateParts(lastDay).year, 1, 1);
    case 'since':
      return window.day;
    case 'between':
      return window.from;
    default:
      return null;
  }
};

/** Windows by calendar reach back to a day; the history must begin before it, or the window would be less than it says. */
const rangeByDay = (history: History, window: Window, asked: boolean, from: Day): Result<Range> => {
  const { days } = history;
  const lastPrice = window.kind === 'between' ? firstIndexFrom(days, window.to + 1) - 1 : days.length - 1;
  const firstDated = firstIndexFrom(days, from);
  const reachesBack = dayAt(days, 0) < from || window.kind === 'yearToDate';
  if (!reachesBack && lastPrice >= 0 && asked) return tooLong(history, window);
  const firstPrice = Math.max(0, firstDated - 1);
  if (lastPrice - firstPrice < 1 || firstDated > lastPrice) return empty(history, window);
  return succeed({ firstPrice, lastPrice, cut: !reachesBack });
};

const rangeOf = (history: History, window: Window, asked: boolean): Result<Range> => {
  const lastPrice = history.days.length - 1;
  if (window.kind === 'all') return succeed({ firstPrice: 0, lastPrice, cut: false });
  if (window.kind !== 'returns') {
    const from = firstReturnDay(window, dayAt(history.days, lastPrice));
    return from === null ? empty(history, window) : rangeByDay(history, window, asked, from);
  }
  if (window.count <= lastPrice)
    return succeed({ firstPrice: lastPrice - window.count, lastPrice, cut: false });
  return asked ? tooLong(history, window) : succeed({ firstPrice: 0, lastPrice, cut: true });
};

const longestGap = (days: Int32Array): number => {
  let longest = 0;
  for (let index = 1; index < days.length; index += 1)
    longest = Math.max(longest, dayAt(days, index) - dayAt(days, index - 1));
  return longest;
};

export type SampleAsked = {
  readonly window: Window;
  readonly windowAsked: boolean;
  readonly returnType: ReturnType;
};

/**
 * The returns that a question is about. A window of n returns takes n + 1 prices; calendar windows hold the returns dated
 * in them, so their first return may start from a price before. Refuses an asked window that the history cannot fill;
 * a default one is cut to the history and says so.
 */
export const sampleReturns = (series: PriceSeries, asked: SampleAsked): Result<ReturnSample> => {
  const history = { name: series.ticker, days: series.days };
  if (series.days.length < 2)
    return refuse(
      problem(
        'windowEmpty',
        `${series.ticker} has ${counted(series.days.length, 'price')} in the feed, and a return takes two. Nothing can be said of it yet.`,
        { needs: 2 },
      ),
    );
  const range = rangeOf(history, asked.window, asked.windowAsked);
  if (!range.ok) return range;
  const { firstPrice, lastPrice, cut } = range.value;
  const days = series.days.subarray(firstPrice, lastPrice + 1);
  const closes = series.closes.subarray(firstPrice, lastPrice + 1);
  return succeed({
    ticker: series.ticker,
    days,
    closes,
    returns: asked.returnType === 'log' ? logReturns(closes) : simpleReturns(closes),
    from: dayAt(days, 1),
    to: dayAt(days, days.length - 1),
    longestGapDays: longestGap(days),
    cutToHistory: cut,
  });
};
