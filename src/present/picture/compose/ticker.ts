import type { TickerPicture } from '../../../answers/pictures/pictureData.ts';
import { isoFromDay } from '../../../terms/day.ts';
import { significant } from '../../../wording/digits.ts';
import { counted } from '../../../wording/words.ts';
import { pricePanel } from '../panels/prices.ts';
import type { Sheet } from '../sheet.ts';
import { altText } from './parts.ts';

const unitOf = ({ meaning: { quoteUnit, currency } }: TickerPicture): string =>
  quoteUnit ?? currency ?? 'currency not stated';

const gapsInWords = ({ gaps }: TickerPicture): string => {
  const widest = gaps.reduce<number>((most, { from, to }) => Math.max(most, to - from), 0);
  return gaps.length === 0
    ? 'No two prices are more than five calendar days apart.'
    : `${counted(gaps.length, 'gap')} of more than five calendar days (shaded), the longest of ${counted(widest, 'day')}.`;
};

/** One ticker’s closes and the stretches without. */
export const tickerSheet = (data: TickerPicture): Sheet => {
  const { ticker, asOf, priceCount, runs } = data;
  const points = runs.flat();
  const low = Math.min(...points.map((point) => point.low));
  const high = Math.max(...points.map((point) => point.high));
  const [first] = points;
  const last = points.at(-1);
  const span = first === undefined ? '' : `${isoFromDay(first.day)} to ${asOf}`;
  return {
    title: `${ticker}: ${counted(priceCount, 'close')}, ${span}`,
    lines: [gapsInWords(data)],
    panels: [pricePanel(data, `Close, ${unitOf(data)}`)],
    corners: [`Data to ${asOf}`, ticker],
    fileName: `feed-${ticker}-${asOf}.png`.replace(/[^\w.-]+/g, '_'),
    altText: altText([
      `Closes of ${ticker}, ${span}, between ${significant(low, 4)} and ${significant(high, 4)} (${unitOf(data)}), the last ${significant(last?.close ?? 0, 4)}.`,
      gapsInWords(data),
    ]),
  };
};
