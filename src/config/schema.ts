import { z } from 'zod';
import { digests } from './digestSchema.ts';
import { feed } from './feedSchema.ts';
import { described } from './internal/described.ts';
import { decimalSize, defaultWindow, ianaZone, levelOfAtLeastHalf, probability } from './kinds.ts';
import { permissions } from './permissionsSchema.ts';
import { records } from './recordsSchema.ts';

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
  whenUnsure: described({
    kind: z.enum(['leave', 'repeat']),
    says:
      'what to do with a post whose acceptance the platform did not confirm, where the bot may not read the history of ' +
      'channels: leave it, so that it may be missing, or repeat it, so that it may stand twice',
    expects: 'leave or repeat',
  }).default('leave'),
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
  digests: digests.prefault({}),
  workspace: described({
    kind: z.enum(['auto', 'slack', 'terminal']),
    says: 'where people ask; auto takes Slack when its tokens are set in the environment and the terminal when none is',
    expects: 'auto, slack or terminal',
  }).default('auto'),
  slack: slack.prefault({}),
  records: records.prefault({}),
  permissions: permissions.prefault({}),
});

/** Settings as a person writes them: most keys may be left out. */
export type WrittenSettings = z.input<typeof settingsSchema>;

/** Settings as the program uses them: complete, with levels, windows and sizes read. */
export type Settings = z.output<typeof settingsSchema>;
