import { isoFromDay } from '../../../terms/day.ts';
import type { PriceSeries } from '../../../terms/prices.ts';
import type { Flagger } from './flagger.ts';

/** Closes in a row that are equal before they are called stuck: two trading weeks (our choice, no source). */
export const unchangedCloses = 10;

/** Flags stretches in which the close stays the same to the last digit. */
export const checkUnchanged = (
  { ticker, days, closes }: Omit<PriceSeries, 'meaning' | 'flags'>,
  flagger: Flagger,
): void => {
  let start = 0;
  for (let row = 1; row <= closes.length; row += 1) {
    if (row < closes.length && closes[row] === closes[start]) continue;
    const count = row - start;
    if (count >= unchangedCloses) {
      const from = isoFromDay(days[start] as number);
      const last = days[row - 1] as number;
      const text = `${ticker} has the same close ${closes[start]} on ${count} days in a row, ${from} to ${isoFromDay(last)}`;
      flagger.raise('unchanged', last, text, String(closes[start]));
    }
    start = row;
  }
};
