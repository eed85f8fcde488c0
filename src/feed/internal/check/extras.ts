import type { PriceSeries } from '../../../terms/prices.ts';
import type { TickerExtras } from '../read/collected.ts';
import type { Flagger } from './flagger.ts';

/** Share of prices without volume above which a ticker is called thinly traded (our choice, no source). */
const mostWithoutVolume = 0.1;
/** How far the last adjusted close may lie from the last close: files round the two differently. */
const roundingOfAdjusted = 1e-3;

/** Flags what the volume and the unadjusted close say against the prices. */
export const checkExtras = (
  { ticker, days, closes }: Omit<PriceSeries, 'meaning' | 'flags'>,
  extras: TickerExtras,
  flagger: Flagger,
): void => {
  const { daysWithoutVolume, lastDay, lastClose } = extras;
  if (daysWithoutVolume > mostWithoutVolume * closes.length) {
    const text = `${ticker} has a price but no volume on ${daysWithoutVolume} of ${closes.length} days`;
    flagger.raise('noVolume', null, text, String(daysWithoutVolume));
  }
  const day = days.at(-1) ?? null;
  const adjusted = closes.at(-1) ?? 0;
  if (day !== lastDay || Math.abs(adjusted / lastClose - 1) <= roundingOfAdjusted) return;
  const text = `the last adjusted close of ${ticker} is ${adjusted} but its last close is ${lastClose}, so amounts in shares are off`;
  flagger.raise('adjustedEndsElsewhere', day, text, `${adjusted} and ${lastClose}`);
};
