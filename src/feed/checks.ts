import type { FindingWeight } from '../terms/feedReport.ts';

type Check = { readonly weight: FindingWeight; readonly text: string };

/** The closed list of what the checks find in prices, each with what it does to the ticker. */
export const feedChecks = {
  // cells
  unreadableDate: { weight: 'quarantined', text: 'a date that is not written as the settings say' },
  unreadablePrice: { weight: 'quarantined', text: 'a price that is not a number' },
  priceNotPositive: { weight: 'quarantined', text: 'a price of zero or below' },
  priceNotFinite: { weight: 'quarantined', text: 'a price without a finite value' },
  noPrice: { weight: 'quarantined', text: 'a ticker without a single price' },
  blankPrice: { weight: 'noted', text: 'a row or cell without a price' },
  blankRow: { weight: 'noted', text: 'a row without anything in it' },
  unreadableVolume: { weight: 'noted', text: 'a volume that is not a number of zero or more' },
  unfinishedLine: {
    weight: 'warned',
    text: 'the file does not end with a line end, so that its last row may be cut off',
  },
  // days
  dateOutside: { weight: 'quarantined', text: 'a date before 1900 or after 2199' },
  futureDate: { weight: 'quarantined', text: 'a date that lies in the future everywhere on earth' },
  sameDayEqual: { weight: 'noted', text: 'the same price twice for one day' },
  sameDayDifferent: { weight: 'quarantined', text: 'two different prices for one day' },
  daysOutOfOrder: { weight: 'noted', text: 'days that do not ascend in the file; they were sorted' },
  // sessions
  gap: { weight: 'warned', text: 'sessions without a price' },
  stopped: { weight: 'warned', text: 'no price on the latest sessions' },
  offSession: { weight: 'warned', text: 'a price on a day on which most tickers have none' },
  // prices
  unchanged: { weight: 'warned', text: 'a price that did not change for many sessions' },
  noVolume: { weight: 'warned', text: 'prices on many days without volume' },
  splitLike: { weight: 'warned', text: 'a jump of about the ratio of a share split' },
  decimalSlip: {
    weight: 'warned',
    text: 'a jump of about a power of ten, as a slipped decimal mark or a change of unit makes',
  },
  largeJump: { weight: 'warned', text: 'a price that at least doubled or halved in one step' },
  adjustedEndsElsewhere: { weight: 'warned', text: 'the last adjusted close is not the last close' },
  // names and currencies
  mixedCurrencies: { weight: 'quarantined', text: 'closes in more than one currency' },
  currencyContradicted: { weight: 'quarantined', text: 'closes in another currency than the settings say' },
  unreadableCurrency: { weight: 'quarantined', text: 'a currency that is not an ISO 4217 code' },
  twinNames: { weight: 'warned', text: 'tickers that differ only in upper and lower case' },
} as const satisfies Readonly<Record<string, Check>>;

export type FeedCheckCode = keyof typeof feedChecks;

export const weightOf = (code: FeedCheckCode): FindingWeight => feedChecks[code].weight;
