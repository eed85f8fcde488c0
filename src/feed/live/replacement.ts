import { isoFromDay } from '../../terms/day.ts';
import type { PriceSnapshot } from '../../terms/prices.ts';
import { type Problem, problem } from '../../terms/problem.ts';
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
