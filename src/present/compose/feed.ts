import { isoFromDay } from '../../terms/day.ts';
import type {
  FeedFinding,
  FeedReport,
  FeedStatus,
  FindingExample,
  Freshness,
  Restatement,
  TickerReport,
} from '../../terms/feedReport.ts';
import { digits } from '../../wording/digits.ts';
import { counted, instantInWords, listed } from '../../wording/words.ts';
import { type Passage, type Reply, reply } from '../reply.ts';

const mostExamples = 3;
const mostTickersListed = 60;
const mostFindings = 12;

/** `one session old: the prices of 2026-11-30 should be in`; null where the prices are up to date. */
export const stalenessInWords = (freshness: Freshness | null): string | null => {
  if (freshness === null || freshness.sessionsBehind === 0) return null;
  const { lastDay, expectedDay, sessionsBehind, counted: howCounted } = freshness;
  const assumed = howCounted === 'weekdays' ? ' (weekdays counted, no holidays known)' : '';
  return `prices end ${isoFromDay(lastDay)}, ${counted(sessionsBehind, 'session')} old: those of ${isoFromDay(expectedDay)} should be in${assumed}`;
};

const exampleText = ({ ticker, day, row, value }: FindingExample): string =>
  [
    ...(ticker === null ? [] : [ticker]),
    ...(day === null ? [] : [isoFromDay(day)]),
    ...(row === null ? [] : [`row ${digits(row, 0)}`]),
    ...(value === null ? [] : [`“${value}”`]),
  ].join(' ');

const weights = { quarantined: 'held back', warned: 'warned', noted: 'noted' } as const;

const findingText = ({ weight, text, count, examples }: FeedFinding): string => {
  const shown = examples.slice(0, mostExamples).map(exampleText);
  const places = shown.length === 0 ? '' : ` For example ${shown.join('; ')}.`;
  return `${text} (${weights[weight]}, ${counted(count, 'time')}).${places}`;
};

const findingsPassage = ({ findings }: FeedReport): readonly Passage[] => {
  if (findings.length === 0) return [];
  const lines = findings.slice(0, mostFindings).map(findingText);
  const more = findings.length - lines.length;
  return [
    {
      head: 'What the checks found',
      lines: more > 0 ? [...lines, `and ${counted(more, 'more kind')}`] : lines,
    },
  ];
};

const tickersPassage = ({ tickers }: FeedReport): Passage => {
  const served = tickers.filter(({ state }) => state !== 'quarantined').map(({ ticker }) => ticker);
  const more = served.length - mostTickersListed;
  const names = served.slice(0, mostTickersListed).join(', ');
  return { head: 'Tickers', lines: [more > 0 ? `${names} and ${digits(more, 0)} more` : names] };
};

const heldBackPassage = ({ tickers }: FeedReport): readonly Passage[] => {
  const lines = tickers.flatMap(({ quarantine }) => (quarantine === null ? [] : [quarantine]));
  return lines.length === 0 ? [] : [{ head: 'Held back', lines }];
};

const restatementText = ({ ticker, from, dayCount, kind }: Restatement): string => {
  if (kind === 'gone') return `${ticker} is no longer in the file.`;
  const what = kind === 'rescaled' ? 'was rescaled, as by a new adjustment,' : 'was changed';
  return `${ticker} ${what} from ${isoFromDay(from)} on, ${counted(dayCount, 'day')}.`;
};

const restatedPassage = (restatements: readonly Restatement[]): readonly Passage[] =>
  restatements.length === 0
    ? []
    : [{ head: 'The last new file changed the past', lines: restatements.map(restatementText) }];

const statusLines = (status: FeedStatus, timeZone: string): readonly string[] => [
  ...(status.swappedAt === null
    ? []
    : [`These prices were taken in on ${instantInWords(status.swappedAt, timeZone)}.`]),
  ...(status.problem === null
    ? []
    : [
        `The newest file is not served${status.problemAt === null ? '' : ` (since ${instantInWords(status.problemAt, timeZone)})`}: ${status.problem.message}`,
      ]),
];

const suspicious = ({ tickers }: FeedReport): readonly string[] =>
  tickers.filter(({ state }) => state === 'suspicious').map(({ ticker }) => ticker);

const cleanliness = (report: FeedReport): string => {
  const heldBack = report.tickers.filter(({ state }) => state === 'quarantined').length;
  const warned = suspicious(report);
  const parts = [
    ...(heldBack === 0 ? [] : [`${counted(heldBack, 'ticker')} held back`]),
    ...(warned.length === 0
      ? []
      : [
          `${listed(warned.slice(0, 5))}${warned.length > 5 ? ` and ${warned.length - 5} more` : ''} answered with a caution`,
        ]),
  ];
  return parts.length === 0 ? 'nothing is held back' : parts.join(', ');
};

/** How fresh and how clean the prices are. */
export const feedReply = (status: FeedStatus, timeZone: string): Reply => {
  const { report, freshness, problem } = status;
  if (report === null)
    return reply('refusal', problem?.message ?? 'No price file has been read yet. Ask again in a moment.');
  const stale = stalenessInWords(freshness);
  const sentence =
    `The feed holds ${counted(report.priceCount, 'price')} of ${counted(report.tickers.length, 'ticker')}, ` +
    `${isoFromDay(report.firstDay)} to ${isoFromDay(report.lastDay)}: ${stale === null ? 'up to date' : `${counted(freshness?.sessionsBehind ?? 0, 'session')} behind`}, ${cleanliness(report)}.`;
  const lines = statusLines(status, timeZone);
  return reply('feed', sentence, {
    passages: [
      ...(lines.length === 0 ? [] : [{ head: null, lines }]),
      ...heldBackPassage(report),
      ...restatedPassage(status.restatements),
      ...findingsPassage(report),
      tickersPassage(report),
    ],
    warnings: stale === null ? [] : [stale],
    quietLine: `Data to ${isoFromDay(report.lastDay)}, fingerprint ${report.fingerprint.slice(0, 12)}`,
  });
};

const adjustments = {
  none: 'as traded, not adjusted',
  splits: 'adjusted for splits',
  'splits+dividends': 'adjusted for splits and dividends',
  unknown: 'adjustment not known',
} as const;

const meaningText = ({ meaning }: TickerReport): string => {
  const unit = meaning.quoteUnit === null ? '' : `, in ${meaning.quoteUnit}`;
  const close = meaning.closingTime === null ? '' : `; close at ${meaning.closingTime}`;
  return `Closes: ${adjustments[meaning.priceAdjustment]}; ${meaning.currency ?? 'currency not stated'}${unit}${close}.`;
};

/** One ticker's prices: first and last day, gaps, flags. */
export const tickerReply = (report: TickerReport, freshness: Freshness | null): Reply => {
  const { ticker, priceCount, firstDay, lastDay, missingSessions, longestGapDays, flags, quarantine } =
    report;
  const span =
    firstDay === null || lastDay === null ? '' : `, ${isoFromDay(firstDay)} to ${isoFromDay(lastDay)}`;
  const stale = stalenessInWords(freshness);
  return reply(
    'feed',
    `${ticker} has ${counted(priceCount, 'price')}${span}${quarantine === null ? '' : ', and is held back'}.`,
    {
      passages: [
        {
          head: null,
          lines: [
            ...(quarantine === null ? [] : [quarantine]),
            meaningText(report),
            `Sessions without a price: ${digits(missingSessions, 0)}; longest stretch between two prices: ${counted(longestGapDays, 'calendar day')}.`,
          ],
        },
      ],
      warnings: [...(stale === null ? [] : [stale]), ...flags.map(({ text }) => text)],
      quietLine: lastDay === null ? null : `Data to ${isoFromDay(lastDay)}`,
    },
  );
};
