import { z } from 'zod';
import { described } from './internal/described.ts';
import {
  currencyCode,
  decimalSize,
  defaultWindow,
  ianaZone,
  levelOfAtLeastHalf,
  localTimeAndZone,
  probability,
} from './kinds.ts';

const priceAdjustments = ['none', 'splits', 'splits+dividends', 'unknown'] as const;

const meaning = {
  priceAdjustment: {
    kind: z.enum(priceAdjustments),
    says: 'how closes were adjusted for what happened to the share; unknown warns in every tail answer',
    expects: 'none, splits, splits+dividends or unknown',
  },
  currency: {
    kind: currencyCode.nullable(),
    says: 'currency of the closes',
    expects: 'an ISO 4217 code such as USD, or null where it is not known',
  },
  quoteUnit: {
    kind: z.enum(['pence', 'cents']).nullable(),
    says: 'unit of the closes where it is a hundredth of the currency',
    expects: 'pence or cents, or null where closes are in the currency itself',
  },
  closingTime: {
    kind: localTimeAndZone.nullable(),
    says: 'local time and zone of the close; comparing tickers that close at different times warns',
    expects: 'a time and an IANA zone such as 17:30 Europe/London, or null where it is not known',
  },
  calendar: {
    kind: z.string().trim().min(1).nullable(),
    says: 'name of the group of tickers that share holidays',
    expects: 'a name of your choice, or null where it is not known',
  },
} as const;

const meaningForAll = z.strictObject({
  priceAdjustment: described(meaning.priceAdjustment).default('unknown'),
  currency: described(meaning.currency).default(null),
  quoteUnit: described(meaning.quoteUnit).default(null),
  closingTime: described(meaning.closingTime).default(null),
  calendar: described(meaning.calendar).default(null),
});

const meaningOfOne = z.strictObject({
  priceAdjustment: described(meaning.priceAdjustment).optional(),
  currency: described(meaning.currency).optional(),
  quoteUnit: described(meaning.quoteUnit).optional(),
  closingTime: described(meaning.closingTime).optional(),
  calendar: described(meaning.calendar).optional(),
});

const columnName = (column: string) =>
  described({
    kind: z.string().min(1),
    says: `name of the ${column} column`,
    expects: 'the column’s name as it stands in the first row of the file',
  }).default(column);

const feed = z.strictObject({
  path: described({
    kind: z.string().trim().min(1),
    says: 'the price file; a relative path starts at the folder of the settings file',
    expects: 'the path of a CSV file with one row per date and ticker',
  }),
  columns: z
    .strictObject({ date: columnName('date'), ticker: columnName('ticker'), close: columnName('close') })
    .prefault({}),
  prices: meaningForAll
    .prefault({})
    .meta({ description: 'what the closes of every ticker are, unless feed.tickers says otherwise' }),
  tickers: z.record(z.string(), meaningOfOne).default({}).meta({
    description: 'what the closes of single tickers are',
    expects: 'tickers, each with any of the settings under feed.prices',
  }),
});

const window = (fallback: string) =>
  described({
    kind: defaultWindow,
    says: 'window that is taken when the question names none',
    expects: 'a number of returns such as 60d, a span such as 12w, 3m or 2y, or all',
  }).prefault(fallback);

const level = (fallback: string) =>
  described({
    kind: probability,
    says: 'confidence level',
    expects: 'a percentage such as 95% or 97.5%',
  }).prefault(fallback);

const tailLevel = (fallback: string) =>
  described({
    kind: levelOfAtLeastHalf,
    says: 'level of the tail figures',
    expects: 'a percentage such as 99%, 50% at the least',
  }).prefault(fallback);

const wholeNumber = (least: number, most: number, says: string, unit: string, fallback: number) =>
  described({
    kind: z.int().min(least).max(most),
    says,
    expects: `a whole number${unit} from ${least} to ${most}`,
  }).default(fallback);

const windowAndLevel = z.strictObject({ window: window('60d'), level: level('95%') }).prefault({});

const defaults = z.strictObject({
  interval: windowAndLevel,
  claim: windowAndLevel,
  need: z
    .strictObject({
      window: window('60d'),
      level: level('95%'),
      power: described({
        kind: probability,
        says: 'chance of finding a difference that is there',
        expects: 'a percentage such as 80%',
      }).prefault('80%'),
    })
    .prefault({}),
  compare: windowAndLevel,
  tail: z
    .strictObject({
      window: window('500d'),
      level: tailLevel('99%'),
      confidence: level('95%'),
      horizonDays: wholeNumber(1, 250, 'trading days that a tail figure looks ahead', ' of days', 1),
    })
    .prefault({}),
  shape: z.strictObject({ window: window('500d'), confidence: level('95%') }).prefault({}),
  backtest: z
    .strictObject({
      window: window('500d'),
      estimationReturns: wholeNumber(20, 5000, 'returns behind each day’s tail figure', ' of returns', 250),
      level: tailLevel('99%'),
    })
    .prefault({}),
});

const slack = z.strictObject({
  connection: described({
    kind: z.enum(['socket', 'http']),
    says: 'how Slack reaches the bot: socket needs no public address, http listens on slack.port',
    expects: 'socket or http',
  }).default('socket'),
  port: wholeNumber(1, 65535, 'port that is listened on when slack.connection is http', '', 3000),
  listenInThreads: described({
    kind: z.boolean(),
    says: 'answer follow-ups without a mention in threads where the bot has just answered',
    expects: 'true or false',
  }).default(false),
});

/** Every setting with its description, its default and what may stand there. Help and the example file are printed from it. */
export const settingsSchema = z.strictObject({
  feed,
  deskTimeZone: described({
    kind: ianaZone,
    says: 'time zone of the desk, for dates and times that name none',
    expects: 'an IANA time zone such as Europe/London',
  }).default('UTC'),
  periodsPerYear: wholeNumber(
    1,
    366,
    'trading days in a year, for annual figures (252 is trade practice)',
    ' of days',
    252,
  ),
  smallestMeanThatMatters: described({
    kind: decimalSize,
    says: 'a mean daily return smaller than this does not matter to the desk',
    expects: 'a size such as 5bp or 0.05%, above zero and at most 10%',
  }).prefault('5bp'),
  defaults: defaults.prefault({}),
  workspace: described({
    kind: z.enum(['auto', 'slack', 'terminal']),
    says: 'where people ask; auto takes Slack when its tokens are set in the environment and the terminal when none is',
    expects: 'auto, slack or terminal',
  }).default('auto'),
  slack: slack.prefault({}),
});

/** Settings as a person writes them: most keys may be left out. */
export type WrittenSettings = z.input<typeof settingsSchema>;

/** Settings as the program uses them: complete, with levels, windows and sizes read. */
export type Settings = z.output<typeof settingsSchema>;
