import { dayFromIso, isWeekday } from '../../src/terms/day.ts';
import type { PriceSeries } from '../../src/terms/prices.ts';

/** A series from closes on consecutive weekdays up to and including `lastDay`. For tests of rules, not of figures. */
export const seriesOf = (ticker: string, closes: readonly number[], lastDay = '2026-11-27'): PriceSeries => {
  const days: number[] = [];
  for (let day = dayFromIso(lastDay) ?? 0; days.length < closes.length; day -= 1)
    if (isWeekday(day)) days.push(day);
  return {
    ticker,
    days: Int32Array.from(days.reverse()),
    closes: Float64Array.from(closes),
    meaning: {
      priceAdjustment: 'splits',
      currency: 'USD',
      quoteUnit: null,
      closingTime: null,
      calendar: null,
    },
    flags: [],
  };
};

/** Closes that wobble: up 1%, down 0.5%, in turn, from 100. */
export const wobbling = (count: number): readonly number[] => {
  const closes = [100];
  while (closes.length < count) closes.push((closes.at(-1) ?? 0) * (closes.length % 2 === 1 ? 1.01 : 0.995));
  return closes;
};
