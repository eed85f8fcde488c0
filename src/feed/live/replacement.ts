import { isoFromDay } from '../../terms/day.ts';
import type { PriceSnapshot } from '../../terms/prices.ts';
import { type Problem, problem } from '../../terms/problem.ts';
import type { Result } from '../../terms/result.ts';
import type { OpenSnapshot } from '../openFeed.ts';

/** Share of the served tickers that a new file may lose at once; one may always go. */
const mostLost = 0.1;

const mostNamed = 5;

const named = (tickers: readonly string[]): string => {
  const more = tickers.length - mostNamed;
  return `${tickers.slice(0, mostNamed).join(', ')}${more > 0 ? ` and ${more} more` : ''}`;
};

const hasUnfinishedLine = ({ report }: OpenSnapshot): boolean =>
  report.findings.some(({ code }) => code === 'unfinishedLine');

const lastDayOf = (snapshot: PriceSnapshot, ticker: string): number | null =>
  snapshot.series(ticker)?.days.at(-1) ?? null;

const shortened = (live: PriceSnapshot, next: PriceSnapshot): readonly string[] =>
  live.tickers.filter((ticker) => {
    const after = lastDayOf(next, ticker);
    return after !== null && after < (lastDayOf(live, ticker) ?? after);
  });

/** Whether the new file says nothing that the old one does not: then what it lacks was cut off, not given up. */
const addsNothing = (live: PriceSnapshot, next: PriceSnapshot): boolean =>
  next.lastDay <= live.lastDay && next.tickers.every((ticker) => live.series(ticker) !== null);

/**
 * Why a new snapshot must not replace the live one; null where it may. A file that was cut off can be read without an
 * error, and is known only by what it lacks: the end of a ticker, tickers without anything new in exchange, or many at once.
 */
export const replacementProblem = (live: OpenSnapshot, next: OpenSnapshot, path: string): Problem | null => {
  if (hasUnfinishedLine(next) && !hasUnfinishedLine(live)) {
    return problem(
      'fileChanging',
      `${path} does not end with a line end, as the one before did. Write it again as a whole.`,
    );
  }
  const short = shortened(live, next);
  const [first] = short;
  if (first !== undefined) {
    const message =
      `The new ${path} ends too early for ${named(short)}: ${first} ends on ${isoFromDay(lastDayOf(next, first) ?? 0)} and ended on ` +
      `${isoFromDay(lastDayOf(live, first) ?? 0)} before. Write it again as a whole; to take it as it is, restart the bot.`;
    return problem('pricesLost', message);
  }
  const lost = live.tickers.filter((ticker) => next.series(ticker) === null);
  const gone = lost.filter((ticker) => !next.quarantined.has(ticker));
  const tooMany = lost.length > Math.max(1, mostLost * live.tickers.length);
  if (!tooMany && !(gone.length > 0 && addsNothing(live, next))) return null;
  const message =
    `The new ${path} has no usable prices of ${named(lost)}, ${lost.length} of ${live.tickers.length} tickers. ` +
    'Write it again as a whole; to take it as it is, restart the bot.';
  return problem('pricesLost', message);
};

/** Tickers that had the newest price are gone, or lack it now while others have it. */
const mayEndWithinADay = (live: PriceSnapshot, next: PriceSnapshot): boolean => {
  const wasCurrent = (ticker: string): boolean => lastDayOf(live, ticker) === live.lastDay;
  const isCurrent = (ticker: string): boolean => lastDayOf(next, ticker) === next.lastDay;
  return live.tickers.some(
    (ticker) => !next.quarantined.has(ticker) && wasCurrent(ticker) && !isCurrent(ticker),
  );
};

/**
 * Whether a reading could be of half a file: one that is refused, one that lost prices, or one that ends between two
 * rows of its newest day. It can as well be what the desk meant, so it only has to rest longer.
 */
export const isDoubtful = (live: OpenSnapshot, reading: Result<OpenSnapshot>, path: string): boolean =>
  !reading.ok ||
  replacementProblem(live, reading.value, path) !== null ||
  mayEndWithinADay(live, reading.value);
