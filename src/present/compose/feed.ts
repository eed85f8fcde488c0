import { type Day, isoFromDay } from '../../terms/day.ts';
import type { PriceMeaning } from '../../terms/prices.ts';
import { counted } from '../../wording/words.ts';
import { type Reply, reply } from '../reply.ts';

/** What the `feed` verb shows of all prices. */
export type FeedState = {
  readonly tickers: readonly string[];
  readonly priceCount: number;
  readonly firstDay: Day;
  readonly lastDay: Day;
  readonly fingerprint: string;
  /** One sentence each: what the last reading noticed. */
  readonly remarks: readonly string[];
};

/** What the `feed` verb shows of one ticker. */
export type TickerState = {
  readonly ticker: string;
  readonly priceCount: number;
  readonly firstDay: Day;
  readonly lastDay: Day;
  readonly lastClose: number;
  readonly longestGapDays: number;
  readonly meaning: PriceMeaning;
  readonly remarks: readonly string[];
};

export const feedReply = (state: FeedState): Reply =>
  reply(
    'feed',
    `The feed holds ${counted(state.priceCount, 'price')} of ${counted(state.tickers.length, 'ticker')}, ${isoFromDay(state.firstDay)} to ${isoFromDay(state.lastDay)}.`,
    {
      passages: [{ head: 'Tickers', lines: [state.tickers.join(', ')] }],
      warnings: state.remarks,
      quietLine: `Data to ${isoFromDay(state.lastDay)}, fingerprint ${state.fingerprint.slice(0, 12)}`,
    },
  );

const adjustments = {
  none: 'as traded, not adjusted',
  splits: 'adjusted for splits',
  'splits+dividends': 'adjusted for splits and dividends',
  unknown: 'adjustment not known',
} as const;

export const tickerReply = (state: TickerState): Reply => {
  const { meaning } = state;
  const unit = [
    meaning.currency ?? 'currency not stated',
    ...(meaning.quoteUnit === null ? [] : [`in ${meaning.quoteUnit}`]),
  ];
  return reply(
    'feed',
    `${state.ticker} has ${counted(state.priceCount, 'price')}, ${isoFromDay(state.firstDay)} to ${isoFromDay(state.lastDay)}; the last close is ${state.lastClose}.`,
    {
      passages: [
        {
          head: null,
          lines: [
            `Closes: ${adjustments[meaning.priceAdjustment]}; ${unit.join(' ')}${meaning.closingTime === null ? '' : `; close at ${meaning.closingTime}`}.`,
            `Longest stretch without a price: ${counted(state.longestGapDays, 'calendar day')}.`,
          ],
        },
      ],
      warnings: state.remarks,
      quietLine: `Data to ${isoFromDay(state.lastDay)}`,
    },
  );
};
