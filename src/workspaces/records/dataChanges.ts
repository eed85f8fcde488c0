import type { Day } from '../../terms/day.ts';
import type { PriceSeries } from '../../terms/prices.ts';

/** How one ticker’s prices of today differ from those that an answer was made from. */
export type DataChange = {
  readonly ticker: string;
  readonly keptCount: number;
  /** Days on which both have a close, and not the same. */
  readonly restatedCount: number;
  readonly firstRestated: Day | null;
  /** Days up to the last day kept that only one of the two has. */
  readonly goneCount: number;
  readonly insertedCount: number;
  /** Days after the last day kept. */
  readonly newCount: number;
  readonly lastDay: Day | null;
};

const closesByDay = ({ days, closes }: PriceSeries): ReadonlyMap<Day, number> =>
  new Map(Array.from(days, (day, at) => [day, closes[at] as number]));

export const dataChange = (kept: PriceSeries, today: PriceSeries): DataChange => {
  const lastKept = kept.days.at(-1) ?? Number.NEGATIVE_INFINITY;
  const now = closesByDay(today);
  const then = closesByDay(kept);
  const restated = [...then].filter(([day, close]) => now.has(day) && !Object.is(now.get(day), close));
  const added = [...now.keys()].filter((day) => !then.has(day));
  return {
    ticker: kept.ticker,
    keptCount: kept.days.length,
    restatedCount: restated.length,
    firstRestated: restated[0]?.[0] ?? null,
    goneCount: [...then.keys()].filter((day) => !now.has(day)).length,
    insertedCount: added.filter((day) => day <= lastKept).length,
    newCount: added.filter((day) => day > lastKept).length,
    lastDay: today.days.at(-1) ?? null,
  };
};

/** Whether the prices that an answer was made from read otherwise today. */
export const changesThePast = ({ restatedCount, goneCount, insertedCount }: DataChange): boolean =>
  restatedCount + goneCount + insertedCount > 0;

/** The prices of today, up to the last day that was kept. */
export const upToLastKept = (kept: PriceSeries, today: PriceSeries): PriceSeries => {
  const lastKept = kept.days.at(-1) ?? Number.NEGATIVE_INFINITY;
  const after = today.days.findIndex((day) => day > lastKept);
  const count = after < 0 ? today.days.length : after;
  return { ...today, days: today.days.subarray(0, count), closes: today.closes.subarray(0, count) };
};
