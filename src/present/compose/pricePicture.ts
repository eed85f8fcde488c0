import { isoFromDay } from '../../terms/day.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { significant } from '../../wording/digits.ts';
import { counted } from '../../wording/words.ts';
import type { Passage } from '../reply.ts';

/** Eight heights of a bar, lowest first. */
const heights = [...'▁▂▃▄▅▆▇█'];
const mostBars = 48;
/** More calendar days than this between two prices are a gap that a holiday does not explain. */
const gapDays = 5;

type Bar = { readonly close: number; readonly gap: boolean };

/** The last close of each of at most 48 equal stretches, and whether prices are missing in it. */
const barsOf = ({ days, closes }: PriceSeries): readonly Bar[] => {
  const count = Math.min(mostBars, closes.length);
  return Array.from({ length: count }, (_, bar) => {
    const from = Math.floor((bar * closes.length) / count);
    const to = Math.floor(((bar + 1) * closes.length) / count);
    let gap = false;
    for (let row = Math.max(1, from); row < to; row += 1)
      gap = gap || (days[row] as number) - (days[row - 1] as number) > gapDays;
    return { close: closes[to - 1] as number, gap };
  });
};

const heightOf = (close: number, low: number, high: number): string =>
  heights[high === low ? 0 : Math.min(7, Math.floor(((close - low) / (high - low)) * 8))] ?? '';

/** A small picture of one ticker’s closes in one line of bars, with the stretches that lack prices marked beneath, and in words. */
export const pricePicture = (series: PriceSeries): Passage => {
  const bars = barsOf(series);
  const values = bars.map(({ close }) => close);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const gaps = bars.filter(({ gap }) => gap).length;
  const [first, last] = [series.days[0], series.days.at(-1)];
  const span =
    first === undefined || last === undefined ? '' : `${isoFromDay(first)} to ${isoFromDay(last)}, `;
  return {
    head: 'Closes, oldest first',
    lines: [
      bars.map(({ close }) => heightOf(close, low, high)).join(''),
      ...(gaps === 0 ? [] : [bars.map(({ gap }) => (gap ? '!' : '·')).join('')]),
      `${span}between ${significant(low, 4)} and ${significant(high, 4)}; ` +
        (gaps === 0
          ? `no two prices are more than ${gapDays} calendar days apart.`
          : `${counted(gaps, 'bar')} marked ! ${gaps === 1 ? 'has' : 'have'} more than ${gapDays} calendar days between two prices.`),
    ],
  };
};
