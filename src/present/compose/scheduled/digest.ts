import { isoFromDay } from '../../../terms/day.ts';
import type {
  DigestDetail,
  DigestFigures,
  DigestPost,
  FreshPost,
  OldPrices,
  Skipped,
} from '../../../terms/scheduledPosts.ts';
import { significant } from '../../../wording/digits.ts';
import { levelInWords, percent, percentDecimals } from '../../../wording/percent.ts';
import { counted, instantInWords, listed, weekdayAndDay } from '../../../wording/words.ts';
import { type Passage, type Reply, reply, type Table } from '../../reply.ts';
import { fullCaution } from '../help.ts';
import { written } from '../tail.ts';
import { pauseButton } from './pauseButton.ts';

type AnyDigest = DigestPost | DigestDetail | FreshPost;

const figuresOf = ({ lines }: AnyDigest): readonly DigestFigures[] =>
  lines.filter((line): line is DigestFigures => line.ok);

/** `Prices end Thursday 26 Nov 2026, one session old.` */
const oldInWords = (old: OldPrices | null, tickerCount: number): string => {
  if (old === null) return '';
  const { lastDay, sessionsBehind, tickers } = old;
  const whose = tickers.length === tickerCount ? 'Prices' : `The prices of ${listed(tickers)}`;
  const age = sessionsBehind === 1 ? 'one session' : counted(sessionsBehind, 'session');
  return `${whose} end ${weekdayAndDay(lastDay)}, ${age} old. `;
};

/** What was left out is said in the next post, so that nothing is missing without a word. */
const skippedInWords = (skipped: Skipped | null, timeZone: string): string => {
  if (skipped === null) return '';
  const first = instantInWords(skipped.firstMs, timeZone);
  const why = 'could not be posted in time';
  return skipped.count === 1
    ? `The digest of ${first} ${why}. `
    : `${counted(skipped.count, 'digest')} from ${first} to ${instantInWords(skipped.lastMs, timeZone)} ${why}. `;
};

const flaggedInWords = ({ flags }: AnyDigest): string =>
  flags.length === 0 ? '' : `The feed flags ${counted(flags.length, 'thing')} in these prices, said below. `;

/** An expectation needs no more digits than the counts beside it. */
const byChance = (expected: number): string => significant(expected, 2);

/** How many exceedances and zones there are, beside what chance alone would bring among so many tickers. */
const headInWords = (post: AnyDigest): string => {
  const figures = figuresOf(post);
  const exceeded = figures.filter((line) => line.exceeded === true).length;
  const losses = `${counted(exceeded, 'loss', 'losses')} exceeded ${exceeded === 1 ? 'its' : 'their'} figure`;
  const { exceedances, nonGreenZones } = post.byChance;
  if (nonGreenZones === null)
    return `${losses}; chance alone would bring ${byChance(exceedances)} among ${counted(figures.length, 'ticker')}.`;
  const zones = figures.filter(({ judged }) => judged?.zone === 'yellow' || judged?.zone === 'red').length;
  const notGreen = `${counted(zones, 'zone')} ${zones === 1 ? 'is' : 'are'} not green`;
  return `${losses} and ${notGreen}; chance alone would bring ${byChance(exceedances)} and ${byChance(nonGreenZones)} among ${counted(figures.length, 'ticker')}.`;
};

const none = '–';

const bounded = (estimate: number | null, lower: number | null, upper: number | null) =>
  estimate === null ? { estimate: 'none', range: none } : written(estimate, lower, upper, null);

/** `+0.12 (0.4)`: percent, and how many half-widths of the interval that is. */
const changeCell = ({ change, changeOverHalfWidth, ...line }: DigestFigures): string => {
  if (change === null) return none;
  const decimals = percentDecimals({ estimate: line.var, lower: line.varLower, upper: line.varUpper });
  const moved = percent(change, decimals, { plus: true }).slice(0, -1);
  return changeOverHalfWidth === null ? moved : `${moved} (${Math.abs(changeOverHalfWidth).toFixed(1)})`;
};

const lastCell = ({ lastReturn, exceeded }: DigestFigures): string => {
  const value = percent(lastReturn, 2, { plus: true }).slice(0, -1);
  return exceeded === true ? `${value} exceeded` : value;
};

const judgedCell = ({ judged }: DigestFigures): string =>
  judged === null
    ? none
    : `${judged.exceedances} in ${judged.days}${judged.zone === null ? '' : `, ${judged.zone}`}`;

const rowOf = (line: DigestFigures): readonly string[] => {
  const value = bounded(line.var, line.varLower, line.varUpper);
  const shortfall = bounded(line.es, line.esLower, line.esUpper);
  return [
    line.ticker,
    lastCell(line),
    value.estimate,
    value.range,
    shortfall.estimate,
    shortfall.range,
    changeCell(line),
    judgedCell(line),
  ];
};

const tableOf = (post: AnyDigest): Table | null => {
  const figures = figuresOf(post);
  const interval = `at ${levelInWords(post.confidenceLevel)}`;
  const right = (head: string) => ({ head, align: 'right' as const });
  if (figures.length === 0) return null;
  return {
    columns: [
      { head: '% a day', align: 'left' },
      right('last'),
      right('VaR'),
      right(interval),
      right('ES'),
      right(interval),
      right('moved'),
      right('exceeded'),
    ],
    rows: figures.map(rowOf),
  };
};

const passage = (head: string, lines: readonly string[]): readonly Passage[] =>
  lines.length === 0 ? [] : [{ head, lines }];

const refusedPassage = ({ lines }: AnyDigest): readonly Passage[] =>
  passage(
    'Not given',
    lines.flatMap((line) => (line.ok ? [] : [`${line.ticker}: ${line.message}`])),
  );

const lineInWords = (line: DigestFigures): string =>
  `${line.ticker} ${lastCell(line)}%, VaR ${percent(line.var)}, ES ${line.es === null ? 'none' : percent(line.es)}, exceeded ${judgedCell(line)}`;

const lastDayOf = (post: AnyDigest): string => {
  const days = figuresOf(post).map(({ asOf }) => asOf);
  return days.length === 0 ? 'no data' : `data to ${isoFromDay(Math.max(...days))}`;
};

const aboutFigures = ({ tailLevel, confidenceLevel, model, window }: AnyDigest): string =>
  `VaR and ES at ${levelInWords(tailLevel)} by the ${model} model over ${window}, intervals at ${levelInWords(confidenceLevel)}`;

const quietLine = (post: AnyDigest): string => {
  const due = post.dueMs === null ? 'asked for now' : `due ${instantInWords(post.dueMs, post.timeZone)}`;
  return `${post.id}, ${due}, ${lastDayOf(post)}, ${aboutFigures(post)}; moved: VaR since the digest before, in brackets in half-widths of its interval`;
};

/** The post of a digest: old prices, what was left out and flags first, then what stands out, then a line per ticker. */
export const digestReply = (post: DigestPost): Reply =>
  reply(
    'answer',
    `${oldInWords(post.oldPrices, post.lines.length)}${skippedInWords(post.skipped, post.timeZone)}${flaggedInWords(post)}${headInWords(post)}`,
    {
      table: tableOf(post),
      figuresInWords: figuresOf(post).map(lineInWords).join('; '),
      passages: [...passage('Flags', post.flags), ...refusedPassage(post)],
      quietLine: quietLine(post),
      caution: fullCaution,
      buttons: [pauseButton(post.id, 'Pause this digest')],
      whole: 'the thread',
    },
  );

/** The same lines once the prices that were missing are in. */
export const freshReply = (post: FreshPost): Reply =>
  reply('answer', `The missing closes are in, ${lastDayOf(post)}. ${headInWords(post)}`, {
    table: tableOf(post),
    figuresInWords: figuresOf(post).map(lineInWords).join('; '),
    passages: refusedPassage(post),
    quietLine: quietLine(post),
    caution: fullCaution,
  });

const mostWarnings = 2;

const detailLines = (line: DigestFigures): readonly string[] => {
  const more = line.warnings.length - mostWarnings;
  return [
    `tail ${line.tailId}${line.backtestId === null ? '' : `, backtest ${line.backtestId}`}`,
    ...(line.notJudged === null ? [] : [`Its days were not judged: ${line.notJudged}`]),
    ...line.warnings.slice(0, mostWarnings),
    ...(more > 0 ? [`and ${counted(more, 'more caution')}: again ${line.tailId} tells them`] : []),
  ];
};

/** What stands in the thread: each ticker with the ids of its answers, and what they warn of. */
export const digestDetailReply = (post: DigestDetail): Reply =>
  reply('record', `The figures of ${post.id}, each on record under its id.`, {
    passages: figuresOf(post).map((line) => ({ head: line.ticker, lines: detailLines(line) })),
    quietLine: `${aboutFigures(post)}; days judged by figures that never contain the day`,
    whole: 'records',
  });

/** A digest that somebody asks for now: what the thread would hold stands in it too. */
export const digestNowReply = (post: DigestPost): Reply => {
  const now = digestReply(post);
  const { passages } = digestDetailReply({ ...post, kind: 'detail' });
  return { ...now, passages: [...now.passages, ...passages], buttons: [], whole: 'records' };
};
