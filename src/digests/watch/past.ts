import { createHash } from 'node:crypto';
import type { Day } from '../../terms/day.ts';
import type { PriceSeries } from '../../terms/prices.ts';

/** How many prices a series has up to a day. */
const countUpTo = ({ days }: PriceSeries, day: Day): number => {
  const after = days.findIndex((each) => each > day);
  return after < 0 ? days.length : after;
};

/** Hex SHA-256 of the prices up to a day: another one later means that the past was restated. */
export const pastOf = (series: PriceSeries, upTo: Day): string => {
  const count = countUpTo(series, upTo);
  const hash = createHash('sha256');
  for (const column of [series.days.subarray(0, count), series.closes.subarray(0, count)])
    hash.update(new Uint8Array(column.buffer, column.byteOffset, column.byteLength));
  return hash.digest('hex');
};
